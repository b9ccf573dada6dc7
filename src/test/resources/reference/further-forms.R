# Reference values for nested CES, generalised Leontief and restricted translogs, pooled and within plants,
# on notebooks-data/glassworks.csv. Run from the top of the checkout with R 4.2 or later (base and stats only):
#   Rscript src/test/resources/reference/further-forms.R > src/test/resources/reference/further-forms.csv
# Sums of squares are minimised by optim (BFGS, numerical derivatives) from several starts, then by Gauss-Newton
# steps with numerical derivatives; the linear parameters are concentrated out by lm. Formulas are the definitions.
g <- read.csv("notebooks-data/glassworks.csv")
g <- g[complete.cases(g[, c("tonnes", "labour_hours", "machine_hours", "energy_gj")]), ]
gm <- function(x) exp(mean(log(x)))
y <- log(g$tonnes)
L <- g$labour_hours / gm(g$labour_hours); M <- g$machine_hours / gm(g$machine_hours); E <- g$energy_gj / gm(g$energy_gj)
t <- g$year - min(g$year); b <- g$breakdown_rate; p <- factor(g$plant)
within <- function(v) v - ave(v, p)
beside <- list(pooled = cbind(1, t, b), within = cbind(within(t), within(b)))
# The residual with constant, trend and control concentrated out.
residual <- function(h, model) {
  r <- y - h
  if (model == "within") r <- within(r)
  qr.resid(qr(beside[[model]]), r)
}
minimise <- function(f, starts, model) {
  ssr <- function(theta) { h <- suppressWarnings(f(theta)); if (all(is.finite(h))) sum(residual(h, model)^2) else 1e10 }
  best <- NULL
  for (s in starts) {
    o <- optim(s, ssr, method = "BFGS", control = list(maxit = 2000, reltol = 1e-15))
    if (is.null(best) || o$value < best$value) best <- o
  }
  theta <- best$par
  for (i in 1:60) {
    r <- residual(f(theta), model)
    J <- sapply(seq_along(theta), function(k) {
      e <- 1e-5 * max(1, abs(theta[k])); a <- theta; a[k] <- a[k] + e; c <- theta; c[k] <- c[k] - e
      (residual(f(a), model) - residual(f(c), model)) / (2 * e)
    })
    step <- qr.coef(qr(J), r)
    if (ssr(theta - step) < ssr(theta + step)) step <- -step
    theta <- theta + ifelse(is.na(step), 0, step)
    if (max(abs(step), na.rm = TRUE) < 1e-11) break
  }
  list(theta = theta, ssr = ssr(theta))
}
nested <- function(th) {   # nu, rho, rho of labour and machines, share of labour in the nest, share of the nest
  y1 <- (th[4] * L^-th[3] + (1 - th[4]) * M^-th[3])^(-1 / th[3])
  -th[1] / th[2] * log(th[5] * y1^-th[2] + (1 - th[5]) * E^-th[2])
}
leontief <- function(th) { # nu, b(LM), b(LE), b(MM), b(ME), b(EE)
  b11 <- 1 - 2 * th[2] - 2 * th[3] - th[4] - 2 * th[5] - th[6]
  th[1] * log(b11 * L + 2 * th[2] * sqrt(L * M) + 2 * th[3] * sqrt(L * E) + th[4] * M + 2 * th[5] * sqrt(M * E) + th[6] * E)
}
l <- log(L); m <- log(M); e <- log(E)
say <- function(model, form, name, value) cat(sprintf("%s,%s,%s,%.12g\n", model, form, name, value))
cat(sprintf("# R %s.%s\n", R.version$major, R.version$minor))
cat("model,form,quantity,value\n")
for (model in c("pooled", "within")) {
  n <- minimise(nested, list(c(1.05, .5, .3, .5, .7), c(1.05, -.3, 1, .5, .7), c(1.05, 2, -.3, .5, .7)), model)
  for (k in 1:5) say(model, "nested-ces", c("scale", "rho", "rho:labour+machines", "nest-share:labour", "share:labour+machines")[k], n$theta[k])
  say(model, "nested-ces", "ssr", n$ssr)
  q <- minimise(leontief, list(c(1.05, .1, .1, .2, .1, .1), c(1.05, .02, .02, .3, .02, .3)), model)
  for (k in 1:6) say(model, "generalised-leontief", c("scale", "weight:labour*machines", "weight:labour*energy", "weight:machines", "weight:machines*energy", "weight:energy")[k], q$theta[k])
  say(model, "generalised-leontief", "ssr", q$ssr)
  # Translog with constant returns: everything relative to energy. Homogeneous: levels of one input besides.
  d <- data.frame(y, l, m, e, t, b, p)
  with.p <- if (model == "within") "+ p" else ""
  cr <- lm(as.formula(paste("I(y - e) ~ I(l - e) + I(m - e) + I(.5*(l-e)^2) + I((l-e)*(m-e)) + I(.5*(m-e)^2) + t + b", with.p)), d)
  ho <- lm(as.formula(paste("y ~ e + I(l - e) + I(m - e) + I(.5*(l-e)^2) + I((l-e)*(m-e)) + I(.5*(m-e)^2) + t + b", with.p)), d)
  fr <- lm(as.formula(paste("y ~ l + m + e + I(.5*l^2) + I(.5*m^2) + I(.5*e^2) + I(l*m) + I(l*e) + I(m*e) + t + b", with.p)), d)
  se <- function(f, k) sqrt(vcov(f)[k, k])
  for (f in list(list("constant-returns", cr), list("homogeneous", ho))) {
    k <- c(labour = "I(l - e)", machines = "I(m - e)", "labour*labour" = "I(0.5 * (l - e)^2)", "labour*machines" = "I((l - e) * (m - e))", "machines*machines" = "I(0.5 * (m - e)^2)")
    for (i in seq_along(k)) {
      say(model, f[[1]], names(k)[i], coef(f[[2]])[k[i]])
      say(model, f[[1]], paste0("se ", names(k)[i]), se(f[[2]], k[i]))
    }
    say(model, f[[1]], "ssr", sum(resid(f[[2]])^2))
  }
  s1 <- sum(resid(cr)^2); s2 <- sum(resid(ho)^2); s0 <- sum(resid(fr)^2); df <- df.residual(fr)
  say(model, "constant-returns", "F", (s1 - s0) / 4 / (s0 / df))
  say(model, "homogeneous", "F", (s2 - s0) / 3 / (s0 / df))
  # Homothetic: for given kappa linear; kappa by a line search.
  given <- function(k) sum(resid(lm(as.formula(paste("y ~ I(l + k*l^2/2) + I(m + k*m^2/2) + I(e + k*e^2/2) + I((l-m)^2) + I((l-e)^2) + I((m-e)^2) + t + b", with.p)), cbind(d, k)))^2)
  o <- optimize(given, c(-2, 2), tol = 1e-10)
  say(model, "homothetic", "kappa", o$minimum)
  say(model, "homothetic", "ssr", o$objective)
}
