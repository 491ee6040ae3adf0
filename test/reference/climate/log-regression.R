# The same join and fits in base R: months to years, common years, window, anchor, lm, errors.
# Newey-West errors are written out here (Bartlett weights, no prewhitening), because base R has none.

annual_means <- function(year, value, min_months) {
  n <- tapply(value, year, length)
  m <- tapply(value, year, mean)
  keep <- n >= min_months
  list(year = as.integer(names(m))[keep], value = as.numeric(m[keep]))
}

newey_west_se <- function(fit, lag, small) {
  X <- model.matrix(fit)
  e <- residuals(fit)
  n <- nrow(X)
  U <- X * e
  S <- crossprod(U)
  if (lag > 0) for (j in seq_len(lag)) {
    G <- crossprod(U[(j + 1):n, , drop = FALSE], U[1:(n - j), , drop = FALSE])
    S <- S + (1 - j / (lag + 1)) * (G + t(G))
  }
  B <- solve(crossprod(X))
  V <- B %*% S %*% B
  if (small) V <- V * n / (n - ncol(X))
  sqrt(diag(V))
}

describe_line <- function(fit, x, y, lag, small) {
  e <- unname(residuals(fit))
  n <- length(e)
  slope <- length(coef(fit))
  se <- c(unname(coef(summary(fit))[slope, 2]), unname(newey_west_se(fit, lag, small)[slope]))
  half <- qt(0.975, df.residual(fit)) * se
  b <- unname(coef(fit)[slope])
  list(
    slope = b,
    intercept = if (slope == 2) unname(coef(fit)[1]) else numeric(0),
    standardErrors = se,
    low = b - half,
    high = b + half,
    rSquaredCentred = 1 - sum(e^2) / sum((y - mean(y))^2),
    rSquaredUncentred = 1 - sum(e^2) / sum(y^2),
    correlation = cor(x, y),
    durbinWatson = sum(diff(e)^2) / sum(e^2),
    lag1 = acf(e, lag.max = 1, plot = FALSE)$acf[2],
    sigma = summary(fit)$sigma,
    nObs = n
  )
}

log_regression <- function(monthYear, co2, year, temperature, min_months, start, end, n_anchor, intercept, lag, small) {
  a <- annual_means(monthYear, co2, min_months)
  rows <- merge(data.frame(year = a$year, co2 = a$value), data.frame(year = year, temperature = temperature))
  rows <- rows[rows$year >= start & rows$year <= end, ]
  rows <- rows[order(rows$year), ]
  x <- log(rows$co2 / mean(rows$co2[1:n_anchor]))
  y <- rows$temperature - mean(rows$temperature[1:n_anchor])
  fit <- if (intercept) lm(y ~ x) else lm(y ~ x - 1)
  c(describe_line(fit, x, y, lag, small), list(years = rows$year, x = x, y = y))
}

trend_line <- function(year, temperature, start, end, lag, small) {
  keep <- year >= start & year <= end
  x <- year[keep]
  y <- temperature[keep]
  describe_line(lm(y ~ x), x, y, lag, small)
}
