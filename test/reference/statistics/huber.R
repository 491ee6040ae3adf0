# Huber regression in base R, iterated to standstill; MASS is not part of base R. Conventions as in ?MASS::rlm, except
# that the variance of psi' in the correction K divides by n.
huber_fit <- function(x, y, nPredictors, intercept, k) {
  X <- matrix(x, length(y), nPredictors)
  if (intercept) X <- cbind(1, X)
  n <- nrow(X)
  p <- ncol(X)
  e <- lm.fit(X, y)$residuals
  repeat {
    s <- median(abs(e)) / 0.6745
    w <- pmin(1, k / abs(e / s))
    fit <- lm.wfit(X, y, w)
    if (max(abs(fit$residuals - e)) < 1e-13 * s) break
    e <- fit$residuals
  }
  e <- fit$residuals
  s <- median(abs(e)) / 0.6745
  u <- e / s
  psi <- pmax(-k, pmin(k, u))
  slope <- as.numeric(abs(u) <= k)
  K <- 1 + p / n * mean((slope - mean(slope))^2) / mean(slope)^2
  se <- K * sqrt(sum((psi * s)^2) / (n - p)) / mean(slope) * sqrt(diag(solve(crossprod(X))))
  list(coefficients = fit$coefficients, standardErrors = se, scale = s, weights = pmin(1, k / abs(u)))
}
