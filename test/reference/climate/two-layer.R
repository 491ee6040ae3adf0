# exp(At) and the responses to forcing of the two-layer model by R's eigen (LAPACK), and nothing else.
two_layer_matrix <- function(C, C0, gamma, lambda, eps) {
  matrix(c(-(lambda + eps * gamma) / C, gamma / C0, eps * gamma / C, -gamma / C0), 2)
}

by_eigen <- function(A, f) {
  e <- eigen(A)
  Re(e$vectors %*% diag(f(e$values)) %*% solve(e$vectors))
}

flow <- function(A, t) by_eigen(A, function(r) exp(r * t))
step_response <- function(A, C, wm2, t) by_eigen(A, function(r) expm1(r * t) / r) %*% c(wm2 / C, 0)
ramp_response <- function(A, C, k, t) by_eigen(A, function(r) (expm1(r * t) - r * t) / r^2) %*% c(k / C, 0)

# Annual forcing held within each year: state at the end of each year, and its mean over the year.
annual_response <- function(A, C, wm2) {
  E <- flow(A, 1)
  I1 <- by_eigen(A, function(r) expm1(r) / r)
  I2 <- by_eigen(A, function(r) (expm1(r) - r) / r^2)
  z <- c(0, 0)
  ends <- means <- matrix(0, 2, length(wm2))
  for (i in seq_along(wm2)) {
    push <- c(wm2[i] / C, 0)
    means[, i] <- I1 %*% z + I2 %*% push
    z <- as.vector(E %*% z + I1 %*% push)
    ends[, i] <- z
  }
  list(surface = ends[1, ], deep = ends[2, ], surfaceMean = means[1, ], deepMean = means[2, ])
}
