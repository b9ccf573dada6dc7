# Reference values for the tests of the specification on two published data sets.
# Run from the top of the checkout with R 4.2 or later and the general packages named below:
#   Rscript src/test/resources/reference/specification.R > src/test/resources/reference/specification.csv
# RESET by lmtest::resettest, Breusch-Pagan and White by lmtest::bptest, Jarque-Bera by tseries, variance inflation
# by car::vif; what these do not offer (plant effects, score tests over states, the short form of White's test, raw
# inflation) is written out with lm.
suppressMessages({library(lmtest); library(car); library(tseries)})
for (p in c("lmtest", "car", "tseries")) cat(sprintf("# %s %s\n", p, packageVersion(p)))
cat(sprintf("# R %s.%s\n", R.version$major, R.version$minor))
cat("case,test,statistic,first,second,p\n")
put <- function(case, test, s, a, b, p) cat(sprintf("%s,%s,%.12g,%.12g,%.12g,%.12g\n", case, test, s, a, b, p))

# ---- rows independent -------------------------------------------------------------------------------------------
chi <- function(case, test, h) put(case, test, h$statistic, h$parameter, NA, h$p.value)
independent <- function(case, m, data, bp, white) {
  r <- resettest(m, power = 2:3, type = "fitted")
  put(case, "reset", r$statistic, r$parameter[1], r$parameter[2], r$p.value)
  chi(case, "breusch-pagan", bptest(m, bp, data = data))
  chi(case, "white", bptest(m, white, data = data))
  chi(case, "jarque-bera", jarque.bera.test(resid(m)))
}
inflation <- function(case, m) {
  X <- model.matrix(m); v <- diag(solve(crossprod(X)))
  raw <- v * colSums(X^2); centred <- vif(m)
  for (k in names(centred)) put(case, paste0("inflation:", k), raw[k], centred[k], NA, NA)
}
d <- read.csv("src/test/resources/published/primary-metals-27-states.csv")
d$y <- log(d$output); d$labour <- log(d$labor); d$capital <- log(d$capital)
cd <- lm(y ~ labour + capital, d)
independent("metals-cobb-douglas", cd, d, ~ labour + capital, ~ labour * capital + I(labour^2) + I(capital^2))
inflation("metals-cobb-douglas", cd)
d$ll <- d$labour^2 / 2; d$lk <- d$labour * d$capital; d$kk <- d$capital^2 / 2
tl <- lm(y ~ labour + capital + ll + lk + kk, d)
d$f <- fitted(tl)
independent("metals-translog", tl, d, ~ labour + capital + ll + lk + kk, ~ f + I(f^2))
inflation("metals-translog", tl)
s <- d; s$labour <- s$labour - mean(s$labour); s$capital <- s$capital - mean(s$capital)
s$ll <- s$labour^2 / 2; s$lk <- s$labour * s$capital; s$kk <- s$capital^2 / 2
inflation("metals-translog-scaled", lm(y ~ labour + capital + ll + lk + kk, s))

# ---- US states: pooled and within, rows independent and clustered -----------------------------------------------
u <- read.csv("src/test/resources/published/us-states-public-capital.csv")
u$y <- log(u$gsp); u$pcap <- log(u$pcap); u$pc <- log(u$pc); u$emp <- log(u$emp)
g <- factor(u$state); G <- nlevels(g)
pooled <- lm(y ~ pcap + pc + emp + unemp, u)
independent("states-pooled", pooled, u, ~ pcap + pc + emp + unemp,
            ~ (pcap + pc + emp + unemp)^2 + I(pcap^2) + I(pc^2) + I(emp^2) + I(unemp^2))
inflation("states-pooled", pooled)

# Score test, one vector a state: what is left of the further columns Z after X, times the residuals without them;
# Hotelling's T-squared in its F form
score <- function(case, test, narrow, Z) {
  X <- model.matrix(narrow); Zt <- as.matrix(resid(lm(Z ~ X - 1))); q <- ncol(Zt)
  v <- rowsum(Zt * resid(narrow), g); m <- colMeans(v)
  f <- G * drop(m %*% solve(cov(v), m)) * (G - q) / (q * (G - 1))
  put(case, test, f, q, G - q, pf(f, q, G - q, lower.tail = FALSE))
}
z <- function(x) (x - mean(x)) / sd(x)
u$e2 <- resid(pooled)^2; u$f <- z(fitted(pooled))
score("states-pooled-clustered", "reset", pooled, cbind(u$f^2, u$f^3))
score("states-pooled-clustered", "breusch-pagan", lm(e2 ~ 1, u), sapply(u[c("pcap", "pc", "emp", "unemp")], z))
score("states-pooled-clustered", "white", lm(e2 ~ 1, u), cbind(u$f, u$f^2))

dm <- function(x) x - ave(x, g)
w <- data.frame(lapply(u[c("y", "pcap", "pc", "emp", "unemp")], dm))
within <- lm(y ~ pcap + pc + emp + unemp - 1, w)
X <- as.matrix(u[c("pcap", "pc", "emp", "unemp")])
index <- z(drop(X %*% coef(within)))
w$i2 <- dm(index^2); w$i3 <- dm(index^3)
wide <- lm(y ~ pcap + pc + emp + unemp + i2 + i3 - 1, w)
df <- nrow(w) - G - 6
f <- ((deviance(within) - deviance(wide)) / 2) / (deviance(wide) / df)
put("states-within", "reset", f, 2, df, pf(f, 2, df, lower.tail = FALSE))
score("states-within-clustered", "reset", within, cbind(w$i2, w$i3))
w$e2 <- dm(resid(within)^2 * 1000)
lm.statistic <- function(case, test, formula) {
  a <- lm(formula, w); q <- a$rank
  s <- (nrow(w) - G) * (1 - deviance(a) / sum(w$e2^2))
  put(case, test, s, q, NA, pchisq(s, q, lower.tail = FALSE))
}
lm.statistic("states-within", "breusch-pagan", e2 ~ pcap + pc + emp + unemp - 1)
Z <- data.frame(lapply(as.data.frame(X), z))
P <- model.matrix(~ (pcap + pc + emp + unemp)^2 + I(pcap^2) + I(pc^2) + I(emp^2) + I(unemp^2) - 1, Z)
w$P <- apply(P, 2, dm)
lm.statistic("states-within", "white", e2 ~ P - 1)
w$i1 <- dm(index)
# the constants of states are out of e2 and of the columns already
score0 <- function(case, test, Z) {
  q <- ncol(Z); v <- rowsum(Z * w$e2, g); m <- colMeans(v)
  f <- G * drop(m %*% solve(cov(v), m)) * (G - q) / (q * (G - 1))
  put(case, test, f, q, G - q, pf(f, q, G - q, lower.tail = FALSE))
}
score0("states-within-clustered", "breusch-pagan", as.matrix(w[c("pcap", "pc", "emp", "unemp")]))
score0("states-within-clustered", "white", cbind(w$i1, w$i2))
chi("states-within", "jarque-bera", jarque.bera.test(resid(within)))
v <- diag(solve(crossprod(as.matrix(w[c("pcap", "pc", "emp", "unemp")]))))
for (k in names(v)) put("states-within", paste0("inflation:", k), v[k] * sum(u[[k]]^2), v[k] * sum(w[[k]]^2), NA, NA)
