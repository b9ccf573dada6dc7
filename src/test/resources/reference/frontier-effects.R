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
# the profile of the half-normal log-likelihood (Aigner, Lovell and Schmidt 1977, eq. 10) over su and over su/sv: where twice the
# distance from its maximum is 0.5, for the electricity companies
d <- read.csv("src/test/resources/published/electricity-1970.csv")[1:123, ]
q <- log(d$output)
x <- qr.Q(qr(cbind(1, q, q^2 / 2, log(d$capital / d$fuel), log(d$labor / d$fuel)))) * sqrt(123)
y <- -log(d$cost / d$fuel)
value <- function(b, sv, su) {
  e <- drop(y - x %*% b); s <- sqrt(su^2 + sv^2)
  sum(log(2) - log(s) + dnorm(e / s, log = TRUE) + pnorm(-e * su / sv / s, log.p = TRUE))
}
climb <- function(f, p) {
  for (i in 1:4) p <- optim(p, f, method = "BFGS", control = list(fnscale = -1, reltol = 1e-15, maxit = 5000))$par
  list(par = p, value = f(p))
}
b <- coef(lm(y ~ x - 1)); s <- log(sd(y - x %*% b))
top <- climb(function(p) value(p[1:5], exp(p[6]), exp(p[7])), c(b, s, s))
at <- function(k, ratio) climb(function(p) value(p[1:5], exp(p[6]), if (ratio) exp(p[6] + k) else exp(k)), top$par[1:6])$value
for (ratio in c(FALSE, TRUE)) {
  centre <- top$par[7] - ratio * top$par[6]
  end <- function(a, b) exp(uniroot(function(k) 2 * (top$value - at(k, ratio)) - 0.5, c(a, b), tol = 1e-9)$root)
  cat(sprintf("profile,%s,%.15g,%.15g\n", if (ratio) "ratio" else "scale", end(centre - 3, centre), end(centre, centre + 3)))
}
