# Reference values for the comparison of forms of which neither contains the other, on published data sets
# and, for plant effects, on the records of the demo.
# Run from the top of the checkout with R 4.2 or later (base and stats only):
#   Rscript src/test/resources/reference/comparisons.R > src/test/resources/reference/comparisons.csv
# Vuong's comparison, the J and the P test are written out: residuals, derivatives by R's deriv(), scores, eigenvalues.
cat(sprintf("# R %s.%s\n", R.version$major, R.version$minor))
cat("case,name,value,p\n")
put <- function(case, name, value, p = NA) cat(sprintf("%s,%s,%.10g,%.6g\n", case, name, value, p))

# r1, r2 residuals; X1, X2 regressors (or derivatives at the estimate); u the unit of each row; a effects removed
vuong <- function(case, r1, X1, r2, X2, u, a = 0, room = 1) {
  N <- length(r1); s1 <- sum(r1^2) / (N - a); s2 <- sum(r2^2) / (N - a)
  d <- -room / 2 * log(s1 / s2) - (r1^2 / s1 - r2^2 / s2) / 2
  D <- drop(rowsum(d, u)); n <- length(D); LR <- sum(D); w2 <- mean((D - mean(D))^2)
  side <- function(r, X, s) {           # scores in parameters whose information is the identity
    Q <- qr.Q(qr(X)); cbind(Q * r / sqrt(s), (r^2 / s - room) / sqrt(2 * (N - a)))
  }
  S <- rowsum(cbind(side(r1, X1, s1), side(r2, X2, s2)), u)
  J <- diag(rep(c(1, -1), c(ncol(X1) + 1, ncol(X2) + 1)))
  lambda <- Re(eigen(J %*% crossprod(S))$values)^2
  set.seed(1); draws <- colSums(lambda * matrix(rnorm(length(lambda) * 2e5)^2, length(lambda)))
  put(case, "vuong-alike", n * w2, mean(draws >= n * w2)); put(case, "weights", sum(lambda))
  grouped <- n < N; se <- sqrt(n * w2 * if (grouped) n / (n - 1) else 1)
  law <- function(z) 2 * if (grouped) pt(-abs(z), n - 1) else pnorm(-abs(z))
  less <- c(0, ncol(X1) - ncol(X2), (ncol(X1) - ncol(X2)) / 2 * log(N))
  for (k in 1:3) { z <- (LR - less[k]) / se; put(case, c("vuong", "vuong-akaike", "vuong-schwarz")[k], z, law(z)) }
}
# F of the difference of fitted values, added to the regressors
added <- function(case, name, r, X, rival, a = 0) {
  m <- lm(r ~ X + I(r - rival) - 1); df <- length(r) - a - ncol(X) - 1
  f <- (sum(r^2) - deviance(m)) / (deviance(m) / df); put(case, name, f, pf(f, 1, df, lower.tail = FALSE))
}
score <- function(case, name, r, X, rival, g) {
  z <- resid(lm(I(r - rival) ~ X - 1)); v <- drop(rowsum(z * r, g)); G <- length(v)
  f <- G * mean(v)^2 / var(v); put(case, name, f, pf(f, 1, G - 1, lower.tail = FALSE))
}

# ---- two linear models of primary metals ---------------------------------------------------------------------
d <- read.csv("src/test/resources/published/primary-metals-27-states.csv")
y <- log(d$output); l <- log(d$labor); k <- log(d$capital)
m1 <- lm(y ~ l + k); m2 <- lm(y ~ k + I(k^2))
vuong("metals", resid(m1), model.matrix(m1), resid(m2), model.matrix(m2), seq_along(y))

# ---- CES and translog of 30 points ----------------------------------------------------------------------------
c30 <- read.csv("src/test/resources/published/ces-30-points.csv")
gm <- function(x) exp(mean(log(x)))
h2 <- deriv(~ a - nu / rho * log(de * L^-rho + (1 - de) * K^-rho), c("a", "nu", "rho", "de"), function(a, nu, rho, de, L, K) {})
L <- c30$labour / gm(c30$labour); K <- c30$capital / gm(c30$capital); q <- log(c30$output)
theta <- c(0, 1, 2.5, .5)
for (i in 1:5000) {
  v <- h2(theta[1], theta[2], theta[3], theta[4], L, K); X1 <- attr(v, "gradient"); m <- lm(q - as.vector(v) ~ X1 - 1)
  move <- coef(m); theta <- theta + move * min(1, .1 / max(abs(move)))
  if (max(abs(move)) < 1e-11) break
}
put("points", "rho", theta[3]); put("points", "ssr", sum(resid(m)^2))
X2 <- cbind(1, log(L), log(K), log(L)^2 / 2, log(L) * log(K), log(K)^2 / 2)
r1 <- resid(m); r2 <- resid(lm(q ~ X2 - 1))
vuong("points", r1, X1, r2, X2, seq_along(q))
added("points", "j-first", r1, X1, r2); added("points", "j-second", r2, X2, r1)

