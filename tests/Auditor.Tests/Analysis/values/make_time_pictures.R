# Values for the tests of the pictures in time order: Rscript make_time_pictures.R > time-pictures.json (run here, with R's stats package alone).
# One series: lm and acf. A panel with gaps, the rows of petersen_panel with y of -2 or more: lm, pairs found by their firm and year, quantile (type 7) and sums by year.
num <- function(x) paste0("[", paste(format(x, digits = 17, trim = TRUE), collapse = ", "), "]")
one <- function(x) format(x, digits = 17)
field <- function(name, value) sprintf('  "%s": %s', name, value)

series <- na.omit(read.csv("../../../reference/us_consumption_lag/data.csv"))
e <- unname(resid(lm(con ~ gnp + gnp_lag1, series)))
r <- acf(e, lag.max = 9, plot = FALSE)$acf[-1]
sign <- sum(sign(e[-1]) == sign(e[-length(e)]))

panel <- read.csv("../../../reference/petersen_panel/data.csv")
panel <- panel[panel$y >= -2, ]
u <- unname(resid(lm(y ~ x, panel)))
key <- paste(panel$firm, panel$year)
lagged <- sapply(1:5, function(k) {
  back <- match(paste(panel$firm, panel$year - k), key)
  d <- u - mean(u)
  c(sum(d * d[back], na.rm = TRUE) / sum(d^2), sum(!is.na(back)))
})
within <- sum((u - ave(u, panel$year))^2)
by <- function(f) num(unname(tapply(u, panel$year, f)))
cat("{\n", paste(c(
  field("series_correlations", num(r)),
  field("series_same_side", sign),
  field("panel_correlations", num(lagged[1, ])),
  field("panel_pairs", num(lagged[2, ])),
  field("panel_means", by(mean)),
  field("panel_lower", by(function(v) quantile(v, 0.25, names = FALSE))),
  field("panel_upper", by(function(v) quantile(v, 0.75, names = FALSE))),
  field("panel_counts", by(length)),
  field("panel_between", one(1 - within / sum((u - mean(u))^2)))), collapse = ",\n"), "\n}\n", sep = "")
