# Newey-West with the lag of Newey & West 1994, prewhitening and gaps, in base R from the formulas, with whole matrices.
# The formulas of the automatic lag (Tables I and II of the paper) are from memory; 3 instead of 4 after prewhitening is
# second-hand, from public code that cites Table II C.

# The VAR(1) by ar.ols, R's own fit of autoregressions: least squares, no constant, no limit on singular values.
var1 <- function(S) {
  S <- unname(S)
  if (ncol(S) == 1) {
    fit <- ar.ols(S[, 1], aic = FALSE, order.max = 1, demean = FALSE, intercept = FALSE)
    return(list(A = matrix(fit$ar, 1, 1), U = matrix(fit$resid[-1], ncol = 1)))
  }
  fit <- ar.ols(S, aic = FALSE, order.max = 1, demean = FALSE, intercept = FALSE)
  list(A = matrix(fit$ar, ncol(S), ncol(S)), U = unname(as.matrix(fit$resid)[-1, , drop = FALSE]))
}

# Rows of a matrix in their years, zero in a missing one.
on_calendar <- function(S, years) {
  full <- matrix(0, diff(range(years)) + 1, ncol(S))
  full[years - min(years) + 1, ] <- S
  full
}

automatic_lag <- function(S, intercept, total, most) {
  h <- if (intercept && ncol(S) > 1) rowSums(S[, -1, drop = FALSE]) else rowSums(S)
  m <- floor(most * (total / 100)^(2 / 9))
  # acf's sums have the divisor n throughout, which cancels.
  sigma <- acf(h, lag.max = m, type = "covariance", demean = FALSE, plot = FALSE)$acf[, 1, 1]
  j <- seq_len(m)
  s0 <- sigma[1] + 2 * sum(sigma[j + 1])
  s1 <- 2 * sum(j * sigma[j + 1])
  floor(1.1447 * ((s1 / s0)^2)^(1 / 3) * total^(1 / 3))
}

# lag below 0: automatic.
newey_west <- function(x, y, nPredictors, intercept, w, lag, prewhiten, small, years) {
  n <- length(y)
  X <- matrix(x, n, nPredictors)
  fit <- if (intercept) lm(y ~ X, weights = w) else lm(y ~ X - 1, weights = w)
  D <- unname(model.matrix(fit))
  k <- ncol(D)
  S <- on_calendar(D * (w * unname(residuals(fit))), years)
  total <- nrow(S)
  recolour <- diag(k)
  growth <- 0
  if (prewhiten) {
    V <- var1(S)
    S <- V$U
    recolour <- solve(diag(k) - V$A)
    growth <- max(Mod(eigen(V$A)$values))
  }
  if (lag < 0) lag <- automatic_lag(S, intercept, total, if (prewhiten) 3 else 4)
  kernel <- toeplitz(pmax(0, 1 - (0:(nrow(S) - 1)) / (lag + 1)))
  meat <- recolour %*% (t(S) %*% kernel %*% S) %*% t(recolour)
  bread <- solve(t(D) %*% (w * D))
  list(covariance = t(bread %*% meat %*% bread) * (if (small) n / (n - k) else 1), lag = lag, growth = growth)
}