# ---- CES and translog of the demo's glassworks, within plants, clustered by plant -------------------------------
u <- read.csv("notebooks-data/glassworks.csv")
u <- u[complete.cases(u[, c("tonnes", "labour_hours", "machine_hours", "energy_gj")]), ]; g <- factor(u$plant)
y <- log(u$tonnes); x <- sapply(u[c("labour_hours", "machine_hours", "energy_gj")], function(v) v / gm(v)); z <- log(x)
O <- cbind(u$year - min(u$year), u$breakdown_rate)
h3 <- deriv(~ -nu / rho * log(d1 * A^-rho + d2 * B^-rho + (1 - d1 - d2) * C^-rho), c("nu", "rho", "d1", "d2"),
            function(nu, rho, d1, d2, A, B, C) {})
T <- cbind(z, z[, 1]^2 / 2, z[, 1] * z[, 2], z[, 1] * z[, 3], z[, 2]^2 / 2, z[, 2] * z[, 3], z[, 3]^2 / 2, O)
dm <- function(M) { M <- as.matrix(M); M - apply(M, 2, ave, g) }
theta <- c(1.06, .5, .36, .34)
for (i in 1:500) {
  v <- h3(theta[1], theta[2], theta[3], theta[4], x[, 1], x[, 2], x[, 3])
  X1 <- dm(cbind(attr(v, "gradient"), O)); m <- lm(dm(y - as.vector(v)) ~ X1 - 1)
  move <- coef(m)[1:4]; theta <- theta + move * min(1, .1 / max(abs(move)))
  if (max(abs(move)) < 1e-13) break
}
put("glassworks", "rho", theta[2]); put("glassworks", "ssr", sum(resid(m)^2))
r1 <- resid(m); X2 <- dm(T); r2 <- resid(lm(dm(y) ~ X2 - 1))
room <- 1 - 1 / as.vector(table(g)[g])
vuong("glassworks", r1, X1, r2, X2, g, nlevels(g), room)
score("glassworks", "j-first", r1, X1, r2, g); score("glassworks", "j-second", r2, X2, r1, g)

# ---- prediction of unseen states: ten folds of every tenth state, Cobb-Douglas and translog ----------------------
u <- read.csv("src/test/resources/published/us-states-public-capital.csv"); g <- factor(u$state, unique(u$state))
y <- log(u$gsp); z <- scale(log(as.matrix(u[c("pcap", "pc", "emp")])), scale = FALSE)
second <- cbind(z[, 1]^2, z[, 1] * z[, 2], z[, 1] * z[, 3], z[, 2]^2, z[, 2] * z[, 3], z[, 3]^2)
fold <- (as.integer(g) - 1) %% 10
predicted <- function(case, X, within) {
  e <- rep(NA, nrow(u))
  for (f in 0:9) {
    use <- fold != f; h <- droplevels(g[use])
    b <- if (within) coef(lm(y[use] ~ X[use, ] + h))[1 + seq_len(ncol(X))] else coef(lm(y[use] ~ X[use, ]))
    e[!use] <- y[!use] - if (within) X[!use, ] %*% b else cbind(1, X[!use, ]) %*% b
  }
  put(case, "changes", sqrt(sum((e - ave(e, g))^2) / (nrow(u) - nlevels(g))))
  if (!within) put(case, "levels", sqrt(mean(e^2)))
}
for (w in c(FALSE, TRUE)) {
  name <- if (w) "within" else "pooled"
  predicted(paste0("prediction-cobb-douglas-", name), cbind(z, u$unemp), w)
  predicted(paste0("prediction-translog-", name), cbind(z, second, u$unemp), w)
}
put("prediction", "spread", sqrt(sum((y - ave(y, g))^2) / (nrow(u) - nlevels(g))))
