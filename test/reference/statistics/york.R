# York's line in base R, from what it minimises and not from York's iteration: a and b by optimisation of S, and the
# standard errors by maximum likelihood from the expected information, which York et al. 2004 show to be theirs.
york_line <- function(x, y, sx, sy, r) {
  S <- function(b) {
    W <- 1 / (sy^2 + b^2 * sx^2 - 2 * b * r * sx * sy)
    a <- sum(W * (y - b * x)) / sum(W)
    list(a = a, W = W, S = sum(W * (y - a - b * x)^2))
  }
  start <- coef(lm(y ~ x))[2]
  half <- abs(start) + 3 * sd(y) / sd(x)
  b <- optimize(function(b) S(b)$S, c(start - half, start + half), tol = 1e-14)$minimum
  # A minimum is flat; Newton steps on the numerical derivative of log-free S sharpen it.
  d <- function(b, h) (S(b + h)$S - S(b - h)$S) / (2 * h)
  h <- 1e-4 * abs(b)
  for (i in 1:20) b <- b - d(b, h) / ((S(b + h)$S - 2 * S(b)$S + S(b - h)$S) / h^2)
  at <- S(b)
  # Expected information of (a, b) at the true points that the data are adjusted to: sum W (1, xi)(1, xi)'.
  e <- y - at$a - b * x
  xi <- x + at$W * e * (b * sx^2 - r * sx * sy)
  information <- matrix(c(sum(at$W), sum(at$W * xi), sum(at$W * xi), sum(at$W * xi^2)), 2)
  V <- solve(information)
  list(slope = b, intercept = at$a, slopeStandardError = sqrt(V[2, 2]), interceptStandardError = sqrt(V[1, 1]),
       covariance = V[1, 2], chiSquare = at$S)
}
