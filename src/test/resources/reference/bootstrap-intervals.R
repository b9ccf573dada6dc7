# Reference bootstrap intervals from given values: a skewed set of 199, another of 998, and values without each group.
# Run from the top of the checkout:
#   Rscript src/test/resources/reference/bootstrap-intervals.R > src/test/resources/reference/bootstrap-intervals.csv
suppressMessages(library(boot))
cat(sprintf("# R %s.%s, boot %s\n", R.version$major, R.version$minor, packageVersion("boot")))
cat("case,level,percentile low,high,corrected low,high,accelerated low,high\n")
cases <- list(list(n = 199, estimate = 1.25), list(n = 998, estimate = 0.9))
for (i in seq_along(cases)) {
  n <- cases[[i]]$n
  # values that any language can write: no random numbers are drawn
  t <- exp(qnorm(((seq_len(n) * 97) %% n + 0.5) / n) * 0.4 + 0.05 * sin(seq_len(n)))
  L <- qnorm((seq_len(25) - 0.3) / 25.7)^3 + 0.4 * cos(seq_len(25)) + 0.2 * (seq_len(25) / 10)^2
  L <- L - mean(L)
  t0 <- cases[[i]]$estimate
  for (level in c(0.95, 0.9)) {
    p <- boot:::perc.ci(t, level)[4:5]
    bc <- boot:::bca.ci(list(), level, 1, t0 = t0, t = t, L = c(-1, 0, 1))[4:5]
    bca <- boot:::bca.ci(list(), level, 1, t0 = t0, t = t, L = L)[4:5]
    cat(sprintf("%d,%g,%s\n", i, level, paste(sprintf("%.14g", c(p, bc, bca)), collapse = ",")))
  }
}
