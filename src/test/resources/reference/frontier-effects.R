# Reference values of inefficiency from plant effects (Schmidt and Sickles 1984): least squares with a dummy for each state; the
# greatest effect less that of the state, with the standard error of that difference. Run from the top of the checkout:
#   Rscript src/test/resources/reference/frontier-effects.R > src/test/resources/reference/frontier-effects.csv
cat(sprintf("# R %s.%s, base and stats only\n", R.version$major, R.version$minor))
cat("case,name,value,se\n")
d <- read.csv("src/test/resources/published/us-states-public-capital.csv")
d$state <- factor(d$state)
m <- lm(log(gsp) ~ 0 + state + log(pcap) + log(pc) + log(emp) + unemp, d)
a <- coef(m)[seq_len(nlevels(d$state))]
v <- vcov(m)[seq_along(a), seq_along(a)]
b <- which.max(a)
for (i in seq_along(a))
  cat(sprintf("states,%s,%.15g,%.15g\n", levels(d$state)[i], a[b] - a[i], sqrt(max(0, v[b, b] + v[i, i] - 2 * v[b, i]))))
# the law of the likelihood ratio at a bound: an equal mixture of chi-squared laws (Kodde and Palm 1986)
mixed <- function(f, p) uniroot(function(x) (if (f) pchisq(x, f, lower.tail = FALSE) else 0) / 2 +
  pchisq(x, f + 1, lower.tail = FALSE) / 2 - p, c(0.01, 50), tol = 1e-13)$root
for (f in 0:1) for (p in c(0.1, 0.05, 0.01)) cat(sprintf("mixed,%d at %g,%.15g,NA\n", f, p, mixed(f, p)))
