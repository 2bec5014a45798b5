const BINS = 256;

/**
 * Otsu's threshold between two groups of values, on 256 equal bins from minimum to maximum, weighted by time.
 *
 * Source: Otsu (1979), "A threshold selection method from gray-level histograms".
 * @param values, weights of one length; a value that no time stands for has no part in it.
 * @returns the bin edge that parts the groups best (the lowest of equals), or null where all values are equal.
 * @example otsuThreshold([0, 0, 10, 10], [1, 1, 1, 1]) // 0.0390625, the edge above the first bin
 */
export function otsuThreshold(values: ArrayLike<number>, weights: ArrayLike<number>): number | null {
  let minimum = Infinity;
  let maximum = -Infinity;
  for (let i = 0; i < values.length; i += 1) {
    if (!((weights[i] as number) > 0)) continue;
    minimum = Math.min(minimum, values[i] as number);
    maximum = Math.max(maximum, values[i] as number);
  }
  if (!(maximum > minimum)) return null;
  const width = (maximum - minimum) / BINS;
  const histogram = new Float64Array(BINS);
  for (let i = 0; i < values.length; i += 1) {
    if (!((weights[i] as number) > 0)) continue;
    const bin = Math.min(BINS - 1, Math.floor(((values[i] as number) - minimum) / width));
    histogram[bin] = (histogram[bin] as number) + (weights[i] as number);
  }
  return minimum + bestEdge(histogram) * width;
}

/** The edge with the largest variance between what lies below and above it. */
function bestEdge(histogram: Float64Array): number {
  let total = 0;
  let moment = 0;
  histogram.forEach((weight, bin) => {
    total += weight;
    moment += weight * bin;
  });
  let best = -1;
  let edge = 0;
  let below = 0;
  let momentBelow = 0;
  for (let bin = 0; bin < BINS - 1; bin += 1) {
    below += histogram[bin] as number;
    momentBelow += bin * (histogram[bin] as number);
    const above = total - below;
    if (below === 0 || above === 0) continue;
    const between = below * above * (momentBelow / below - (moment - momentBelow) / above) ** 2;
    if (between > best) {
      best = between;
      edge = bin + 1;
    }
  }
  return edge;
}
