# Lags, changes and moving averages of a panel with gaps, computed by R and independent of the project's code.
# Run: Rscript make_time_values.R > time-values.json
# Each unit is laid on the full grid of periods from its first to its last, NA where it has no row, as a time series (stats::ts);
# then stats::lag, diff and stats::filter do the work and every row of the table takes the value at its period. Missing: null;
# a value that does not exist although its cells do (the log of 0): "undefined".
set.seed(20080901)

panel <- function(step, from, to) {
  do.call(rbind, lapply(1:3, function(u) {
    days <- seq(as.Date(from) + 5 * u, as.Date(to) - 70 * (u == 2), by = step)
    days <- days + rep_len(0:1, length(days))
    days <- days[runif(length(days)) > 0.2]
    data.frame(opened = days, dealer = c("Holm", "Aue", "Brink")[u], price = round(exp(rnorm(length(days), 3, 0.6)), 2))
  }))
}

# The number of the period a day lies in, by R's own calendar.
numbers <- list(
  quarter = function(d) as.integer(format(d, "%Y")) * 4 + (as.POSIXlt(d)$mon %/% 3),
  month = function(d) as.integer(format(d, "%Y")) * 12 + as.POSIXlt(d)$mon,
  week = function(d) (as.integer(d) + 3) %/% 7, # 1970-01-01 was a Thursday
  year = function(d) as.integer(format(d, "%Y")))
names_of <- list(
  quarter = function(d) paste0(format(d, "%Y"), "-", quarters(d)),
  month = function(d) format(d, "%Y-%m"),
  week = function(d) format(d, "%G-W%V"),
  year = function(d) format(d, "%Y"))

at_period <- function(series, t) {
  x <- rep(NA_real_, length(t))
  inside <- t >= start(series)[1] & t <= end(series)[1]
  x[inside] <- as.numeric(series)[t[inside] - start(series)[1] + 1]
  x
}

terms <- function(table, t) {
  out <- lapply(c(lag_1 = 1, lag_3 = 1, change_1 = 1, change_log_2 = 1, moving_average_3 = 1, lag_of_change_of_log = 1), function(i) rep(NA_real_, nrow(table)))
  for (u in unique(na.omit(table$dealer))) {
    rows <- which(table$dealer == u & !is.na(t))
    grid <- min(t[rows]):max(t[rows])
    stopifnot(!anyDuplicated(t[rows]))
    x <- ts(table$price[rows][match(grid, t[rows])], start = grid[1])
    put <- function(name, series) out[[name]][rows] <<- at_period(series, t[rows])
    put("lag_1", stats::lag(x, -1))
    put("lag_3", stats::lag(x, -3))
    put("change_1", diff(x, 1))
    put("change_log_2", diff(log(x), 2))
    put("moving_average_3", stats::filter(x, rep(1/3, 3), sides = 1))
    put("lag_of_change_of_log", stats::lag(diff(log(x), 1), -1))
  }
  out
}

number <- function(x) ifelse(is.na(x) & !is.nan(x), "null", ifelse(is.finite(x), sprintf("%.17g", x), "\"undefined\""))
words <- function(x) ifelse(is.na(x), "null", sprintf("\"%s\"", x))
list_of <- function(v) paste0("[", paste(v, collapse = ", "), "]")

case <- function(period, step, from, to) {
  table <- panel(step, from, to)
  t <- numbers[[period]](table$opened)
  table <- table[!duplicated(paste(table$dealer, t)), ]
  table <- table[sample(nrow(table)), ]
  table$price[c(3, 11)] <- NA
  table$price[6] <- 0
  table$opened[8] <- NA
  table$dealer[14] <- NA
  t <- numbers[[period]](table$opened)
  values <- terms(table, t)
  fields <- c(
    sprintf('"opened": %s', list_of(words(as.character(table$opened)))), sprintf('"dealer": %s', list_of(words(table$dealer))),
    sprintf('"price": %s', list_of(number(table$price))), sprintf('"number": %s', list_of(ifelse(is.na(t), "null", t))),
    sprintf('"label": %s', list_of(ifelse(is.na(table$opened), "null", words(names_of[[period]](table$opened))))),
    sprintf('"%s": %s', names(values), sapply(values, function(v) list_of(number(v)))))
  sprintf('  "%s": {\n    %s\n  }', period, paste(fields, collapse = ",\n    "))
}

cat(sprintf('{\n  "made_by": "%s, by make_time_values.R",\n%s\n}\n', R.version.string, paste(c(
  case("quarter", "3 months", "2004-01-10", "2009-12-31"),
  case("month", "1 month", "2019-01-03", "2020-12-31"),
  case("week", "1 week", "2020-10-05", "2021-03-01"),
  case("year", "1 year", "1998-03-01", "2020-12-31")), collapse = ",\n")))
