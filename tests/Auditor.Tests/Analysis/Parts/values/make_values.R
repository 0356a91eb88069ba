# Values for the tests of left-out groups in parts of the rows: Rscript make_values.R > parts.json (from this folder)
# R 4.2.2 (lm, anova, pf), sandwich 3.0.2 (vcovHC HC3). Data: tests/reference/prestige, tests/reference/petersen_panel (sources in tests/reference/SOURCES.md).
suppressMessages(library(sandwich))
num <- function(x) format(unname(x), digits = 17)
one <- function(f, df1, df2) sprintf('{"f": %s, "df1": %s, "df2": %s, "p": %s}', num(f), num(df1), num(df2), num(pf(f, df1, df2, lower.tail = FALSE)))
classical <- function(small, large) { a <- anova(small, large); one(a[2, 5], a[2, 3], a[2, 1]) }
wald <- function(large, tested) {
  V <- vcovHC(large, type = "HC3")[tested, tested, drop = FALSE]; b <- coef(large)[tested]
  one(drop(t(b) %*% solve(V, b)) / length(b), length(b), large$df.residual)
}
# Score forms with the null imposed, written out with dense matrices: R reduced model, Z what is added, y, classes of the rows.
basis <- function(M) { d <- qr(M, tol = 1e-10); qr.Q(d)[, seq_len(d$rank), drop = FALSE] }
pieces <- function(R, Z, y) {
  Q <- basis(R); e <- y - Q %*% crossprod(Q, y); Qz <- basis(Z - Q %*% crossprod(Q, Z)); list(Q = Q, Qz = Qz, S = Qz * drop(e), u = crossprod(Qz, y))
}
phi <- function(p, g) 1 - sum(sapply(unique(g), function(c) sum(crossprod(p$Qz[g == c, , drop = FALSE], p$Q[g == c, , drop = FALSE])^2))) / ncol(p$Qz)
cluster <- function(R, Z, y, g) {
  p <- pieces(R, Z, y); q <- ncol(p$Qz); C <- length(unique(g)); s <- rowsum(p$S, g)
  lm <- phi(p, g) * drop(t(p$u) %*% solve(crossprod(s), p$u)); one((C - q) / q * lm / (C - lm), q, C - q)
}
time <- function(R, Z, y, t) {
  p <- pieces(R, Z, y); q <- ncol(p$Qz); s <- rowsum(p$S, t); n <- nrow(s); nu <- floor(0.4 * n^(2 / 3) + 1e-9)
  L <- sapply(1:nu, function(j) sqrt(2 / n) * colSums(s * cos(pi * j * (1:n - 0.5) / n))); L <- matrix(L, nrow = q)
  w <- phi(p, t) * drop(t(p$u) %*% solve(n / nu * L %*% t(L), p$u)); one((nu - q + 1) / (nu * q) * w, q, nu - q + 1)
}
P <- read.csv("../../../../reference/prestige/data.csv"); P <- P[!is.na(P$type) & P$type != "", ]; P$type <- factor(P$type)
# "shape": women and education squared; "jobs": women alone.
by_type <- function(added, left) {
  small <- reformulate(c("education", "log_income"), "prestige"); large <- update(small, paste(". ~ . +", added))
  parts <- sapply(levels(P$type), function(k) { d <- P[P$type == k, ]; l <- lm(large, d)
    sprintf('{"part": "%s", "rows": %d, "basis": %s, "classical": %s}', k, nrow(d), wald(l, left), classical(lm(small, d), l)) })
  reduced <- lm(as.formula(paste("prestige ~ type * (education + log_income) +", added)), P)
  full <- lm(as.formula(paste("prestige ~ type * (education + log_income) + type * (", added, ")")), P)
  different <- setdiff(names(coef(full)), names(coef(reduced)))
  sprintf('{"parts": [%s],\n   "difference": {"basis": %s, "classical": %s}}', paste(parts, collapse = ",\n    "), wald(full, different), classical(reduced, full))
}
# Petersen's panel: firms over ten years, halves up to year 5; the group: x squared and a series that is the same for all firms.
F <- read.csv("../../../../reference/petersen_panel/data.csv"); F <- F[F$firm <= 60, ]; F$half <- F$year > 5
halves <- function(Z, form) {
  X <- cbind(1, F$x); two <- cbind(X * !F$half, X * F$half)
  parts <- sapply(c(FALSE, TRUE), function(h) { r <- F$half == h
    sprintf('{"rows": %d, "basis": %s, "classical": %s}', sum(r), form(X[r, ], Z[r, , drop = FALSE], F$y[r], F[r, ]),
      classical(lm(F$y[r] ~ X[r, ] - 1), lm(F$y[r] ~ X[r, ] + Z[r, ] - 1))) })
  sprintf('{"parts": [%s],\n   "difference": {"basis": %s, "classical": %s}}', paste(parts, collapse = ",\n    "),
    form(cbind(two, Z), Z * F$half, F$y, F), classical(lm(F$y ~ two + Z - 1), lm(F$y ~ two + Z + I(Z * F$half) - 1)))
}
square <- cbind(F$x^2)
cat("{\"prestige\": {\n \"women\":", by_type("women", "women"), ",\n \"shape\":", by_type("women + I(education^2)", c("women", "I(education^2)")),
  "},\n\"panel\": {\n \"cluster\":", halves(square, function(R, Z, y, d) cluster(R, Z, y, d$firm)), ",\n \"time\":", halves(square, function(R, Z, y, d) time(R, Z, y, d$year)), "}}\n")
