# The whole path in R alone: from the bytes of the two published files to the number, its errors and its diagnostics.
# Sources: monthly CO2 and annual temperature as the npm package vega-datasets carries them.
path_in_r <- function(co2_csv, temperature_csv, first, last, lag, intercept) {
  co2 <- read.csv(text = co2_csv)
  co2$year <- as.integer(substr(co2$Date, 1, 4))
  months <- table(co2$year)
  whole <- as.integer(names(months)[months == 12])
  annual <- tapply(co2$CO2, co2$year, mean)
  temperature <- read.csv(text = temperature_csv)
  years <- intersect(intersect(whole, temperature$year), first:last)
  c <- as.numeric(annual[as.character(years)])
  t <- temperature$temp[match(years, temperature$year)]
  x <- log(c / c[1])
  y <- t - t[1]
  fit <- if (intercept) lm(y ~ x) else lm(y ~ x - 1)
  e <- residuals(fit)
  X <- model.matrix(fit)
  u <- X * e
  meat <- crossprod(u)
  for (l in seq_len(lag)) {
    g <- crossprod(u[-seq_len(l), , drop = FALSE], u[seq_len(nrow(u) - l), , drop = FALSE])
    meat <- meat + (1 - l / (lag + 1)) * (g + t(g))
  }
  bread <- solve(crossprod(X))
  hac <- bread %*% meat %*% bread
  k <- ncol(X)
  list(
    years = years,
    value = coef(fit)[k] * log(2),
    classical = sqrt(vcov(fit)[k, k]),
    hac = sqrt(hac[k, k]),
    centred = 1 - sum(e^2) / sum((y - mean(y))^2),
    uncentred = 1 - sum(e^2) / sum(y^2),
    dw = sum(diff(e)^2) / sum(e^2)
  )
}
