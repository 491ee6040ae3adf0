# P(sum(w z^2) < 0) by Imhof's integral (Biometrika 48, 419-426, 1961), in u = tan(a) so that the range is finite.
imhof <- function(w) {
  f <- Vectorize(function(a) {
    u <- tan(a)
    sin(sum(atan(w * u)) / 2) / (u * prod(1 + (w * u)^2)^0.25) / cos(a)^2
  })
  0.5 - integrate(f, 0, pi / 2, rel.tol = 1e-11, subdivisions = 2000)$value / pi
}

# Durbin-Watson with its exact p: eigenvalues of M A M with the dense hat matrix.
dw_test <- function(x, y, intercept) {
  n <- length(y)
  X <- cbind(if (intercept) rep(1, n), matrix(x, n))
  M <- diag(n) - X %*% solve(crossprod(X), t(X))
  A <- crossprod(diff(diag(n)))
  e <- as.vector(M %*% y)
  d <- sum(diff(e)^2) / sum(e^2)
  nu <- sort(eigen(M %*% A %*% M, symmetric = TRUE)$values, decreasing = TRUE)[seq_len(n - ncol(X))]
  list(statistic = d, p = imhof(nu - d))
}
