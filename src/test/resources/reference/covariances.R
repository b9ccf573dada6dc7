# Reference covariances on the 48 US states and on US manufacturing 1899-1922, before any finite-sample factor of this
# project; every factor that is left in is named below. Run from the top of the checkout:
#   Rscript src/test/resources/reference/covariances.R > src/test/resources/reference/covariances.csv
suppressMessages({library(sandwich); library(plm)})
d <- read.csv("src/test/resources/published/us-states-public-capital.csv")
f <- log(gsp) ~ log(pcap) + log(pc) + log(emp) + unemp
p <- pdata.frame(d, index = c("state", "year"))
pooled <- plm(f, p, model = "pooling")
within <- plm(f, p, model = "within")
ols <- lm(f, d)
lsdv <- lm(update(f, . ~ . + factor(state) - 1), d)
slopes <- c("log(pcap)", "log(pc)", "log(emp)", "unemp")
cat(sprintf("# R %s.%s, sandwich %s, plm %s\n", R.version$major, R.version$minor,
            packageVersion("sandwich"), packageVersion("plm")))
cat("model,kind,row,column,value\n")
put <- function(model, kind, v) {
  for (i in seq_len(nrow(v))) for (j in seq_len(i)) cat(sprintf("%s,%s,%d,%d,%.15g\n", model, kind, i - 1, j - 1, v[i, j]))
}
put("pooled", "HC3", vcovHC(ols, type = "HC3"))
put("within", "HC3", vcovHC(lsdv, type = "HC3")[slopes, slopes])
# each of the three parts with its G/(G - 1)
two <- function(m) vcovCL(m, cluster = ~ state + year, type = "HC0", cadjust = TRUE, multi0 = FALSE)
put("pooled", "CLUSTERED_TWO_WAY", two(ols))
put("within", "CLUSTERED_TWO_WAY", two(lsdv)[slopes, slopes])
put("pooled", "NEWEY_WEST", vcovNW(pooled, type = "HC0", maxlag = 2))
put("within", "NEWEY_WEST", vcovNW(within, type = "HC0", maxlag = 2))
put("pooled", "DRISCOLL_KRAAY", vcovSCC(pooled, type = "HC0", maxlag = 2))
put("within", "DRISCOLL_KRAAY", vcovSCC(within, type = "HC0", maxlag = 2))
u <- read.csv("src/test/resources/published/us-manufacturing-1899-1922.csv")
series <- lm(log(output) ~ log(labour) + log(capital), u)
put("series", "NEWEY_WEST", NeweyWest(series, lag = 2, prewhite = FALSE, adjust = FALSE))
