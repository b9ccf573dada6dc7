# Reference influence measures on the 48 US states, pooled and with a constant for each state, and Huber's M estimates.
# Run from the top of the checkout:
#   Rscript src/test/resources/reference/influence.R > src/test/resources/reference/influence.csv
suppressMessages(library(MASS))
d <- read.csv("src/test/resources/published/us-states-public-capital.csv")
f <- log(gsp) ~ log(pcap) + log(pc) + log(emp) + unemp
cat(sprintf("# R %s.%s, MASS %s\n", R.version$major, R.version$minor, packageVersion("MASS")))
cat("model,row,cook,leverage,studentised,deleted,dffits,covratio,b_pcap,b_pc,b_emp,b_unemp\n")
slopes <- c("log(pcap)", "log(pc)", "log(emp)", "unemp")
for (model in c("pooled", "within")) {
  m <- if (model == "pooled") lm(f, d) else lm(update(f, . ~ . + factor(state)), d)
  most <- order(-cooks.distance(m))[c(1:8, 400, 816)]
  b <- dfbetas(m)[, slopes]
  for (i in most) cat(sprintf("%s,%d,%s\n", model, i - 1, paste(sprintf("%.14g", c(cooks.distance(m)[i], hatvalues(m)[i],
    rstandard(m)[i], rstudent(m)[i], dffits(m)[i], covratio(m)[i], b[i, ])), collapse = ",")))
  r <- rlm(formula(m), d, k = 1.345, scale.est = "MAD", acc = 1e-13, maxit = 1000)
  cat(sprintf("huber-%s,0,%s\n", model, paste(sprintf("%.14g", c(r$s, sum(r$w < 1), coef(r)[slopes])), collapse = ",")))
}
