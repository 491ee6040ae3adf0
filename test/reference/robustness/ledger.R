# What base R says of a log-regression's assumptions, from the same annual rows. x = ln(C/C0), y = T - T0.

newey_west <- function(fit, lag) {
  design <- model.matrix(fit)
  scores <- design * residuals(fit)
  meat <- crossprod(scores)
  n <- nrow(design)
  for (j in seq_len(lag)) {
    gamma <- crossprod(scores[(j + 1):n, , drop = FALSE], scores[1:(n - j), , drop = FALSE])
    meat <- meat + (1 - j / (lag + 1)) * (gamma + t(gamma))
  }
  bread <- solve(crossprod(design))
  bread %*% meat %*% bread
}

all_windows <- function(years, co2, temperature, min_years, anchor_years, intercept, lag) {
  n <- length(years)
  slope <- error <- start <- end <- numeric(0)
  for (first in seq_len(n - min_years + 1)) for (last in (first + min_years - 1):n) {
    rows <- first:last
    reference <- first:(first + anchor_years - 1)
    x <- log(co2[rows] / mean(co2[reference]))
    y <- temperature[rows] - mean(temperature[reference])
    fit <- if (intercept) lm(y ~ x) else lm(y ~ x - 1)
    v <- if (lag < 0) vcov(fit) else newey_west(fit, lag)
    slope <- c(slope, coef(fit)["x"])
    error <- c(error, sqrt(v["x", "x"]))
    start <- c(start, years[first])
    end <- c(end, years[last])
  }
  list(start = start, end = end, slope = slope, error = error, quantiles = quantile(slope, c(0, .05, .5, .95, 1)))
}

zero_intercept <- function(x, y, lag) {
  forced <- lm(y ~ x - 1)
  free <- lm(y ~ x)
  t <- coef(free)[1] / sqrt(newey_west(free, lag)[1, 1])
  error <- sqrt(newey_west(free, lag)[2, 2])
  list(
    number = coef(free)[2] * log(2),
    low = (coef(free)[2] - qt(.95, df.residual(free)) * error) * log(2),
    high = (coef(free)[2] + qt(.95, df.residual(free)) * error) * log(2),
    t = t, p = 2 * pt(-abs(t), df.residual(free)),
    partial_f = anova(forced, free)$F[2]
  )
}

each_anchor <- function(co2, temperature) {
  sapply(seq_along(co2), function(k) {
    dx <- log(co2 / co2[k])
    coef(lm(I(temperature - temperature[k]) ~ dx - 1)) * log(2)
  })
}

determination <- function(x, y, years) {
  forced <- lm(y ~ x - 1)
  list(
    centred = 1 - sum(residuals(forced)^2) / sum((y - mean(y))^2),
    uncentred = summary(forced)$r.squared,
    r = cor(x, y),
    co2 = summary(lm(y ~ x))$r.squared,
    time = summary(lm(y ~ years))$r.squared
  )
}
