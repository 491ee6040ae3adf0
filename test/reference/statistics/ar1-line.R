# Log-likelihood of given errors under AR(1), from the dense covariance matrix, at the variance that makes it largest.
ar1_likelihood <- function(e, rho, times = seq_along(e)) {
  n <- length(e)
  L <- t(chol(rho^abs(outer(times, times, "-")) / (1 - rho^2)))
  variance <- sum(forwardsolve(L, e)^2) / n
  list(logLikelihood = -n / 2 * (log(2 * pi * variance) + 1) - sum(log(diag(L))))
}
