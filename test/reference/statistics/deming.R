# Deming's line as the direction that principal axes find once y is measured in units in which both errors are alike, with
# its jackknife, each line found anew.
deming_line <- function(x, y, delta) {
  axis <- eigen(cov(cbind(x, y / sqrt(delta))))$vectors[, 1]
  b <- axis[2] / axis[1] * sqrt(delta)
  c(slope = b, intercept = mean(y) - b * mean(x))
}
deming_jackknife <- function(x, y, delta) {
  n <- length(y)
  line <- deming_line(x, y, delta)
  each <- sapply(seq_len(n), function(i) deming_line(x[-i], y[-i], delta))
  errors <- apply(each, 1, function(b) sd(n * mean(b) - (n - 1) * b) / sqrt(n))
  list(slope = line[1], intercept = line[2], slopeStandardError = errors[1], interceptStandardError = errors[2])
}
