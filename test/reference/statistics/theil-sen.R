# Theil-Sen in base R: all pairs by outer differences; the interval by ranks as Sen 1968 has it.
theil_sen <- function(x, y, level) {
  n <- length(x)
  pairs <- upper.tri(matrix(0, n, n)) & outer(x, x, "!=")
  slopes <- sort((outer(y, y, "-") / outer(x, x, "-"))[pairs])
  N <- length(slopes)
  tied <- function(k) sum(k * (k - 1) * (2 * k + 5))
  v <- (tied(n) - tied(table(x)) - tied(table(y))) / 18
  C <- qnorm(1 - (1 - level) / 2) * sqrt(v)
  b <- median(slopes)
  # The M1-th smallest and the M1-th largest, M1 = (N - C)/2.
  list(slope = b, intercept = median(y) - b * median(x),
       confidence = c(slopes[round((N - C) / 2)], slopes[round((N + C) / 2) + 1]))
}
