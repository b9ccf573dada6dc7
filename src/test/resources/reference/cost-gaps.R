# Filed costs of electricity companies held against a cost equation: least cost, its standard error and the gap with
# its interval, by predict.lm; R 4.2.2, no package. Run from the top of the checkout: Rscript src/test/resources/reference/cost-gaps.R
d <- read.csv("src/test/resources/published/electricity-1970.csv")[1:123, ]
fit <- lm(log(cost / fuel) ~ log(output) + I(0.5 * log(output)^2) + log(capital / fuel) + log(labor / fuel), data = d)
p <- predict(fit, se.fit = TRUE)
t <- qt(0.975, fit$df.residual)
rows <- c(1, 62, 100, 123)
least <- exp(p$fit + log(d$fuel))
out <- data.frame(row = rows, least = least[rows], se = (least * p$se.fit)[rows],
  low = (d$cost - least * exp(t * p$se.fit))[rows], high = (d$cost - least * exp(-t * p$se.fit))[rows])
write.csv(format(out, digits = 15, trim = TRUE), "src/test/resources/reference/cost-gaps.csv", row.names = FALSE, quote = FALSE)
