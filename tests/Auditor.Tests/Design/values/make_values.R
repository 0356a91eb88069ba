# Values for the tests of bound terms, computed by R and independent of the project's code.
# Run: Rscript make_values.R > values.json
x <- c(-3.5, 0, 0.25, 1, 2.75, 4, 7.125, 9, 12, 15.5, 24, 24.5, 36, 41, 48, 60, 61, 80)
knots <- c(1, 4, 12, 36, 60)

# Natural cubic spline by the definition: Hastie, Tibshirani and Friedman (2009), eq. 5.4 and 5.5,
#   N[k+2] = d[k] - d[K-1], d[k] = ((x - t[k])+^3 - (x - t[K])+^3) / (t[K] - t[k]).
# Scaled as the program states: times (t[K] - t[k]), divided by (t[K] - t[1])^2.
K <- length(knots)
cube <- function(u) pmax(u, 0)^3
d <- function(k) (cube(x - knots[k]) - cube(x - knots[K])) / (knots[K] - knots[k])
direct <- cbind(x, sapply(1:(K - 2), function(k) (d(k) - d(K - 1)) * (knots[K] - knots[k]) / (knots[K] - knots[1])^2))

# The same space by another route: splines::ns uses a B-spline basis. With the constant both span all natural cubic splines on these knots.
ns <- splines::ns(x, knots = knots[2:(K - 1)], Boundary.knots = knots[c(1, K)], intercept = TRUE)
stopifnot(qr(cbind(1, direct))$rank == K, max(abs(lm.fit(ns, cbind(1, direct))$residuals)) < 1e-9)

price <- c(12.5, 3, 99, 0.5, 47, 18.25, 6, 31, 250, 8)
probabilities <- c(0, 0.01, 0.1, 0.25, 1/3, 0.5, 0.9, 0.99, 1)

text <- function(v) paste0("[", paste(sprintf("%.17g", v), collapse = ", "), "]")
columns <- function(m) paste0("[", paste(apply(unname(m), 2, text), collapse = ",\n    "), "]")
small <- c(1e-18, -1e-12, 1e-9, 1e-5, -0.3, 0.5, 2, 1e6)
cat(sprintf('{"made_by": "%s, splines %s, by make_values.R",\n', R.version.string, packageVersion("splines")))
cat(sprintf('  "x": %s,\n  "knots": %s,\n  "spline": %s,\n  "ns": %s,\n', text(x), text(knots), columns(direct), columns(ns)))
cat(sprintf('  "price": %s,\n  "probabilities": %s,\n  "quantile_type_7": %s,\n', text(price), text(probabilities), text(quantile(price, probabilities, type = 7))))
cat(sprintf('  "small": %s,\n  "log1p": %s,\n', text(small), text(log1p(small))))
cat(sprintf('  "center": %s,\n  "log": %s,\n  "log10": %s,\n  "exp_less_100": %s,\n  "sqrt": %s,\n  "power_1.7": %s\n}\n', text(price - mean(price)), text(log(price + 0.5)), text(log10(price)), text(exp(price - 100)), text(sqrt(price)), text(price^1.7)))
