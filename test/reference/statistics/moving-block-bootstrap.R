# Slopes of new records put together from blocks with given starts (counted from 0), each record fitted by lm.fit.
# starts: one draw after the other.
block_bootstrap <- function(x, y, intercept, blockLength, starts, resample) {
  n <- length(y)
  fitted_by <- function(x, y) lm.fit(if (intercept) cbind(1, x) else cbind(x), y)
  line <- fitted_by(x, y)
  e <- residuals(line)
  at_start <- embed(e, blockLength)[, blockLength:1, drop = FALSE]
  centred <- sweep(at_start, 2, colMeans(at_start))
  slopes <- apply(matrix(starts, ceiling(n / blockLength)), 2, function(s) {
    rows <- head(as.vector(outer(1:blockLength, s, "+")), n)
    new <- if (resample == "pairs") fitted_by(x[rows], y[rows]) else
      fitted_by(x, fitted(line) + head(as.vector(t(centred[s + 1, ])), n))
    tail(coef(new), 1)
  })
  q <- quantile(slopes, c(0.025, 0.05, 0.5, 0.95, 0.975))
  list(slope = tail(coef(line), 1), q025 = q[1], q05 = q[2], q50 = q[3], q95 = q[4], q975 = q[5],
       standardError = sd(slopes))
}
