# Reference values for estimators and tests on panels, on the 48 US states of
# src/test/resources/published/us-states-public-capital.csv, whole and with holes.
# Run from the top of the checkout with R 4.2 or later and the packages plm, sandwich:
#   Rscript src/test/resources/reference/panel-estimators.R > src/test/resources/reference/panel-estimators.csv
# Differences, plant means and the test of serial correlation are written out with lm, since they must respect gaps.
suppressMessages({library(plm); library(sandwich)})
whole <- read.csv("src/test/resources/published/us-states-public-capital.csv")
# Holes by rule: row i of the file (from 0) is left out where i mod 7 is 3 or i mod 11 is 5; of Texas only 1970 is kept.
i <- seq_len(nrow(whole)) - 1
holes <- whole[!(i %% 7 == 3 | i %% 11 == 5 | (whole$state == "TEXAS" & whole$year > 1970)), ]
say <- function(...) cat(paste(..., sep = ","), "\n", sep = "")
num <- function(x) sprintf("%.12g", x)
cat(sprintf("# R %s.%s, plm %s, sandwich %s\n", R.version$major, R.version$minor,
            packageVersion("plm"), packageVersion("sandwich")))
cat("panel,form,model,name,value,error\n")
columns <- function(d, form) {
  z <- sapply(c("pcap", "pc", "emp"), function(n) log(d[[n]]) - mean(log(d[[n]])))
  x <- data.frame(z)
  if (form == "translog") {
    n <- colnames(z)
    for (a in 1:3) for (b in a:3) x[[paste(n[a], n[b], sep = "*")]] <- (if (a == b) 0.5 else 1) * z[, a] * z[, b]
  }
  x[["control:unemp"]] <- d$unemp
  x
}
clustered <- function(m, id) vcovCL(m, cluster = id, type = "HC1", cadjust = TRUE)
wald <- function(b, v, k) as.numeric(t(b[k]) %*% solve(v[k, k]) %*% b[k]) / length(k)
# Refits without each plant (the transformation of random effects kept), and Hotelling's F of their covariance.
jackknife <- function(m, id) {
  X <- model.matrix(m); y <- model.response(model.frame(m)); b <- coef(m); ids <- unique(as.character(id))
  D <- sapply(ids, function(g) { keep <- as.character(id) != g; coef(lm.fit(X[keep, , drop = FALSE], y[keep])) - b })
  D[is.na(D)] <- 0
  (length(ids) - 1) / length(ids) * D %*% t(D)
}
hotelling <- function(m, id, k) {
  G <- length(unique(as.character(id)))
  wald(coef(m), jackknife(m, id), k) * (G - length(k)) / (G - 1)
}
run <- function(panel, d, form) {
  x <- columns(d, form); names <- colnames(x); K <- ncol(x)
  colnames(x) <- paste0("x", seq_len(K))
  state <- factor(d$state, unique(d$state)); G <- nlevels(state)
  p <- pdata.frame(cbind(state = state, year = d$year, y = log(d$gsp), x), index = c("state", "year"))
  f <- reformulate(colnames(x), "y")
  put <- function(model, b, s, n = names) for (k in seq_along(b)) say(panel, form, model, n[k], num(b[k]), num(s[k]))
  one <- function(model, name, value) say(panel, form, model, name, num(value), 0)
  with <- function(fit) { s <- summary(fit)$coefficients; list(b = s[, 1], s = s[, 2]) }
  pooled <- plm(f, p, model = "pooling")
  between <- with(plm(f, p, model = "between"))
  put("between", between$b, between$s, c("constant", names))
  inside <- plm(f, p, model = "within"); w <- with(inside); put("within", w$b, w$s)
  both <- plm(f, p, model = "within", effect = "twoways"); t2 <- with(both); put("two-way", t2$b, t2$s)
  for (m in c("swar", "walhus", "amemiya")) {
    r <- plm(f, p, model = "random", random.method = m); rr <- with(r)
    put(paste0("random-", m), rr$b, rr$s, c("constant", names))
    one(paste0("random-", m), "row", r$ercomp$sigma2[["idios"]])
    one(paste0("random-", m), "plant", r$ercomp$sigma2[["id"]])
    if (m == "swar") random <- r
  }
  # first differences of successive years only
  previous <- match(paste(d$state, d$year - 1), paste(d$state, d$year)); now <- which(!is.na(previous)); was <- previous[now]
  dx <- as.matrix(x)[now, ] - as.matrix(x)[was, ]; dy <- log(d$gsp)[now] - log(d$gsp)[was]; dstate <- state[now]
  plain <- lm(dy ~ dx - 1); s <- summary(plain)$coefficients; put("differences", s[, 1], s[, 2])
  put("differences-clustered", coef(plain), sqrt(diag(clustered(plain, droplevels(dstate)))))
  trend <- lm(dy ~ dx); s <- summary(trend)$coefficients
  put("differences-trend", s[, 1], s[, 2], c("trend", names))
  # Mundlak: rows and plant means less theta of the plant's mean; variances of Swamy and Arora, for which plant
  # means change nothing within plants and nothing of the columns between them
  e <- random$ercomp$sigma2; Ti <- as.numeric(table(state))[state]
  M <- apply(x, 2, ave, state); theta <- 1 - sqrt(e[["idios"]] / (e[["idios"]] + Ti * e[["id"]]))
  Z <- cbind(1, as.matrix(x), M); Z <- Z - theta * apply(Z, 2, ave, state); yy <- log(d$gsp) - theta * ave(log(d$gsp), state)
  mundlak <- lm(yy ~ Z - 1); all <- c("constant", names, paste0("mean:", names))
  s <- summary(mundlak)$coefficients; put("mundlak", s[, 1], s[, 2], all)
  v <- clustered(mundlak, state); put("mundlak-clustered", coef(mundlak), sqrt(diag(v)), all)
  # tests
  means <- (K + 2):(2 * K + 1)
  one("test", "plant-means", wald(coef(mundlak), vcov(mundlak), means))
  one("test", "plant-means-clustered", hotelling(mundlak, state, means))
  one("test", "plant-effects", pFtest(inside, pooled)$statistic)
  one("test", "plant-variance", plmtest(pooled, type = "bp")$statistic)
  one("test", "random-against-within", phtest(inside, random)$statistic)
  one("test", "period-effects", pFtest(both, inside)$statistic)
  own <- 0; dims <- 0
  for (g in levels(state)) { h <- lm.fit(cbind(1, as.matrix(x))[state == g, , drop = FALSE], log(d$gsp)[state == g]); own <- own + sum(h$residuals^2); dims <- dims + h$rank }
  F <- function(ssr, k) (ssr - own) / (dims - k) / (own / (nrow(d) - dims))
  if (nrow(d) > dims) {
    one("test", "poolability-within", F(sum(residuals(inside)^2), G + K))
    one("test", "poolability-pooled", F(sum(residuals(pooled)^2), K + 1))
  }
  u <- residuals(plain); key <- paste(d$state[now], d$year[now]); lag <- match(paste(d$state[now], d$year[now] - 1), key)
  k <- which(!is.na(lag)); u1 <- u[lag[k]]; u0 <- u[k]
  line <- lm(u0 ~ u1 - 1)
  one("test", "serial-correlation", ((coef(line) + 0.5)^2 / clustered(line, droplevels(dstate[k]))[1, 1]))
  # trends, within plants, clustered: quadratic and biased
  t <- d$year - min(d$year)
  z <- as.matrix(x)[, 1:3]
  q <- cbind(as.matrix(x), t, 0.5 * t^2); B <- cbind(q, z * t)
  demean <- function(m) m - apply(as.matrix(m), 2, ave, state)
  yd <- log(d$gsp) - ave(log(d$gsp), state)
  for (kind in c("quadratic", "biased")) {
    X <- demean(if (kind == "quadratic") q else B); l <- lm(yd ~ X - 1)
    n <- c(names, "trend", "trend*trend", if (kind == "biased") paste0(c("pcap", "pc", "emp"), "*trend"))
    v <- clustered(l, state)
    put(paste0(kind, "-trend"), coef(l), sqrt(diag(v)), n)
    if (kind == "biased") {
      one("test", "neutral-technical-change", hotelling(l, state, (K + 3):(K + 5)))
    }
    rate <- c(rep(0, K), 1, mean(t), if (kind == "biased") colMeans(z))
    put(paste0(kind, "-rate"), sum(rate * coef(l)), sqrt(t(rate) %*% v %*% rate), "mean")
    last <- t == max(t)
    rate <- c(rep(0, K), 1, max(t), if (kind == "biased") colMeans(z[last, ]))
    put(paste0(kind, "-rate"), sum(rate * coef(l)), sqrt(t(rate) %*% v %*% rate), "last")
  }
}
for (form in c("cobb-douglas", "translog")) { run("whole", whole, form); run("holes", holes, form) }
