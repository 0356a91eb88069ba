# Values for the tests of groups under clustered and serially dependent errors: Rscript make_values.R > dependence.json
# clubSandwich 0.5.8 (vcovCR CR2, Wald_test HTZ, coef_test Satterthwaite), sandwich 3.0.2 (vcovCL, NeweyWest, vcovPL), R 4.2.2. Data from R's random numbers.
suppressMessages({library(clubSandwich); library(sandwich)})
RNGversion("4.2.0"); set.seed(20260301)
num <- function(x) paste0("[", paste(format(x, digits = 17, trim = TRUE), collapse = ", "), "]")
one <- function(x) format(x, digits = 17)
cols <- function(M) paste0("[", paste(apply(M, 2, num), collapse = ", "), "]")
# Tests of the columns Z added to X (a constant first) by cluster; rows times sqrt(w), or each as often as it has copies.
clustered <- function(name, X, Z, y, cl, w = NULL, copies = NULL, kind = "cluster") {
  s <- if (is.null(w)) 1 else sqrt(w)
  r <- if (is.null(copies)) seq_along(y) else rep(seq_along(y), copies)
  A <- (cbind(1, X, Z) * s)[r, , drop = FALSE]; b <- (y * s)[r]; g <- cl[r]
  ok <- !is.na(coef(lm(b ~ 0 + A)))                       # fitted on the columns kept: with aliased ones in, clubSandwich tests other coefficients
  place <- which(which(ok) > 1 + ncol(X)); A <- A[, ok]; m <- lm(b ~ 0 + A); tested <- place
  V1 <- vcovCL(m, cluster = g, type = "HC1"); cf <- coef(m)[tested]
  V1 <- V1[names(cf), names(cf), drop = FALSE]; V2 <- vcovCR(m, cluster = g, type = "CR2", target = rep(1, length(b)), inverse_var = FALSE)
  ht <- Wald_test(m, constraints = constrain_zero(place), vcov = V2, test = "HTZ")
  sat <- if (length(cf) == 1) coef_test(m, vcov = V2, test = "Satterthwaite")[place, ] else NULL
  sprintf('  {"name": "%s", "final": %s, "group": %s, "response": %s, "cluster": %s, "weights": %s, "copies": %s,\n   "q": %d, "cr1_f": %s, "cr2_f": %s, "cr2_df1": %s, "cr2_df2": %s, "cr2_p": %s, "satterthwaite_t": %s, "satterthwaite_df": %s}',
    name, cols(X), cols(Z), num(y), num(cl), if (is.null(w)) "null" else num(w), if (is.null(copies)) "null" else num(copies), length(cf),
    one(drop(t(cf) %*% solve(V1, cf)) / length(cf)), one(ht$Fstat), one(ht$df_num), one(ht$df_denom), one(ht$p_val),
    if (is.null(sat)) "null" else one(sat$tstat), if (is.null(sat)) "null" else one(if (is.null(sat$df_Satt)) sat$df else sat$df_Satt))
}
rd <- function(x) round(x, 6)
sizes <- c(2, 3, 3, 4, 5, 5, 6, 7, 9, 12, 15, 19); cl <- rep(seq_along(sizes), sizes); n <- length(cl); C <- length(sizes)
X <- rd(cbind(rnorm(n), rnorm(C)[cl] + rnorm(n))); Z <- rd(cbind(rnorm(n) + rnorm(C)[cl], X[, 1]^2, rexp(n))); shock <- rnorm(C)[cl]
y <- rd(1 + X[, 1] + 0.3 * Z[, 1] + shock + rnorm(n) * (0.5 + abs(X[, 2])))
L <- rd(cbind(rnorm(C), rbinom(C, 1, 0.4))[cl, ]); w <- rd(rexp(n) + 0.2); k <- sample(1:3, n, TRUE)
mixed <- sample(n)
D <- sapply(1:C, function(c) as.numeric(cl == c))       # all dummies beside the constant: one is a combination of the rest
Zd <- cbind(Z[, 1], Z[, 2], Z[, 1] - 2 * Z[, 2])
many <- rep(1:60, each = 5); nm <- length(many); Xm <- rd(cbind(rnorm(nm), rexp(nm))); Zm <- rd(cbind(rnorm(nm), rnorm(60)[many]))
ym <- rd(Xm[, 1] + rnorm(60)[many] + rnorm(nm))
# A panel in which every row of a unit has its own period, 12 units over 30 periods with holes, for Newey-West on the sums by period.
panel <- function(name, X, Z, y, unit, time, lag) {
  m <- lm(y ~ X + Z); cf <- coef(m)[-(1:(1 + ncol(X)))]
  V <- vcovPL(m, cluster = unit, order.by = time, kernel = "Bartlett", lag = lag, aggregate = TRUE, adjust = TRUE)[names(cf), names(cf)]
  sprintf('  {"name": "%s", "final": %s, "group": %s, "response": %s, "period": %s, "lag": %d, "f": %s}', name, cols(X), cols(Z), num(y), num(time), lag,
    one(drop(t(cf) %*% solve(V, cf)) / length(cf)))
}
series <- function(name, X, Z, y, lag) {
  m <- lm(y ~ X + Z); cf <- coef(m)[-(1:(1 + ncol(X)))]
  V <- NeweyWest(m, lag = lag, prewhite = FALSE, adjust = TRUE)[names(cf), names(cf), drop = FALSE]
  sprintf('  {"name": "%s", "final": %s, "group": %s, "response": %s, "period": %s, "lag": %d, "f": %s}', name, cols(X), cols(Z), num(y), num(seq_along(y)), lag,
    one(drop(t(cf) %*% solve(V, cf)) / length(cf)))
}
unit <- rep(1:12, each = 30); time <- rep(1:30, 12); here <- sort(sample(360, 310)); unit <- unit[here]; time <- time[here]; np <- length(unit)
macro <- as.numeric(arima.sim(list(ar = 0.8), 30))[time]; Xp <- rd(cbind(rnorm(np))); Zp <- rd(cbind(macro, rnorm(np)))
yp <- rd(Xp[, 1] + as.numeric(arima.sim(list(ar = 0.7), 30))[time] + rnorm(np))
Xs <- rd(cbind(as.numeric(arima.sim(list(ar = 0.5), 80)))); Zs <- rd(cbind(as.numeric(arima.sim(list(ar = 0.8), 80)), rnorm(80))); ys <- rd(Xs[, 1] + as.numeric(arima.sim(list(ar = 0.6), 80)))
cat("{\"clustered\": [\n", paste(c(
  clustered("unbalanced clusters, one column", X, Z[, 1, drop = FALSE], y, cl),
  clustered("unbalanced clusters, rows in any order", X[mixed, ], Z[mixed, ], y[mixed], cl[mixed]),
  clustered("group constant within cluster", X, L, y, cl),
  clustered("weights", X, Z[, 1:2], y, cl, w = w),
  clustered("copies", X, Z[, 1:2], y, cl, copies = k),
  clustered("a dummy for each cluster, aliased columns", cbind(D, X), Zd, y, cl),
  clustered("many clusters", Xm, Zm, ym, many)), collapse = ",\n"), "\n],\n\"newey_west\": [\n", paste(c(
  series("a series", Xs, Zs, ys, 3), series("a series, lag 0", Xs, Zs[, 1, drop = FALSE], ys, 0), panel("a panel with holes", Xp, Zp, yp, unit, time, 4)), collapse = ",\n"), "\n]}\n", sep = "")
