# A line with ARMA(1,1) errors at given phi and theta, from the dense covariance matrix of the rows at their times.
# x: columns one after the other.
gls_arma11_at <- function(x, y, intercept, phi, theta, times) {
  design <- cbind(if (intercept) rep(1, length(y)), matrix(x, nrow = length(y)))
  lag <- abs(outer(times, times, "-"))
  gamma0 <- (1 + 2 * phi * theta + theta^2) / (1 - phi^2)
  V <- ifelse(lag == 0, gamma0, phi^(lag - 1) * (phi + theta) * (1 + phi * theta) / (1 - phi^2))
  L <- t(chol(V))
  fit <- lm(forwardsolve(L, y) ~ forwardsolve(L, design) - 1)
  n <- length(y)
  variance <- sum(residuals(fit)^2) / n
  table <- summary(fit)$coefficients
  list(coefficients = table[, 1], standardErrors = table[, 2], sigma = sqrt(variance),
       logLikelihood = -n / 2 * (log(2 * pi * variance) + 1) - sum(log(diag(L))))
}

# The highest likelihood that R's arima finds, from its own start; missing years as NA.
arima11_best <- function(x, y, intercept, times) {
  at <- times - min(times) + 1
  whole <- rep(NA_real_, max(at)); whole[at] <- y
  predictor <- matrix(0, max(at), length(x) / length(y)); predictor[at, ] <- x
  fit <- arima(whole, order = c(1, 0, 1), xreg = predictor, include.mean = intercept, method = "ML",
               optim.control = list(reltol = 1e-15, maxit = 1000))
  list(phi = coef(fit)[1], theta = coef(fit)[2], coefficients = coef(fit)[-(1:2)], sigma = sqrt(fit$sigma2),
       logLikelihood = fit$loglik)
}
