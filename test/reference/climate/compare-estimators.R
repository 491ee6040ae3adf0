# The slope under each estimator and its 95 % interval, in base R: lm, and the functions beside the tests of the single
# estimators (gls-ar1.R, prais-winsten.R, cochrane-orcutt.R,
# huber.R, theil-sen.R, newey-west.R). Everything is in the slope's own unit.
slope_of <- function(estimate, se, df) c(estimate, se, estimate - qt(0.975, df) * se, estimate + qt(0.975, df) * se)

estimators_in_r <- function(x, y, intercept, lag, small, times) {
  n <- length(y)
  fit <- if (intercept) lm(y ~ x) else lm(y ~ x - 1)
  free <- lm(y ~ x)
  place <- if (intercept) 2 else 1
  df <- df.residual(fit)
  X <- model.matrix(fit)
  e <- residuals(fit)
  h <- hatvalues(fit)
  bread <- solve(crossprod(X))
  sandwich <- function(meat) sqrt((bread %*% meat %*% bread)[place, place])
  kernel <- toeplitz(pmax(0, 1 - (0:(n - 1)) / (lag + 1)))
  b <- coef(fit)[place]
  ar1 <- function(reml) {
    best <- gls_at(x, y, intercept, gls_best(x, y, intercept, reml, times)$rho, reml, times)
    c(slope_of(best$coefficients[place], best$standardErrors[place], df), best$rho)
  }
  pw <- prais_winsten(x, y, intercept)
  co <- cochrane_orcutt(x, y, intercept)
  robust <- huber_fit(x, y, 1, intercept, 1.345)
  sen <- theil_sen(x, y, 0.95)
  list(
    `ols-classical` = slope_of(b, sqrt(vcov(fit)[place, place]), df),
    `ols-hc3` = slope_of(b, sandwich(t(X) %*% diag((e / (1 - h))^2) %*% X), df),
    `ols-newey-west` = slope_of(b, sandwich(t(X) %*% (kernel * outer(e, e)) %*% X) * (if (small) sqrt(n / df) else 1), df),
    `ols-newey-west-1994` = {
      hac <- newey_west(x, y, 1, intercept, rep(1, n), -1, FALSE, FALSE, times)
      slope_of(b, sqrt(matrix(hac$covariance, place)[place, place]), df)
    },
    `ols-free-intercept` = slope_of(coef(free)[2], sqrt(vcov(free)[2, 2]), n - 2),
    `gls-ar1-ml` = ar1(FALSE),
    `gls-ar1-reml` = ar1(TRUE),
    `prais-winsten` = c(slope_of(pw$coefficients[place], pw$standardErrors[place], df), pw$rho),
    `cochrane-orcutt` = c(slope_of(co$coefficients[place], co$standardErrors[place], df - 1), co$rho),
    huber = c(slope_of(robust$coefficients[place], robust$standardErrors[place], df), robust$scale),
    `theil-sen` = c(sen$slope, sen$confidence)
  )
}

# With an exact x York's line is weighted least squares with known variances.
york_in_r <- function(x, y, sy) {
  fit <- lm(y ~ x, weights = 1 / sy^2)
  b <- coef(fit)[2]
  scaled <- summary(fit)$coefficients[2, 2]
  se <- scaled / summary(fit)$sigma
  list(
    york = c(b, se, b - qnorm(0.975) * se, b + qnorm(0.975) * se, summary(fit)$sigma^2),
    `york-scaled` = c(slope_of(b, scaled, length(y) - 2), summary(fit)$sigma^2)
  )
}
