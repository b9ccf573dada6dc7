# Reference values for inputs that some rows do not use: the log of max(x, D) and a dummy D beside it
# (Battese 1997), on invented brickyards of which some burn no fuel. lm alone; errors are classical.
# Run from the top of the checkout:
#   Rscript src/test/resources/reference/zeros.R > src/test/resources/reference/zeros.csv
cat(sprintf("# R %s.%s\n", R.version$major, R.version$minor))
cat("case,parameter,value,error\n")
d <- read.csv("src/test/resources/reference/brickyards.csv")
t <- d$year - min(d$year)
D <- as.numeric(d$fuel == 0)
y <- log(d$bricks)
say <- function(case, fit, names) {
  s <- summary(fit)$coefficients
  for (k in names(names)) {
    cat(sprintf("%s,%s,%.14g,%.14g\n", case, names[[k]], s[k, 1], s[k, 2]))
  }
}
geo <- function(x) exp(mean(log(x[x > 0])))
z1 <- log(d$hours / geo(d$hours))
z2 <- log(d$machine_hours / geo(d$machine_hours))
z3 <- log(pmax(d$fuel / geo(d$fuel), D))
first <- c(z1 = "labour", z2 = "machines", z3 = "fuel", D = "zero:fuel", t = "trend")
say("pooled", lm(y ~ z1 + z2 + z3 + D + t), first)
say("within", lm(y ~ z1 + z2 + z3 + D + t + factor(d$plant)), first)
# As Battese writes it, without dividing: ln max(x, D) is zero where no fuel is burnt.
x1 <- log(d$hours); x2 <- log(d$machine_hours); x3 <- log(pmax(d$fuel, D))
say("undivided", lm(y ~ x1 + x2 + x3 + D + t),
    c("(Intercept)" = "constant", x1 = "labour", x2 = "machines", x3 = "fuel", D = "zero:fuel", t = "trend"))
h <- function(a, b) 0.5 * a * b
q11 <- h(z1, z1); q22 <- h(z2, z2); q33 <- h(z3, z3); q12 <- z1 * z2; q13 <- z1 * z3; q23 <- z2 * z3
say("translog", lm(y ~ z1 + z2 + z3 + q11 + q12 + q13 + q22 + q23 + q33 + D + t),
    c(z1 = "labour", z2 = "machines", z3 = "fuel", q11 = "labour*labour", q12 = "labour*machines",
      q13 = "labour*fuel", q22 = "machines*machines", q23 = "machines*fuel", q33 = "fuel*fuel",
      D = "zero:fuel", t = "trend"))
u <- d$fuel > 0
say("drop", lm(y[u] ~ z1[u] + z2[u] + z3[u] + t[u]),
    c("z1[u]" = "labour", "z2[u]" = "machines", "z3[u]" = "fuel", "t[u]" = "trend"))
