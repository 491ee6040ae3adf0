# Dickey-Fuller and KPSS statistics in base R: tseries and urca are not part of it.

adf_statistic <- function(y, lags, deterministic) {
  window <- embed(diff(y), lags + 1)
  n <- nrow(window)
  level <- y[(lags + 1):(lags + n)]
  predictors <- cbind(level, window[, -1])
  fit <- switch(deterministic,
    none = lm(window[, 1] ~ predictors - 1),
    constant = lm(window[, 1] ~ predictors),
    trend = lm(window[, 1] ~ predictors + seq_len(n))
  )
  table <- summary(fit)$coefficients
  list(statistic = table[if (deterministic == "none") 1 else 2, "t value"], nObs = n)
}

# The long-run variance as a quadratic form with the whole kernel matrix.
kpss_statistic <- function(y, lags, deterministic) {
  n <- length(y)
  e <- residuals(if (deterministic == "trend") lm(y ~ seq_len(n)) else lm(y ~ 1))
  kernel <- toeplitz(pmax(0, 1 - (0:(n - 1)) / (lags + 1)))
  list(statistic = sum(cumsum(e)^2) / n^2 / (as.numeric(e %*% kernel %*% e) / n))
}

# x: columns one after the other.
engle_granger_statistic <- function(x, y, lags, deterministic) {
  design <- matrix(x, nrow = length(y))
  line <- if (deterministic == "trend") lm(y ~ design + seq_along(y)) else lm(y ~ design)
  adf_statistic(as.vector(residuals(line)), lags, "none")
}
