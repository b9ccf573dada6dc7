# Reference maximum-likelihood fits with a one-sided error: the log-likelihoods written out from the papers, in the papers'
# own parameters, maximised by optim and polished by Newton steps with differences. Run from the top of the checkout:
#   Rscript src/test/resources/reference/one-sided-errors.R > src/test/resources/reference/one-sided-errors.csv
cat(sprintf("# R %s.%s, base and stats only\n", R.version$major, R.version$minor))
cat("model,quantity,index,value\n")
put <- function(model, quantity, v) for (i in seq_along(v)) cat(sprintf("%s,%s,%d,%.15g\n", model, quantity, i - 1, v[i]))

# Aigner, Lovell and Schmidt 1977, eq. 10, lambda = su/sv, sigma2 = su^2 + sv^2; parameters b, log sigma, log lambda
half.normal <- function(p, x, y, ...) {
  k <- ncol(x); e <- drop(y - x %*% p[1:k]); s <- exp(p[k + 1]); l <- exp(p[k + 2])
  sum(log(2) - log(s) + dnorm(e / s, log = TRUE) + pnorm(-e * l / s, log.p = TRUE))
}
# their normal-exponential model, eq. 15 (and Meeusen and van den Broeck 1977); parameters b, log sv, log su
exponential <- function(p, x, y, ...) {
  k <- ncol(x); e <- drop(y - x %*% p[1:k]); sv <- exp(p[k + 1]); su <- exp(p[k + 2])
  sum(-log(su) + 0.5 * (sv / su)^2 + e / su + pnorm(-e / sv - sv / su, log.p = TRUE))
}
# Battese and Coelli 1992, eq. A.11 with mu = 0; parameters b, log sigma2, logit gamma, eta
shared <- function(p, x, y, id, tau) {
  k <- ncol(x); e <- drop(y - x %*% p[1:k]); s2 <- exp(p[k + 1]); g <- plogis(p[k + 2])
  eta <- if (length(p) > k + 2) exp(-p[k + 3] * tau) else rep(1, length(y))
  ti <- tapply(e, id, length); ee <- tapply(eta^2, id, sum); en <- tapply(eta * e, id, sum)
  z <- -g * en / sqrt(g * (1 - g) * s2 * (1 + (ee - 1) * g))
  -0.5 * sum(ti * (log(2 * pi) + log(s2))) - 0.5 * sum((ti - 1) * log(1 - g)) - 0.5 * sum(log(1 + (ee - 1) * g)) -
    length(ti) * log(0.5) + sum(pnorm(z, log.p = TRUE)) + 0.5 * sum(z^2) - 0.5 * sum(e^2) / ((1 - g) * s2)
}
# the exponential law shared by the rows of a group has no closed form in the papers used here: the integral over u is done
# numerically, group by group; parameters b, log sv, log su, eta
shared.exponential <- function(p, x, y, id, tau) {
  k <- ncol(x); e <- drop(y - x %*% p[1:k]); sv <- exp(p[k + 1]); su <- exp(p[k + 2])
  eta <- if (length(p) > k + 2) exp(-p[k + 3] * tau) else rep(1, length(y))
  node <- (seq_len(4001) - 1) / 4000
  sum(tapply(seq_along(y), id, function(r) {
    f <- function(u) sapply(u, function(v) sum(dnorm(e[r] + eta[r] * v, 0, sv, log = TRUE)) - v / su - log(su))
    mode <- optimize(function(v) -f(v), c(0, 5))$minimum
    top <- f(mode); width <- 12 * sv / sqrt(sum(eta[r]^2))
    a <- max(0, mode - width); b <- mode + width
    w <- c(1, rep(c(4, 2), length.out = 3999), 1) # Simpson's rule
    top + log(sum(w * exp(f(a + (b - a) * node) - top)) * (b - a) / 12000)
  }))
}
gradient <- function(f, p, h = 1e-3) sapply(seq_along(p), function(j) {
  at <- function(m) f(p + replace(numeric(length(p)), j, m * h))
  (45 * (at(1) - at(-1)) - 9 * (at(2) - at(-2)) + (at(3) - at(-3))) / (60 * h)
})
hessian <- function(f, p, h = 2e-4) {
  m <- sapply(seq_along(p), function(j) {
    d <- replace(numeric(length(p)), j, h)
    (8 * (gradient(f, p + d) - gradient(f, p - d)) - (gradient(f, p + 2 * d) - gradient(f, p - 2 * d))) / (12 * h)
  })
  (m + t(m)) / 2
}
# All fits run on orthonormal columns, x = q r, so that differences are good in every direction; turned back by r.
maximum <- function(f, p) {
  for (i in 1:3) p <- optim(p, f, method = "BFGS", control = list(fnscale = -1, reltol = 1e-15, maxit = 5000))$par
  for (i in 1:6) p <- p - solve(hessian(f, p), gradient(f, p))
  p
}
d <- read.csv("src/test/resources/published/electricity-1970.csv")[1:123, ]
q <- log(d$output)
turn <- function(x) { d <- qr(x); list(q = qr.Q(d) * sqrt(nrow(x)), back = solve(qr.R(d)) * sqrt(nrow(x))) }
slopes <- function(p) drop(t$back %*% p[1:k])
errors <- function(f, p) { v <- solve(-hessian(f, p))[1:k, 1:k]; sqrt(diag(t$back %*% v %*% t(t$back))) }
t <- turn(cbind(1, q, q^2 / 2, log(d$capital / d$fuel), log(d$labor / d$fuel))); x <- t$q; y <- -log(d$cost / d$fuel)
b <- coef(lm(y ~ x - 1)); s <- log(sd(y - x %*% b)); up <- drop(solve(t$back, c(0.1, 0, 0, 0, 0)))
for (law in c("half-normal", "exponential")) {
  f0 <- list("half-normal" = half.normal, exponential = exponential)[[law]]
  f <- function(p) f0(p, x, y)
  p <- maximum(f, c(b + up, s, if (law == "exponential") log(0.1) else -0.1))
  k <- ncol(x)
  sv <- if (law == "exponential") exp(p[k + 1]) else exp(p[k + 1]) / sqrt(1 + exp(2 * p[k + 2]))
  su <- if (law == "exponential") exp(p[k + 2]) else sv * exp(p[k + 2])
  name <- paste("electricity", law)
  put(name, "coefficient", slopes(p)); put(name, "noise", sv); put(name, "scale", su); put(name, "logLikelihood", f(p))
  put(name, "se", errors(f, p))
  # Jondrow, Lovell, Materov and Schmidt 1982, and Battese and Coelli 1988, at every fifth row
  e <- drop(y - x %*% p[1:k])[seq(1, 123, 5)]
  m <- if (law == "exponential") -e - sv^2 / su else -e * su^2 / (su^2 + sv^2)
  sd <- if (law == "exponential") sv else sqrt(su^2 * sv^2 / (su^2 + sv^2))
  put(name, "mean", m + sd * dnorm(m / sd) / pnorm(m / sd))
  put(name, "survival", exp(-m + sd^2 / 2) * pnorm(m / sd - sd) / pnorm(m / sd))
  # Horrace and Schmidt 1996, 95 %
  put(name, "low", m + sd * qnorm(1 - (1 - 0.025) * pnorm(m / sd)))
  put(name, "high", m + sd * qnorm(1 - 0.025 * pnorm(m / sd)))
}
d <- read.csv("src/test/resources/published/us-states-public-capital.csv")
raw <- with(d, cbind(1, log(pcap), log(pc), log(emp), unemp)); t <- turn(raw); x <- t$q; y <- log(d$gsp); id <- factor(d$state, unique(d$state))
tau <- d$year - max(d$year); b <- coef(lm(y ~ x - 1)); k <- ncol(x); up <- drop(solve(t$back, c(0.2, 0, 0, 0, 0)))
for (over in c("constant", "decay")) {
  f <- function(p) shared(p, x, y, id, tau)
  start <- if (over == "decay") c(p, 0) else c(b + up, log(0.02), 1)
  p <- maximum(f, start)
  name <- paste("states half-normal", over)
  g <- plogis(p[k + 2]); s2 <- exp(p[k + 1])
  put(name, "coefficient", slopes(p)); put(name, "noise", sqrt((1 - g) * s2)); put(name, "scale", sqrt(g * s2))
  put(name, "logLikelihood", f(p)); put(name, "se", errors(f, p))
  if (over == "decay") put(name, "decay", p[k + 3])
}
# the exponential law at stated points, where the numerical integral holds the closed form
for (p in list(c(2.5, 0.05, 0.3, 0.65, -0.006, log(0.04), log(0.2)), c(2.4, 0.1, 0.28, 0.6, -0.005, log(0.05), log(0.1), 0.02)))
  put("states exponential", paste("logLikelihood with", length(p) - k, "beside"), shared.exponential(p, raw, y, id, tau))
