# Reference two-stage least squares of technologies on the 48 US states: ln gsp on ln pcap, ln pc, ln emp and unemp with
# ln emp endogenous, its lag the instrument. Run from the top of the checkout:
#   Rscript src/test/resources/reference/instrumented-technologies.R > src/test/resources/reference/instrumented-technologies.csv
suppressMessages({library(AER); library(sandwich)})
d <- read.csv("src/test/resources/published/us-states-public-capital.csv")
d <- d[order(d$state, d$year), ]
back <- function(x) ave(x, d$state, FUN = function(v) c(NA, head(v, -1)))
d$y <- log(d$gsp); d$g <- log(d$pcap); d$c <- log(d$pc); d$e <- log(d$emp); d$z <- back(d$e)
cat(sprintf("# R %s.%s, AER %s, sandwich %s\n", R.version$major, R.version$minor,
            packageVersion("AER"), packageVersion("sandwich")))
cat("model,name,value,se\n")
report <- function(model, m, names, data, count) {
  # clustered by state with the factor of this project: columns counted, state effects not
  g <- length(unique(data$state)); n <- nrow(data)
  v <- vcovCL(m, cluster = data$state, type = "HC0", cadjust = FALSE) * g / (g - 1) * (n - 1) / (n - count)
  for (k in names(names)) cat(sprintf("%s,%s,%.15g,%.15g\n", model, names[k], coef(m)[k], sqrt(v[k, k])))
}
a <- d[!is.na(d$z), ]
labels <- c("(Intercept)" = "constant", g = "pcap", c = "pc", e = "emp", unemp = "control:unemp")
report("pooled", ivreg(y ~ g + c + e + unemp | g + c + z + unemp, data = a), labels, a, 5)
report("within-periods", ivreg(y ~ g + c + e + unemp + factor(year) + factor(state) |
                                 g + c + z + unemp + factor(year) + factor(state), data = a), labels[-1], a, 4 + 15)
# translog of pc and emp alone: emp stands in three columns, their instruments are z, z^2 / 2 and c z
second <- c("(Intercept)" = "constant", c = "pc", e = "emp", "I(c^2/2)" = "pc*pc", "I(c * e)" = "pc*emp", "I(e^2/2)" = "emp*emp")
report("translog", ivreg(y ~ c + e + I(c^2 / 2) + I(c * e) + I(e^2 / 2) | c + I(c^2 / 2) + z + I(c * z) + I(z^2 / 2), data = a),
       second, a, 6)
# differences over rows that follow one another and have the instrument at both ends
diffs <- function(x) ave(x, a$state, FUN = function(v) c(NA, diff(v)))
b <- data.frame(state = a$state, y = diffs(a$y), g = diffs(a$g), c = diffs(a$c), e = diffs(a$e), z = diffs(a$z), unemp = diffs(a$unemp))
b <- b[complete.cases(b), ]
report("differences", ivreg(y ~ g + c + e + unemp - 1 | g + c + z + unemp - 1, data = b), labels[-1], b, 4)
