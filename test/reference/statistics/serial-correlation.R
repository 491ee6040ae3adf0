# Tests of serial correlation with base R alone.

# Breusch-Godfrey as lmtest::bgtest(fit, order, type = "Chisq", fill = 0): the auxiliary regression on the fit's own
# design and the residuals' past, zero before the first; LM = n R2, R2 about zero.
breusch_godfrey <- function(fit, order) {
  e <- residuals(fit)
  n <- length(e)
  past <- sapply(1:order, function(lag) c(rep(0, lag), e[1:(n - lag)]))
  auxiliary <- lm.fit(cbind(model.matrix(fit), past), e)
  statistic <- n * (1 - sum(auxiliary$residuals^2) / sum(e^2))
  list(statistic = statistic, df = order, p = pchisq(statistic, order, lower.tail = FALSE))
}

box <- function(x, lag, fitdf) {
  test <- Box.test(x, lag = lag, type = "Ljung-Box", fitdf = fitdf)
  # Box.test's own p is 1 - pchisq, which keeps few digits of a small one.
  list(
    statistic = test$statistic, df = test$parameter,
    p = pchisq(test$statistic, test$parameter, lower.tail = FALSE)
  )
}

lag_one <- function(x) acf(x, lag.max = 1, plot = FALSE)$acf[2]
