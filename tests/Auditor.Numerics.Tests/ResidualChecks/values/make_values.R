# Values for the tests of the residual checks: Rscript make_values.R > values.json
# R's stats package alone: qr.resid, shapiro.test, pnorm. Data: npk and stackloss of R's datasets package, and samples given by formulas.
set.seed(20260101)
num <- function(x) paste0("[", paste(format(x, digits = 17, trim = TRUE), collapse = ", "), "]")
one <- function(x) format(x, digits = 17)
jb <- function(E) {
  n <- nrow(E); C <- sweep(E, 2, colMeans(E)); m2 <- colMeans(C^2)
  n / 6 * ((colMeans(C^3) / m2^1.5)^2 + (colMeans(C^4) / m2^2 - 3)^2 / 4)
}
# The columns X beside the intercept, the response, the statistic, and the share of 400,000 normal error vectors whose residuals give at least as much.
simulated <- function(name, X, y) {
  q <- qr(cbind(1, X)); n <- length(y); e <- qr.resid(q, y); s <- jb(matrix(e)); hits <- 0; B <- 20000
  for (r in 1:20) hits <- hits + sum(jb(qr.resid(q, matrix(rnorm(n * B), n))) >= s * (1 - 1e-10))
  cols <- paste(apply(X, 2, num), collapse = ", ")
  sprintf('  {"name": "%s", "columns": [%s], "response": %s, "statistic": %s, "p": %s, "draws": %d}', name, cols, num(y), one(s), one(hits / (20 * B)), 20 * B)
}
blocks <- unname(model.matrix(~ block + N * P * K, npk))[, -1]
blocks <- blocks[, -ncol(blocks)]                       # N:P:K is a combination of blocks
skew <- exp(2 * qnorm((1:40 - 0.5) / 40)); turn <- (7 * 0:39) %% 40
cases <- c(
  simulated("factorial with blocks", blocks, npk$yield + c(0, 6, 0, 0, 0, 0, 0, -5, rep(0, 16))),
  simulated("stack loss", unname(as.matrix(stackloss[, 1:2])), stackloss$stack.loss),
  simulated("one skewed column", cbind(skew), 1 + sin(1.7 * 0:39) + (turn == 9) * 2.5))
# Samples: -log(1 - u) and the normal quantile of u + 0.1 u^2, u = (i - 0.5)/n.
shapiro <- function(n) { u <- (1:n - 0.5) / n
  x <- -log(1 - u); z <- qnorm(0.9 * (u + 0.1 * u^2)); a <- shapiro.test(x); b <- shapiro.test(z)
  sprintf('  {"n": %d, "sample": %s, "w": %s, "p": %s, "second_w": %s, "second_p": %s}', n, if (n <= 12) num(z) else "null",
          one(a$statistic), one(a$p.value), one(b$statistic), one(b$p.value)) }
# Anderson-Darling from its definition: the sample -log(1 - u) with its last value moved out by the given amount.
anderson <- function(n, out) { x <- -log(1 - (1:n - 0.5) / n); x[n] <- x[n] + out; x <- sort(x); z <- (x - mean(x)) / sd(x)
  a <- -n - mean((2 * 1:n - 1) * (pnorm(z, log.p = TRUE) + pnorm(rev(z), lower.tail = FALSE, log.p = TRUE)))
  sprintf('  {"n": %d, "moved": %s, "a_squared": %s, "largest_z": %s}', n, one(out), one(a), one(max(z))) }
cat('{\n"made_by": "', R.version.string, '",\n"jarque_bera": [\n', paste(cases, collapse = ",\n"), '\n],\n"shapiro_wilk": [\n',
    paste(sapply(c(3, 4, 5, 6, 7, 11, 12, 50, 999, 5000), shapiro), collapse = ",\n"), '\n],\n"anderson_darling": [\n',
    paste(mapply(anderson, c(8, 25, 400, 5000), c(0, 3, 0, 1e6)), collapse = ",\n"), '\n]\n}\n', sep = "")
