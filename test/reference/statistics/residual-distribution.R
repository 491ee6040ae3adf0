# Jarque-Bera and Breusch-Pagan in base R: tseries and lmtest are not part of it.
jarque_bera <- function(e) {
  z <- (e - mean(e)) / sqrt(mean((e - mean(e))^2))
  statistic <- length(e) * (mean(z^3)^2 / 6 + (mean(z^4) - 3)^2 / 24)
  list(statistic = statistic, df = 2, p = pchisq(statistic, 2, lower.tail = FALSE), skewness = mean(z^3), kurtosis = mean(z^4))
}
# x: columns one after the other.
breusch_pagan <- function(x, y, intercept, kind) {
  X <- matrix(x, length(y))
  g <- residuals(if (intercept) lm(y ~ X) else lm(y ~ X - 1))^2
  g <- g / mean(g)
  auxiliary <- lm(g ~ X)
  statistic <- if (kind == "original") sum((fitted(auxiliary) - 1)^2) / 2 else length(y) * summary(auxiliary)$r.squared
  list(statistic = statistic, df = ncol(X), p = pchisq(statistic, ncol(X), lower.tail = FALSE))
}
