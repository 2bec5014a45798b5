import { quantileType7 } from '../statistics/quantile-type-7';

/** From a median absolute deviation to a normal distribution's standard deviation. Source: R's mad(). */
const MAD_TO_SIGMA = 1.4826;

/**
 * How much a series of blocks varies without changing: max(1.4826 · MAD of first differences about zero / √2, q/√12,
 * 0.5 % of the blocks' 95th percentile). With the differences alone a logger of whole watts has no noise, and hundreds
 * of phases.
 *
 * @param means n ≥ 1, W.
 * @param step q in W.
 * @returns W, above 0 unless all blocks are 0.
 * @example noiseOf([1, 2, 1, 2], 0) // 1.0483…
 */
export function noiseOf(means: Float64Array, step: number): number {
  const changes = new Float64Array(Math.max(0, means.length - 1));
  for (let i = 0; i < changes.length; i += 1) {
    changes[i] = Math.abs((means[i + 1] as number) - (means[i] as number));
  }
  const deviation = changes.length > 0 ? quantileType7(changes.sort(), 0.5) : 0;
  const sizes = means.map((value) => Math.abs(value)).sort();
  const largest = sizes[sizes.length - 1] as number;
  return Math.max(
    (MAD_TO_SIGMA * deviation) / Math.SQRT2,
    step / Math.sqrt(12),
    0.005 * quantileType7(sizes, 0.95),
    // Rare peaks over nothing at all, by a logger without a step, would leave no penalty to double.
    1e-6 * largest,
  );
}
