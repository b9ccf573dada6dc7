# Translogs held to regularity by a method of its own: augmented Lagrangians, minimised by nlminb
# (PORT) with numerical slopes, the curvature of an isoquant by the formula for the larger root of a
# 2 x 2 form on a plane that is spanned by differences from the first input and made orthonormal.
# Written with R 4.2.2, package stats alone. Run from the root of the project:
#   Rscript src/test/resources/reference/imposed-regularity.R
# Margins are those of the program: every elasticity at least 1e-6, every curvature at most -1e-6.

margin <- 1e-6

terms <- function(z) {
  n <- ncol(z)
  columns <- list()
  for (i in 1:n) columns[[length(columns) + 1]] <- z[, i]
  for (i in 1:n) for (j in i:n)
    columns[[length(columns) + 1]] <- (if (i == j) 0.5 else 1) * z[, i] * z[, j]
  do.call(cbind, columns)
}

second <- function(b, n) {
  m <- matrix(0, n, n)
  k <- n
  for (i in 1:n) for (j in i:n) {
    k <- k + 1
    m[i, j] <- b[k]
    m[j, i] <- b[k]
  }
  m
}

# All margins at the mixes z, one column each; not negative where they are met.
margins <- function(b, z) {
  n <- ncol(z)
  m <- second(b, n)
  e <- sweep(z %*% m, 2, b[1:n], "+")
  if (n == 2) {
    v1 <- -e[, 2] / sqrt(e[, 1]^2 + e[, 2]^2)
    v2 <- e[, 1] / sqrt(e[, 1]^2 + e[, 2]^2)
    bent <- (m[1, 1] - e[, 1]) * v1^2 + 2 * m[1, 2] * v1 * v2 + (m[2, 2] - e[, 2]) * v2^2
  } else {
    size <- sqrt(rowSums(e^2))
    u <- cbind(-e[, 2], e[, 1], 0) / sqrt(e[, 1]^2 + e[, 2]^2)
    w <- cbind(
      e[, 2] * u[, 3] - e[, 3] * u[, 2],
      e[, 3] * u[, 1] - e[, 1] * u[, 3],
      e[, 1] * u[, 2] - e[, 2] * u[, 1]) / size
    form <- function(a, c) rowSums((a %*% m) * c) - rowSums(a * c * e)
    uu <- form(u, u)
    ww <- form(w, w)
    uw <- form(u, w)
    bent <- (uu + ww) / 2 + sqrt(((uu - ww) / 2)^2 + uw^2)
  }
  cbind(e, -bent) - margin
}

held <- function(y, x, at, first, n) {
  free <- lm.fit(x, y)
  r <- qr.R(free$qr)
  s <- sqrt(sum(free$residuals^2) / (length(y) - ncol(x)))
  k <- n + n * (n + 1) / 2
  toBeta <- function(g) free$coefficients + s * backsolve(r, g)
  gap <- function(g) as.vector(margins(toBeta(g)[first + 0:(k - 1)], at))
  plain <- lm.fit(x[, -(first + n:(k - 1))], y)
  cd <- numeric(ncol(x))
  cd[-(first + n:(k - 1))] <- plain$coefficients
  start <- as.vector(r %*% (cd - free$coefficients)) / s
  best <- NULL
  for (share in c(1, 0.5, 0.05)) {
    g <- share * start
    u <- numeric(length(gap(g)))
    weight <- 100
    worst <- Inf
    for (round in 1:60) {
      lagrangian <- function(g) {
        c <- gap(g)
        sum(g^2) / 2 + sum(pmax(0, u - weight * c)^2 - u^2) / (2 * weight)
      }
      for (again in 1:3) {
        found <- nlminb(g, lagrangian,
          control = list(eval.max = 20000, iter.max = 20000, rel.tol = 1e-15, x.tol = 1e-14))
        g <- found$par
      }
      c <- gap(g)
      u <- pmax(0, u - weight * c)
      now <- max(0, -c)
      if (now < 1e-10) break
      if (now > worst / 4) weight <- weight * 4
      worst <- now
    }
    ssr <- sum((y - x %*% toBeta(g))^2)
    if (now < 1e-7 && (is.null(best) || ssr < best$ssr))
      best <- list(ssr = ssr, free = sum(free$residuals^2), beta = toBeta(g), missed = now,
        freely = sum(rowSums(margins(free$coefficients[first + 0:(k - 1)], at) < 0) > 0))
  }
  best
}

out <- list()
keep <- function(case, found, first, n) {
  k <- n + n * (n + 1) / 2
  b <- found$beta[first + 0:(k - 1)]
  for (i in seq_along(b)) out[[length(out) + 1]] <<- c(case, paste0("coefficient ", i), format(b[i], digits = 12))
  out[[length(out) + 1]] <<- c(case, "ssr", format(found$ssr, digits = 12))
  out[[length(out) + 1]] <<- c(case, "free ssr", format(found$free, digits = 12))
  out[[length(out) + 1]] <<- c(case, "missed", format(found$missed, digits = 3))
  print(c(case, found$ssr, found$free, found$missed))
}

metals <- read.csv("src/test/resources/published/primary-metals-27-states.csv", comment.char = "#")
z <- scale(log(as.matrix(metals[, c("labor", "capital")])), scale = FALSE)
keep("metals", held(log(metals$output), cbind(1, terms(z)), z, 2, 2), 2, 2)

us <- read.csv("src/test/resources/published/us-states-public-capital.csv", comment.char = "#")
z <- scale(log(as.matrix(us[, c("pcap", "pc", "emp")])), scale = FALSE)
x <- cbind(1, terms(z), us$unemp, us$year - min(us$year))
y <- log(us$gsp)
keep("states pooled", held(y, x, z, 2, 3), 2, 3)
keep("states pooled at-mean", held(y, x, matrix(0, 1, 3), 2, 3), 2, 3)
within <- function(v) v - ave(v, us$state)
keep("states within", held(within(y), apply(x[, -1], 2, within), z, 1, 3), 1, 3)

table <- do.call(rbind, out)
colnames(table) <- c("case", "name", "value")
write.csv(table, "src/test/resources/reference/imposed-regularity.csv", row.names = FALSE, quote = FALSE)
