# The likelihood of a two-layer fit by R alone: states by eigen (two-layer.R), errors by arima with missing years.
fit_log_likelihood <- function(lambda, gamma, C, C0, eps, wm2, temperature, heat) {
  means <- annual_response(two_layer_matrix(C, C0, gamma, lambda, eps), C, wm2)
  N <- wm2 - lambda * means$surfaceMean - (eps - 1) * gamma * (means$surfaceMean - means$deepMean)
  ar1 <- function(e, mean) arima(e, c(1, 0, 0), include.mean = mean, method = "ML", optim.control = list(reltol = 1e-13))$loglik
  ar1(temperature - means$surfaceMean, TRUE) + (if (all(is.na(heat))) 0 else ar1(heat - N, FALSE))
}

fit_best <- function(start, ...) {
  best <- optim(start, function(p) -fit_log_likelihood(p[1]^2, p[2]^2, ...), control = list(reltol = 1e-12, maxit = 500))
  list(feedback = best$par[1]^2, exchange = best$par[2]^2, logLik = -best$value)
}

# Highest likelihood with the feedback, or the exchange, held.
fit_with_feedback <- function(lambda, ...) optimize(function(g) fit_log_likelihood(lambda, g^2, ...), c(0.1, 1.6), maximum = TRUE, tol = 1e-6)$objective
fit_with_exchange <- function(gamma, ...) optimize(function(l) fit_log_likelihood(l^2, gamma, ...), c(0.5, 1.6), maximum = TRUE, tol = 1e-6)$objective
