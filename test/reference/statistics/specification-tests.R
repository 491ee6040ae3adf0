# Nested lines by R's anova, and recursive residuals from lm on each row's past. x: columns one after the other.
f_test <- function(table) list(statistic = table$F[2], numeratorDegrees = table$Df[2],
                               denominatorDegrees = table$Res.Df[2], p = table$`Pr(>F)`[2])
design_of <- function(x, y, intercept) cbind(if (intercept) rep(1, length(y)), matrix(x, length(y)))

reset_test <- function(x, y, intercept, powers) {
  X <- design_of(x, y, intercept)
  line <- lm(y ~ X - 1)
  f_test(anova(line, lm(y ~ X + outer(fitted(line), powers, "^") - 1)))
}
chow_test <- function(x, y, intercept, breakRow) {
  X <- design_of(x, y, intercept)
  later <- seq_along(y) > breakRow
  c(f_test(anova(lm(y ~ X - 1), lm(y ~ X + X:later - 1))),
    list(before = coef(lm(y ~ X - 1, subset = !later)), after = coef(lm(y ~ X - 1, subset = later))))
}
recursive_fit <- function(x, y, intercept) {
  X <- design_of(x, y, intercept)
  rows <- (ncol(X) + 1):length(y)
  w <- sapply(rows, function(t) {
    past <- lm.fit(X[1:(t - 1), , drop = FALSE], y[1:(t - 1)])
    h <- X[t, ] %*% solve(crossprod(X[1:(t - 1), , drop = FALSE]), X[t, ])
    (y[t] - sum(X[t, ] * coef(past))) / sqrt(1 + h)
  })
  slopes <- sapply(rows, function(t) tail(coef(lm.fit(X[1:t, , drop = FALSE], y[1:t])), 1))
  W <- cumsum(w) / sqrt(mean(w^2))
  list(recursiveResiduals = w, recursiveSlopes = slopes, cusum = W)
}
