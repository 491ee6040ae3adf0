# Iterated Prais-Winsten in base R: lm on rows freed from rho, rho from the residuals of the rows as they are.
prais_winsten <- function(x, y, intercept, tolerance = 1e-13) {
  design <- if (intercept) cbind(1, x) else cbind(x)
  freed <- function(v, rho) c(v[1] * sqrt(1 - rho^2), v[-1] - rho * v[-length(v)])
  rho <- 0
  repeat {
    fit <- lm(freed(y, rho) ~ apply(design, 2, freed, rho = rho) - 1)
    e <- as.vector(y - design %*% coef(fit))
    following <- sum(e[-1] * e[-length(e)]) / sum(e[-length(e)]^2)
    if (abs(following - rho) < tolerance) break
    rho <- following
  }
  table <- summary(fit)$coefficients
  list(coefficients = table[, 1], standardErrors = table[, 2], rho = rho, sigma = summary(fit)$sigma)
}
