# Iterated Cochrane-Orcutt in base R: lm on the differences y[t] - rho y[t-1], rho from the residuals of the rows as they are.
cochrane_orcutt <- function(x, y, intercept, tolerance = 1e-13) {
  design <- if (intercept) cbind(1, x) else cbind(x)
  rho <- 0
  repeat {
    fit <- lm(diff_by(y, rho) ~ apply(design, 2, diff_by, rho = rho) - 1)
    e <- as.vector(y - design %*% coef(fit))
    following <- coef(lm(e[-1] ~ e[-length(e)] - 1))
    if (abs(following - rho) < tolerance) break
    rho <- following
  }
  table <- summary(fit)$coefficients
  list(coefficients = table[, 1], standardErrors = table[, 2], rho = rho, sigma = summary(fit)$sigma)
}
diff_by <- function(v, rho) v[-1] - rho * v[-length(v)]
