# Linear regression with every figure of Footing's answer, in base R alone: lm and its methods where base R has them,
# otherwise the defining formula written with whole matrices (Footing sums row by row).
# Conventions: t distribution with n - k; AIC and BIC count the k coefficients only; Newey-West with Bartlett weights
# 1 - j/(L + 1), no prewhitening, factor n/(n - k) when small; in a weighted fit the score of a row is w x e.

reference_regression <- function(x, y, nPredictors, intercept, w, kind, lag, small) {
  n <- length(y)
  X <- matrix(x, n, nPredictors)
  fit <- if (intercept) lm(y ~ X, weights = w) else lm(y ~ X - 1, weights = w)
  D <- model.matrix(fit)
  k <- ncol(D)
  e <- residuals(fit)
  h <- unname(hatvalues(fit))
  rss <- sum(w * e^2)
  # b = A y. Robust covariances are A (meat of the errors) A': the same as bread %*% meat %*% bread, but that form keeps
  # only half the digits when predictors are as collinear as longley's.
  A <- backsolve(qr.R(fit$qr), t(qr.Q(fit$qr))) %*% diag(sqrt(w))
  robust <- function(u) A %*% diag(u^2) %*% t(A)
  V <- switch(kind,
    "classical" = vcov(fit),
    "hc0" = robust(e),
    "hc1" = robust(e) * n / (n - k),
    "hc2" = robust(e / sqrt(1 - h)),
    "hc3" = robust(e / (1 - h)),
    "newey-west" = {
      kernel <- toeplitz(pmax(0, 1 - (0:(n - 1)) / (lag + 1)))
      A %*% (kernel * outer(e, e)) %*% t(A) * (if (small) n / (n - k) else 1)
    }
  )
  b <- coef(fit)
  se <- sqrt(diag(V))
  # R's summary takes R2 about the mean with an intercept, about zero without.
  centred <- 1 - rss / sum(w * (y - weighted.mean(y, w))^2)
  uncentred <- 1 - rss / sum(w * y^2)
  f <- summary(fit)$fstatistic
  half <- qt(0.975, n - k) * se
  z <- e * sqrt(w)
  list(
    coefficients = b, standardErrors = se, t = b / se, p = 2 * pt(-abs(b / se), n - k),
    confidence95 = rbind(b - half, b + half), covarianceMatrix = V,
    rSquaredCentred = centred, rSquaredUncentred = uncentred,
    adjustedRSquared = summary(fit)$adj.r.squared, residualStandardDeviation = sigma(fit),
    degreesOfFreedom = df.residual(fit), fStatistic = f[1],
    fP = pf(f[1], f[2], f[3], lower.tail = FALSE),
    logLikelihood = as.numeric(logLik(fit)), aic = AIC(fit) - 2, bic = BIC(fit) - log(n),
    durbinWatson = sum(diff(z)^2) / sum(z^2), residuals = e, fitted = fitted(fit), leverage = h,
    cooksDistance = cooks.distance(fit)
  )
}
