# Expected answers of R for the distributions, quantiles and medians that lib/measurement/statistics computes.
# Rscript tests/reference/distributions.R > tests/reference/distributions.json
set.seed(20261201)
number <- function(x) ifelse(is.finite(x), sprintf("%.17g", x), "null")
list_of <- function(x) paste0("[", paste(number(x), collapse = ", "), "]")
rows <- function(x) paste0("[\n    ", paste(x, collapse = ",\n    "), "\n  ]")

df <- c(0.5, 1, 2, 3, 4, 5, 7.3, 10, 12, 30, 100, 1000, 1e5, 1e6)
at <- c(-40, -8, -3.2, -1.5, -0.99, -0.7, -1e-3, -1e-8, 0, 0.3, 1, 2.2, 6)
p <- c(1e-6, 0.001, 0.025, 0.05, 0.3, 0.4999, 0.6, 0.9, 0.95, 0.975, 0.999)
t_cdf <- c()
for (d in df) for (t in at) t_cdf <- c(t_cdf, list_of(c(d, t, pt(t, d))))
t_quantile <- c()
for (d in df[df < 1e5]) for (q in p) t_quantile <- c(t_quantile, list_of(c(d, q, qt(q, d))))
z <- c(-37, -20, -8, -6, -3.0001, -3, -2.9999, -1.96, -1, -0.1, 0, 0.5, 1.4, 2, 3.05, 5)
normal_cdf <- sapply(z, function(x) list_of(c(x, pnorm(x))))
normal_quantile <- sapply(p, function(q) list_of(c(q, qnorm(q))))
beta <- c()
for (a in c(0.5, 2, 5.5, 150)) for (b in c(0.5, 3, 120)) for (x in c(0, 0.01, 0.3, 0.5, 0.8, 0.999, 1))
  beta <- c(beta, list_of(c(x, a, b, pbeta(x, a, b))))
samples <- c()
for (n in c(1, 2, 3, 4, 5, 7, 10, 23, 60)) {
  x <- round(rlnorm(n, log(40), 0.4), 2)
  if (n == 10) x <- round(x)
  samples <- c(samples, paste0(
    "{\"values\": ", list_of(x),
    ", \"mean\": ", number(mean(x)), ", \"sd\": ", number(sd(x)), ", \"median\": ", number(median(x)),
    ", \"mad\": ", number(mad(x, constant = 1)),
    ", \"quantiles\": ", list_of(quantile(x, c(0, 0.1, 0.25, 0.5, 0.75, 0.9, 1), names = FALSE, type = 7)), "}"))
}
levels <- c()
for (n in c(1:40, 53, 54, 99, 100, 999, 1000, 1100, 2500)) for (level in c(0.5, 0.9, 0.95, 0.99)) {
  d <- qbinom((1 - level) / 2, n, 0.5)
  while (d > 0 && 1 - 2 * pbinom(d - 1, n, 0.5) < level) d <- d - 1
  while (d + 1 <= n / 2 && 1 - 2 * pbinom(d, n, 0.5) >= level) d <- d + 1
  levels <- c(levels, list_of(c(n, level, d + 0, if (d > 0) 1 - 2 * pbinom(d - 1, n, 0.5) else NA)))
}
cat("{\n  \"made_by\": \"", R.version.string, ", stats::pt, qt, pnorm, qnorm, pbeta, pbinom, quantile, mad\",\n", sep = "")
cat("  \"studentTCdf\": ", rows(t_cdf), ",\n  \"studentTQuantile\": ", rows(t_quantile), ",\n", sep = "")
cat("  \"normalCdf\": ", rows(normal_cdf), ",\n  \"normalQuantile\": ", rows(normal_quantile), ",\n", sep = "")
cat("  \"incompleteBeta\": ", rows(beta), ",\n  \"samples\": ", rows(samples), ",\n", sep = "")
cat("  \"medianInterval\": ", rows(levels), "\n}\n", sep = "")
