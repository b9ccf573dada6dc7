# Systems of equations iterated to maximum likelihood: reference values for SeeminglyUnrelatedTest.
# R 4.2.2, systemfit 1.1-28. Run from the top of the
# checkout: Rscript src/test/resources/reference/equation-systems.R > .../equation-systems.csv
# Tolerance 1e-12: the package's own default of 1e-5 stops short of six digits.
suppressPackageStartupMessages(library(systemfit))
published <- "src/test/resources/published/"
out <- function(set, fit) {
  b <- coef(fit)
  s <- sqrt(diag(vcov(fit)))
  for (n in names(b)) cat(sprintf("%s,%s,%.15g,%.15g\n", set, n, b[[n]], s[[n]]))
  cat(sprintf("%s,logLikelihood,%.15g,\n", set, as.numeric(logLik(fit))))
}
cat("set,name,value,se\n")

# Berndt and Wood (1975): shares of capital, labour, energy; materials left out.
d <- read.csv(paste0(published, "us-manufacturing-klem.csv"))
d <- transform(d, k = log(capitalprice / materialsprice), l = log(laborprice / materialsprice),
               e = log(energyprice / materialsprice))
equations <- list(K = capitalcost ~ k + l + e, L = laborcost ~ k + l + e, E = energycost ~ k + l + e)
symmetry <- c("K_l - L_k = 0", "K_e - E_k = 0", "L_e - E_l = 0")
iterated <- function(equations, data, restrictions = NULL) {
  systemfit(equations, "SUR", data = data, restrict.matrix = restrictions, maxiter = 5000,
            tol = 1e-12, methodResidCov = "noDfCor")
}
out("manufacturing", iterated(equations, d, symmetry))
out("manufacturing-free", iterated(equations, d))

# Christensen and Greene (1976): cost and the shares of capital and labour; fuel left out.
d <- read.csv(paste0(published, "electricity-1970.csv"))[1:123, ]
d <- transform(d, c = log(cost / fuel), y = log(output), k = log(capital / fuel),
               l = log(labor / fuel))
d <- transform(d, yy = y^2 / 2, kk = k^2 / 2, ll = l^2 / 2, kl = k * l, yk = y * k, yl = y * l)
equations <- list(C = c ~ y + yy + k + l + kk + ll + kl + yk + yl, K = capitalshare ~ k + l + y,
                  L = laborshare ~ k + l + y)
restrictions <- c(
  "K_(Intercept) - C_k = 0", "K_k - C_kk = 0", "K_l - C_kl = 0", "K_y - C_yk = 0",
  "L_(Intercept) - C_l = 0", "L_k - C_kl = 0", "L_l - C_ll = 0", "L_y - C_yl = 0")
out("electricity", iterated(equations, d, restrictions))

# F of homogeneity in prices in the cost equation alone, by least squares with and without it.
d <- transform(d, ln_cost = log(cost), lk = log(capital), llab = log(labor), lf = log(fuel))
ssr <- function(m) sum(resid(m)^2)
free <- lm(ln_cost ~ y + yy + lk + llab + lf, d)
held <- lm(c ~ y + yy + k + l, d)
cat(sprintf("electricity-equation,homogeneity F,%.15g,\n", (ssr(held) - ssr(free)) / (ssr(free) / 117)))
