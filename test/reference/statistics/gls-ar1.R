# AR(1) GLS with the full n x n covariance of the errors: shares no step with an estimator that frees rows from rho.
gls_at <- function(x, y, intercept, rho, reml, times = seq_along(y)) {
  n <- length(y)
  X <- matrix(x, n)
  if (intercept) X <- cbind(1, X)
  k <- ncol(X)
  V <- rho^abs(outer(times, times, "-")) / (1 - rho^2)
  L <- t(chol(V))
  Xs <- forwardsolve(L, X)
  fit <- lm.fit(Xs, forwardsolve(L, y))
  rss <- sum(fit$residuals^2)
  degrees <- if (reml) n - k else n
  XVX <- crossprod(Xs)
  logLik <- -degrees / 2 * (log(2 * pi * rss / degrees) + 1) - sum(log(diag(L))) -
    (if (reml) as.numeric(determinant(XVX)$modulus) / 2 else 0)
  list(
    coefficients = fit$coefficients, standardErrors = sqrt(diag(solve(XVX)) * rss / (n - k)), rho = rho,
    sigma = sqrt(rss / degrees), logLikelihood = logLik
  )
}

# The highest likelihood over a grid of rho, refined.
gls_best <- function(x, y, intercept, reml, times = seq_along(y)) {
  value <- function(rho) gls_at(x, y, intercept, rho, reml, times)$logLikelihood
  grid <- seq(-0.9, 0.9, by = 0.1)
  top <- grid[which.max(sapply(grid, value))]
  best <- optimize(value, c(top - 0.1, top + 0.099999), maximum = TRUE, tol = 1e-10)
  list(rho = best$maximum, logLikelihood = best$objective)
}
