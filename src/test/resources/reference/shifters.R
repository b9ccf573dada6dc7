# Reference values for what is said before fitting, on invented brickyards: which way coefficients lean
# if one input answers to a good year, and how a quantity answers to its price once plants and periods
# are taken out. lm alone; the clustered covariance is written out: G/(G-1) (N-1)/(N-K), K the slopes.
# Run from the top of the checkout:
#   Rscript src/test/resources/reference/shifters.R > src/test/resources/reference/shifters.csv
cat(sprintf("# R %s.%s\n", R.version$major, R.version$minor))
cat("name,value\n")
say <- function(name, value) cat(sprintf("%s,%.14g\n", name, value))
d <- subset(read.csv("src/test/resources/reference/brickyards.csv"), fuel > 0)
plant <- factor(d$plant); year <- factor(d$year)
x <- list(labour = log(d$hours), machines = log(d$machine_hours), fuel = log(d$fuel))
about <- function(v) sum((v - mean(v))^2)
for (n in names(x)) say(paste0("share:", n), sum((x[[n]] - ave(x[[n]], plant))^2) / about(x[[n]]))
for (effects in c("within", "pooled")) {
  f <- if (effects == "within") lm(x$labour ~ x$machines + x$fuel + plant + year)
       else lm(x$labour ~ x$machines + x$fuel + year)
  say(paste0(effects, ":fuel"), -coef(f)[["x$fuel"]])
  say(paste0(effects, ":machines"), -coef(f)[["x$machines"]])
}
price <- function(name, w) {
  q <- x[[name]]
  r <- lm(w ~ plant + year)
  say(paste0("spread:", name), summary(r)$sigma)
  say(paste0("left:", name), sum(resid(r)^2) / about(w))
  f <- lm(q ~ w + plant + year)
  say(paste0("response:", name), coef(f)[["w"]])
  say(paste0("correlation:", name), cor(resid(r), resid(lm(q ~ plant + year))))
  # deviations from plants and the dummies of years that are left: slopes are price and years
  X <- cbind(w, model.matrix(~ year)[, -1])
  X <- apply(X, 2, function(v) v - ave(v, plant))
  e <- resid(f); G <- nlevels(plant); N <- length(q); K <- ncol(X)
  S <- rowsum(X * e, plant); B <- solve(crossprod(X))
  V <- G / (G - 1) * (N - 1) / (N - K) * B %*% crossprod(S) %*% B
  say(paste0("error:", name), sqrt(V[1, 1]))
  say(paste0("p:", name), 2 * pt(-abs(coef(f)[["w"]] / sqrt(V[1, 1])), G - 1))
}
price("machines", log(d$rental))
