# The paths that rules of backward elimination take, by R's step and drop1 (package stats): independent of the project's code.
# Run from the repository's top folder: Rscript tests/Auditor.Tests/Elimination/values/make_values.R > tests/Auditor.Tests/Elimination/values/values.json
cases <- list(
  list(name = "swiss_fertility", y = "fertility", terms = c("agriculture", "examination", "education", "catholic", "infant_mortality")),
  list(name = "life_cycle_savings", y = "sr", terms = c("pop15", "pop75", "dpi", "ddpi")),
  list(name = "prestige", y = "prestige", terms = c("education", "log_income", "women", "type")),
  list(name = "california_schools", y = "score", terms = c("size", "expenditure_1000", "english", "lunch", "calworks", "grades")))
rules <- list(
  list(rule = "{drop_above: 0.05}", bound = 0.05), list(rule = "{drop_above: 0.001}", bound = 0.001), list(rule = "{drop_above: 1e-12}", bound = 1e-12),
  list(rule = "{drop_worse: aic}", k = 2), list(rule = "{drop_worse: bic}", k = NA))
number <- function(x) if (is.na(x)) "null" else sprintf("%.17g", x)

path <- function(data, case, rule) {
  inside <- case$terms
  steps <- character()
  repeat {
    if (length(inside) == 0) break
    fit <- lm(reformulate(inside, case$y), data)
    k <- if (is.null(rule$k)) 2 else if (is.na(rule$k)) log(nrow(data)) else rule$k
    table <- drop1(fit, test = "F", k = k)
    tested <- table[-1, ]
    change <- tested$AIC - table$AIC[1]
    # By place: df, sum of squares, RSS, criterion, F, p.
    f <- tested[[5]]
    p <- tested[[6]]
    if (!is.null(rule$bound)) {
      at <- which.max(p)
      if (p[at] <= rule$bound) break
    } else {
      at <- which.min(change)
      if (change[at] >= 0) break
    }
    steps <- c(steps, sprintf('{"drop": "%s", "f": %s, "df1": %s, "df2": %s, "p": %s, "change": %s}', rownames(tested)[at],
      number(f[at]), number(tested$Df[at]), number(df.residual(fit)), number(p[at]),
      number(if (is.null(rule$bound)) change[at] else NA)))
    inside <- inside[-at]
  }
  if (is.null(rule$bound)) {
    largest <- lm(reformulate(case$terms, case$y), data)
    end <- step(largest, direction = "backward", trace = 0, k = if (is.na(rule$k)) log(nrow(data)) else rule$k)
    stopifnot(setequal(attr(terms(end), "term.labels"), inside))
  }
  sprintf('  {"case": "%s", "response": "%s", "terms": [%s], "rule": "%s", "n": %d, "kept": [%s], "drops": [%s]}', case$name, case$y,
    paste0('"', case$terms, '"', collapse = ", "), rule$rule, nrow(data), paste(sprintf('"%s"', inside), collapse = ", "), paste(steps, collapse = ", "))
}

rows <- unlist(lapply(cases, function(case) {
  data <- read.csv(file.path("tests/reference", case$name, "data.csv"), stringsAsFactors = TRUE, na.strings = c("", "NA"))
  data <- data[complete.cases(data[c(case$y, case$terms)]), ]
  sapply(rules, function(rule) path(data, case, rule))
}))
cat("[\n", paste(rows, collapse = ",\n"), "\n]\n", sep = "")
