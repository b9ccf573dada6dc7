# Reference values for the CES of three inputs, pooled and within plants, on notebooks-data/glassworks.csv.
# Run from the top of the checkout with R 4.2 or later (base and stats only):
#   Rscript src/test/resources/reference/ces-within.R > src/test/resources/reference/ces-within.csv
# Gauss-Newton steps by lm with plant dummies; derivatives by R's own deriv(), not by formulas of this project.
g <- read.csv("notebooks-data/glassworks.csv")
g <- g[complete.cases(g[, c("tonnes", "labour_hours", "machine_hours", "energy_gj")]), ]
gm <- function(x) exp(mean(log(x)))
d <- data.frame(y = log(g$tonnes), l = g$labour_hours / gm(g$labour_hours),
                m = g$machine_hours / gm(g$machine_hours), e = g$energy_gj / gm(g$energy_gj),
                t = g$year - min(g$year), b = g$breakdown_rate, p = factor(g$plant))
h <- deriv(~ -nu / rho * log(dl * l^-rho + dm * m^-rho + (1 - dl - dm) * e^-rho),
           c("nu", "rho", "dl", "dm"), function(nu, rho, dl, dm, l, m, e) {})
names <- c(nu = "scale", rho = "rho", dl = "share:labour", dm = "share:machines", t = "trend", b = "control:breakdown_rate")
fit <- function(model) {
  theta <- c(nu = 1.06, rho = 0.5, dl = 0.36, dm = 0.34)
  for (i in 1:100) {
    v <- h(theta["nu"], theta["rho"], theta["dl"], theta["dm"], d$l, d$m, d$e)
    d$z <- d$y - as.vector(v)
    J <- attr(v, "gradient")
    step <- if (model == "within") lm(z ~ J + t + b + p, data = d) else lm(z ~ J + t + b, data = d)
    move <- coef(step)[paste0("J", names(theta))]
    theta <- theta + move
    if (max(abs(move)) < 1e-13) break
  }
  s <- summary(step)$coefficients
  error <- c(s[paste0("J", c("nu", "rho", "dl", "dm")), 2], s[c("t", "b"), 2])
  value <- c(theta, s[c("t", "b"), 1])
  for (k in seq_along(names)) cat(sprintf("%s,%s,%.12g,%.12g\n", model, names[k], value[k], error[k]))
  cat(sprintf("%s,ssr,%.12g,0\n", model, sum(resid(step)^2)))
}
cat(sprintf("# R %s.%s\n", R.version$major, R.version$minor))
cat("model,parameter,value,error\n")
fit("pooled")
fit("within")
