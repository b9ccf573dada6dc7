# Reference strength of first stages on the 48 US states, 1972 to 1986: ln gsp on ln pcap, ln pc, ln emp and unemp, by two
# groups of endogenous columns; instruments lag ln emp, second lag ln emp, lag ln pc. Run from the top of the checkout:
#   Rscript src/test/resources/reference/first-stages.R > src/test/resources/reference/first-stages.csv
suppressMessages({library(AER); library(sandwich)})
d <- read.csv("src/test/resources/published/us-states-public-capital.csv")
d <- d[order(d$state, d$year), ]
back <- function(x, k) ave(x, d$state, FUN = function(v) c(rep(NA, k), head(v, -k)))
d$y <- log(d$gsp); d$g <- log(d$pcap); d$c <- log(d$pc); d$e <- log(d$emp)
d$z1 <- back(d$e, 1); d$z2 <- back(d$e, 2); d$z3 <- back(d$c, 1)
d <- d[!is.na(d$z2), ]
cat(sprintf("# R %s.%s, AER %s, sandwich %s\n", R.version$major, R.version$minor,
            packageVersion("AER"), packageVersion("sandwich")))
cat("name,kind,value\n")
out <- c("z1", "z2", "z3")
v <- function(m, kind) switch(kind, CLASSICAL = vcov(m), HC1 = vcovHC(m, "HC1"),
                              CLUSTERED = vcovCL(m, cluster = d$state, type = "HC1"))
for (kind in c("CLASSICAL", "HC1", "CLUSTERED")) {
  # one endogenous column, emp
  m <- lm(e ~ g + c + unemp + z1 + z2 + z3, data = d)
  rest <- residuals(lm(cbind(z1, z2, z3) ~ g + c + unemp, data = d))
  s <- crossprod(rest); b <- coef(m)[out]; w <- v(m, kind)[out, out]
  cat(sprintf("effective,%s,%.15g\n", kind, drop(b %*% s %*% b) / sum(diag(w %*% s))))
  # two, pc and emp: what two-stage least squares of one on the other leaves, on all instruments
  for (own in c("c", "e")) {
    other <- setdiff(c("c", "e"), own)
    f <- as.formula(sprintf("%s ~ g + %s + unemp | g + unemp + z1 + z2 + z3", own, other))
    d$left <- residuals(ivreg(f, data = d))
    m <- lm(left ~ g + unemp + z1 + z2 + z3, data = d)
    b <- coef(m)[out]
    cat(sprintf("conditional %s,%s,%.15g\n", own, kind, drop(b %*% solve(v(m, kind)[out, out], b)) / 2))
  }
  # Anderson-Rubin F of the coefficient of emp at 0.5
  m <- lm(I(y - 0.5 * e) ~ g + c + unemp + z1 + z2 + z3, data = d)
  b <- coef(m)[out]
  cat(sprintf("anderson-rubin,%s,%.15g\n", kind, drop(b %*% solve(v(m, kind)[out, out], b)) / 3))
}
