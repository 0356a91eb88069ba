# F, p and the Wald F with HC3 of every left-out group, as the tool's record has them; and the seconds that reading and fitting take.
# Rscript groups.R DATA.csv FINAL GROUPS   (columns as the generator names them: y, f1..., z1... dealt out in turn)
suppressMessages({library(data.table); library(sandwich)})
args <- commandArgs(TRUE)
groups <- as.integer(args[3])
final <- paste0("f", seq_len(as.integer(args[2])))
read <- system.time(d <- fread(args[1], nThread = 1))
left <- setdiff(names(d), c("y", final))
cat(sprintf("read %.3f s processor\n", sum(read[1:2])))
took <- system.time(for (g in seq_len(groups)) {
  z <- left[(seq_along(left) - 1) %% groups + 1 == g]
  rows <- d[complete.cases(d[, c("y", final, z), with = FALSE]), c("y", final, z), with = FALSE]
  small <- lm(reformulate(final, "y"), rows)
  large <- lm(reformulate(c(final, z), "y"), rows)
  test <- anova(small, large)
  b <- coef(large)[z]
  f <- drop(b %*% solve(vcovHC(large, "HC3")[z, z, drop = FALSE], b)) / length(z)
  cat(sprintf("g%d rows %d F %.15g p %.15g HC3 F %.15g p %.15g\n", g, nrow(rows), test$F[2], test[[6]][2],
              f, pf(f, length(z), df.residual(large), lower.tail = FALSE)))
})
cat(sprintf("fits and tests %.3f s processor\n", sum(took[1:2])))
