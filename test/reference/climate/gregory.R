# A Gregory plot by base R: lm, its covariance or Newey-West's written as sums, delta method, Fieller by root finding on the
# inequality itself, total least squares by prcomp.
gregory <- function(N, T, lag = -1, factor = FALSE, delta = 1) {
  fit <- lm(N ~ T)
  n <- length(N)
  V <- vcov(fit)
  if (lag >= 0) {
    X <- cbind(1, T)
    u <- X * residuals(fit)
    S <- crossprod(u)
    if (lag > 0) for (j in 1:lag) {
      G <- crossprod(u[(j + 1):n, ], u[1:(n - j), ])
      S <- S + (1 - j / (lag + 1)) * (G + t(G))
    }
    B <- solve(crossprod(X))
    V <- B %*% S %*% B * (if (factor) n / (n - 2) else 1)
  }
  a <- unname(coef(fit)[1])
  b <- unname(-coef(fit)[2])
  gradient <- c(1 / b, a / b^2)
  z <- qt(0.975, n - 2)
  # a - r b, with b = -slope: variance V11 + 2 r V12 + r^2 V22.
  outside <- function(r) (a - r * b)^2 - z^2 * (V[1, 1] + 2 * r * V[1, 2] + r^2 * V[2, 2])
  away <- 1; while (outside(a / b - away) < 0) away <- away * 2
  low <- uniroot(outside, c(a / b - away, a / b), tol = 1e-13)$root
  away <- 1; while (outside(a / b + away) < 0) away <- away * 2
  high <- uniroot(outside, c(a / b, a / b + away), tol = 1e-13)$root
  axis <- prcomp(cbind(T, N / sqrt(delta)))$rotation[, 1]
  list(
    line = c(a, b, a / b), errors = c(sqrt(diag(V)), sqrt(gradient %*% V %*% gradient)), fieller = c(low, high),
    feedbacks = unname(c(b, -1 / coef(lm(T ~ N))[2], -sqrt(delta) * axis[2] / axis[1]))
  )
}
