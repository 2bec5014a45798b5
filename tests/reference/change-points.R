# Expected answers of R for the search of changes and for the difference of two means.
# Rscript tests/reference/change-points.R > tests/reference/change-points.json
set.seed(20261201)
number <- function(x) sprintf("%.17g", x)
list_of <- function(x) paste0("[", paste(number(x), collapse = ", "), "]")
squares <- function(x) sum((x - mean(x))^2)

flow <- as.numeric(datasets::Nile)
n <- length(flow)
rss1 <- sapply(3:(n - 3), function(k) squares(flow[1:k]) + squares(flow[(k + 1):n]))
at <- which.min(rss1) + 2

# Every division of short series into segments of at least m values: the least squares plus a penalty a change.
least_cost <- function(x, penalty, m) {
  n <- length(x)
  best <- rep(Inf, n + 1)
  best[1] <- -penalty
  for (end in m:n) for (start in 0:(end - m))
    best[end + 1] <- min(best[end + 1], best[start + 1] + squares(x[(start + 1):end]) + penalty)
  best[n + 1]
}
series <- lapply(1:12, function(i) {
  x <- round(rnorm(12 + 4 * i, rep(c(0, 6, 2, 9)[1:(1 + i %% 4)], length.out = 12 + 4 * i, each = 5)), 3)
  penalty <- c(0.5, 3, 12)[1 + i %% 3]
  m <- 1 + i %% 4
  sprintf('{"values": %s, "penalty": %s, "least": %d, "cost": %s}', list_of(x), number(penalty), m,
          number(least_cost(x, penalty, m)))
})
welch <- lapply(1:10, function(i) {
  a <- round(rnorm(3 + i %% 4, 43, c(0.2, 2)[1 + i %% 2]), 3)
  b <- round(rnorm(3 + i %% 3, 43 + i / 5, 0.8), 3)
  t <- t.test(a, b)
  sprintf('{"first": %s, "second": %s, "error": %s, "df": %s, "interval": %s}', list_of(a), list_of(b),
          number(t$stderr), number(t$parameter), list_of(t$conf.int))
})
cat(sprintf('{
  "made": "Rscript tests/reference/change-points.R, %s",
  "nile": {"source": "R datasets::Nile, annual flow 1871 to 1970", "values": %s, "before": %d, "rss0": %s, "rss1": %s},
  "series": [\n    %s\n  ],
  "welch": [\n    %s\n  ]
}\n', R.version.string, list_of(flow), at, number(squares(flow)), number(min(rss1)),
  paste(series, collapse = ",\n    "), paste(welch, collapse = ",\n    ")))
