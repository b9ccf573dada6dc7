# Reference control function on invented plants (control-function-data.csv, drawn by TransmissionBias): the moments written out and
# solved by optim, and the joint moments in their one-step form. Run from the top of the checkout:
#   Rscript src/test/resources/reference/control-function.R > src/test/resources/reference/control-function.csv
suppressMessages({library(AER); library(sandwich)})
d <- read.csv("src/test/resources/reference/control-function-data.csv")
d <- d[order(d$plant, d$period), ]
cat(sprintf("# R %s.%s, AER %s, sandwich %s\n", R.version$major, R.version$minor,
            packageVersion("AER"), packageVersion("sandwich")))
cat("model,name,value\n")
d$y <- log(d$output); d$l <- log(d$labour); d$k <- log(d$machines); d$m <- log(d$material)
back <- function(x) ave(x, d$plant, FUN = function(v) c(NA, head(v, -1)))
d$phi <- fitted(lm(y ~ poly(l, k, m, degree = 3), data = d))
lagged <- data.frame(l = back(d$l), k = back(d$k), phi = back(d$phi), m = back(d$m))
ok <- !is.na(lagged$l)
moments <- function(b, degree) {
  omega <- (d$phi - b[1] * d$l - b[2] * d$k)[ok]
  before <- (lagged$phi - b[1] * lagged$l - b[2] * lagged$k)[ok]
  xi <- lm.fit(cbind(1, poly(before, degree)), omega)$residuals
  c(mean(xi * lagged$l[ok]), mean(xi * d$k[ok]))
}
for (degree in 1:3) {
  f <- function(b) 1e6 * sum(moments(b, degree)^2)
  at <- c(0.6, 0.4)
  for (again in 1:20) at <- optim(at, f, control = list(reltol = 1e-16, maxit = 5000))$par
  cat(sprintf("moments %d,labour,%.12g\nmoments %d,machines,%.12g\n", degree, at[1], degree, at[2]))
}
e <- d[ok, ]; e$l0 <- lagged$l[ok]; e$k0 <- lagged$k[ok]; e$m0 <- lagged$m[ok]
w <- ivreg(y ~ l + k + poly(k0, m0, degree = 3) | l0 + k + poly(k0, m0, degree = 3), data = e)
g <- length(unique(e$plant)); n <- nrow(e); p <- length(coef(w))
v <- vcovCL(w, cluster = e$plant, type = "HC0", cadjust = FALSE) * g / (g - 1) * (n - 1) / (n - p)
cat(sprintf("joint,labour,%.12g\njoint,machines,%.12g\n", coef(w)["l"], coef(w)["k"]))
cat(sprintf("joint error,labour,%.12g\njoint error,machines,%.12g\n", sqrt(v["l", "l"]), sqrt(v["k", "k"])))
