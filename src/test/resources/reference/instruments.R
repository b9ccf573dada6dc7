# Reference two-stage least squares on the 48 US states, with diagnostics. ln gsp on ln pcap, ln pc, ln emp, unemp, where
# ln emp and ln pc are endogenous and their first and second lags (of ln emp) and first lag (of ln pc) are instruments.
# Run from the top of the checkout:
#   Rscript src/test/resources/reference/instruments.R > src/test/resources/reference/instruments.csv
suppressMessages({library(AER); library(sandwich)})
d <- read.csv("src/test/resources/published/us-states-public-capital.csv")
d <- d[order(d$state, d$year), ]
back <- function(x, k) ave(x, d$state, FUN = function(v) c(rep(NA, k), head(v, -k)))
d$y <- log(d$gsp); d$g <- log(d$pcap); d$c <- log(d$pc); d$e <- log(d$emp)
d$e1 <- back(d$e, 1); d$e2 <- back(d$e, 2); d$c1 <- back(d$c, 1)
d <- d[complete.cases(d), ]
cat(sprintf("# R %s.%s, AER %s, sandwich %s\n", R.version$major, R.version$minor,
            packageVersion("AER"), packageVersion("sandwich")))
cat("model,quantity,row,column,value\n")
put <- function(model, quantity, i, j, v) cat(sprintf("%s,%s,%d,%d,%.15g\n", model, quantity, i, j, v))
report <- function(name, m, slopes, z, absorbed, groups) {
  b <- coef(m)[slopes]
  for (i in seq_along(b)) put(name, "coefficient", i - 1, 0, b[i])
  put(name, "ssr", 0, 0, sum(residuals(m)^2))
  n <- nobs(m); k <- length(b)
  # clustered: the finite-sample factor of this project, slopes counted, group effects not
  g <- length(unique(groups))
  cl <- function(x, ...) {
    parameters <- sum(!is.na(coef(x))) - absorbed
    vcovCL(x, cluster = groups, type = "HC0", cadjust = FALSE) * g / (g - 1) * (n - 1) / (n - parameters)
  }
  hc1 <- function(x, ...) vcovHC(x, type = "HC0") * n / (n - sum(!is.na(coef(x))))
  kinds <- list(CLASSICAL = NULL, HC1 = hc1, CLUSTERED = cl)
  for (kind in names(kinds)) {
    if (kind == "CLUSTERED" && absorbed > 0) next # its dummies make the clustered matrix singular: see below
    v <- if (is.null(kinds[[kind]])) vcov(m) else kinds[[kind]](m)
    v <- v[slopes, slopes]
    for (i in seq_len(k)) for (j in seq_len(i)) put(name, paste0("covariance ", kind), i - 1, j - 1, v[i, j])
    s <- summary(m, vcov. = kinds[[kind]], diagnostics = TRUE)$diagnostics
    for (r in seq_len(nrow(s))) put(name, paste0(rownames(s)[r], " ", kind), 0, 0, s[r, "statistic"])
  }
  # Hansen's J at the efficient two-step estimate, by its definition
  x <- model.matrix(m, component = "regressors"); u <- residuals(m); y <- d$y
  js <- list(HC1 = crossprod(z * u), CLUSTERED = crossprod(rowsum(z * u, groups)))
  if (absorbed > 0) { # in deviations from group means
    dev <- function(a) apply(as.matrix(a), 2, function(v) v - ave(v, groups))
    x <- dev(x[, slopes]); y <- dev(y); z <- dev(z)
    js <- list(HC1 = crossprod(z * u), CLUSTERED = crossprod(rowsum(z * u, groups)))
  }
  for (kind in names(js)) {
    w <- solve(js[[kind]]); zx <- crossprod(z, x); zy <- crossprod(z, y)
    b2 <- solve(t(zx) %*% w %*% zx, t(zx) %*% w %*% zy)
    gm <- zy - zx %*% b2
    put(name, paste0("J ", kind), 0, 0, drop(t(gm) %*% w %*% gm))
  }
}
z <- with(d, cbind(1, g, unemp, e1, e2, c1))
pooled <- ivreg(y ~ g + c + e + unemp | g + unemp + e1 + e2 + c1, data = d)
report("pooled", pooled, c("(Intercept)", "g", "c", "e", "unemp"), z, 0, d$state)
within <- ivreg(y ~ g + c + e + unemp + factor(state) | g + unemp + e1 + e2 + c1 + factor(state), data = d)
report("within", within, c("g", "c", "e", "unemp"), z[, -1], 48, d$state)
# clustered within: the same slopes from deviations, where no group effect is left to count
for (v in c("y", "g", "c", "e", "unemp", "e1", "e2", "c1")) d[[v]] <- d[[v]] - ave(d[[v]], d$state)
deviations <- ivreg(y ~ g + c + e + unemp - 1 | g + unemp + e1 + e2 + c1 - 1, data = d)
report("deviations", deviations, c("g", "c", "e", "unemp"), as.matrix(d[, c("g", "unemp", "e1", "e2", "c1")]), 0, d$state)
