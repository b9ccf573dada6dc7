# Generalised Leontief and symmetric generalised McFadden cost by iterated seemingly unrelated
# regressions of input quantities over output: reference values for QuantityEquationsTest.
# R 4.2.2, base alone (optim); nothing is shared with the program but the formulas. Run from the
# top of the checkout: Rscript src/test/resources/reference/cost-forms-in-levels.R > .../cost-forms-in-levels.csv
# Data: United States manufacturing 1947-71 (Berndt and Wood 1975). The file has no output; cost over a
# share-weighted index of prices stands for it, so that values are a check of the computation alone.
d <- read.csv("src/test/resources/published/us-manufacturing-klem.csv")
w <- as.matrix(d[, c("capitalprice", "laborprice", "energyprice", "materialsprice")])
s <- as.matrix(d[, c("capitalcost", "laborcost", "energycost", "materialscost")])
n <- 4; N <- nrow(d); t <- 0:(N - 1)
y <- d$cost / exp(as.vector(log(w) %*% colMeans(s)))
w <- sweep(w, 2, exp(colMeans(log(w))), "/")
y <- y / exp(mean(log(y)))
x <- d$cost * s / w
theta <- colMeans(x) / sum(colMeans(x))
z <- x / y
pairs <- t(combn(n, 2)); P <- nrow(pairs)
# Regressors of equation i, parameters in one order: pairs, c_i (output), b_i, tau_i, beta, beta2, d.
rest <- function(i) {
  own <- function(v) { m <- matrix(0, N, n); m[, i] <- v; m }
  cbind(own(1), own(1 / y), own(t), theta[i] * t / y, theta[i] * t^2, theta[i] * y)
}
leontief <- function(i) sapply(1:P, function(p) {
  k <- pairs[p, 1]; l <- pairs[p, 2]
  if (i == k) sqrt(w[, l] / w[, k]) else if (i == l) sqrt(w[, k] / w[, l]) else rep(0, N)
})
D <- as.vector(w %*% theta)
mcfadden <- function(i) sapply(1:P, function(p) {
  k <- pairs[p, 1]; l <- pairs[p, 2]
  ((i == k) - (i == l)) * (w[, l] - w[, k]) / D + theta[i] * (w[, l] - w[, k])^2 / (2 * D^2)
})
iterated <- function(X, start = NULL) {
  sigma <- diag(n); b <- 0
  for (round in 1:5000) {
    W <- solve(sigma)
    A <- 0; g <- 0
    for (i in 1:n) for (j in 1:n) {
      A <- A + W[i, j] * crossprod(X[[i]], X[[j]]); g <- g + W[i, j] * crossprod(X[[i]], z[, j])
    }
    scale <- 1 / sqrt(diag(A))
    V <- diag(scale) %*% solve(diag(scale) %*% A %*% diag(scale)) %*% diag(scale)
    new <- as.vector(V %*% g)
    e <- sapply(1:n, function(i) z[, i] - X[[i]] %*% new)
    sigma <- crossprod(e) / N
    if (max(abs(new - b) / sqrt(diag(V))) < 1e-10) break
    b <- new
  }
  list(b = new, se = sqrt(diag(V)), logLik = likelihood(sigma), V = V)
}
likelihood <- function(sigma) -N / 2 * (n * (1 + log(2 * pi)) + as.numeric(determinant(sigma)$modulus))
cat("form,name,value,se\n")
out <- function(form, fit) {
  for (k in seq_along(fit$b)) cat(sprintf("%s,%d,%.12g,%.12g\n", form, k - 1, fit$b[k], fit$se[k]))
  cat(sprintf("%s,logLikelihood,%.12g,\n", form, fit$logLik))
}
full <- function(prices) lapply(1:n, function(i) cbind(prices(i), rest(i)))
out("leontief", iterated(full(leontief)))
free <- iterated(full(mcfadden))
out("mcfadden-free", free)

# Curvature imposed: S = -L L' over the first three prices. The concentrated likelihood over L and the
# other parameters (in units of their free standard errors) by a general search with its gradient.
sOf <- function(l) {
  L <- matrix(0, n - 1, n - 1); L[upper.tri(L, diag = TRUE)] <- l; L <- t(L)
  M <- L %*% t(L)
  a <- numeric(P)
  for (p in 1:P) a[p] <- if (pairs[p, 2] < n) -M[pairs[p, 1], pairs[p, 2]] else sum(M[pairs[p, 1], ])
  a
}
# central differences of a quadratic are exact but for rounding
slopes <- function(l) sapply(1:P, function(k) { u <- replace(numeric(P), k, .5); sOf(l + u) - sOf(l - u) })
Xs <- full(mcfadden)
parameters <- function(q) c(sOf(q[1:P]), q[-(1:P)] * free$se[-(1:P)])
residuals <- function(q) { b <- parameters(q); sapply(1:n, function(i) z[, i] - Xs[[i]] %*% b) }
value <- function(q) -likelihood(crossprod(residuals(q)) / N)
gradient <- function(q) {
  e <- residuals(q)
  W <- solve(crossprod(e) / N)
  g <- 0
  for (i in 1:n) g <- g - crossprod(Xs[[i]], e %*% W[, i])
  c(t(slopes(q[1:P])) %*% g[1:P], g[-(1:P)] * free$se[-(1:P)])
}
best <- NULL
set.seed(1)
for (start in 1:8) {
  q <- c(rnorm(P, 0, 2), free$b[-(1:P)] / free$se[-(1:P)])
  for (again in 1:8) {
    o <- optim(q, value, gradient, method = "BFGS", control = list(maxit = 2000, reltol = 1e-16))
    q <- o$par
  }
  if (is.null(best) || o$value < best$value) best <- o
}
b <- parameters(best$par)
for (k in seq_along(b)) cat(sprintf("mcfadden,%d,%.12g,\n", k - 1, b[k]))
cat(sprintf("mcfadden,logLikelihood,%.12g,\n", -best$value))
message("largest slope: ", format(max(abs(gradient(best$par)))), "; factor: ", paste(format(best$par[1:P], digits = 4), collapse = " "))
