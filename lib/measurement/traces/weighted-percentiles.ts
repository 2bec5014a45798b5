import { CompensatedSum } from '../statistics/compensated-sum';

const BINS = 1024;
/** So few are sorted rather than parted further. */
const FEW = 2048;
/** Sums of weights carry rounding; a share that is met but for that is met. */
const ROUNDING = 1e-9;

/**
 * Time-weighted percentiles: the smallest value that, with all below it, reaches a share of the weight.
 *
 * Method: a histogram is narrowed to the bin that holds the value until few are left to sort, so that a long trace
 * needs neither a sorted copy nor an order of its rows; linear in practice.
 * @param values, weights of one length n ≥ 1; weights ≥ 0 with a sum above 0.
 * @param shares between 0 and 1.
 * @returns one value a share.
 * @throws {RangeError} where the weights sum to nothing.
 * @example weightedPercentiles(Float64Array.of(1, 2, 3), Float64Array.of(1, 1, 2), [0.5]) // [2]
 */
export function weightedPercentiles(values: Float64Array, weights: Float64Array, shares: readonly number[]): number[] {
  const sum = new CompensatedSum();
  for (let i = 0; i < weights.length; i += 1) sum.add(weights[i] as number);
  const total = sum.value;
  if (!(total > 0)) throw new RangeError('No time counts here, so there are no percentiles.');
  return shares.map((share) => reach(values, weights, share * total - ROUNDING * total));
}

/** The smallest value that reaches a weight, narrowed bin by bin. */
function reach(values: Float64Array, weights: Float64Array, target: number): number {
  let [kept, ofKept] = [values, weights];
  let below = 0;
  for (;;) {
    const { minimum, maximum } = rangeOf(kept, ofKept);
    const width = (maximum - minimum) / BINS;
    if (maximum === minimum) return minimum;
    if (kept.length <= FEW || !(width > 0)) return smallestReaching(kept, ofKept, target - below);
    const binOf = (value: number) => Math.min(BINS - 1, Math.floor((value - minimum) / width));
    const histogram = new Float64Array(BINS);
    for (let i = 0; i < kept.length; i += 1) {
      if (ofKept[i] === 0) continue;
      const bin = binOf(kept[i] as number);
      histogram[bin] = (histogram[bin] as number) + (ofKept[i] as number);
    }
    let bin = 0;
    let upTo = below;
    while (bin < BINS - 1 && upTo + (histogram[bin] as number) < target) {
      upTo += histogram[bin] as number;
      bin += 1;
    }
    const isInBin = (_: number, i: number) => ofKept[i] !== 0 && binOf(kept[i] as number) === bin;
    const inBin = kept.filter(isInBin);
    // Values so close that no bin parts them, or none where rounding ran past the last: what is left is sorted.
    if (inBin.length === kept.length || inBin.length === 0) return smallestReaching(kept, ofKept, target - below);
    below = upTo;
    [kept, ofKept] = [inBin, ofKept.filter(isInBin)];
  }
}

function rangeOf(values: Float64Array, weights: Float64Array): { minimum: number; maximum: number } {
  let minimum = Infinity;
  let maximum = -Infinity;
  for (let i = 0; i < values.length; i += 1) {
    if (weights[i] === 0) continue;
    minimum = Math.min(minimum, values[i] as number);
    maximum = Math.max(maximum, values[i] as number);
  }
  return { minimum, maximum };
}

function smallestReaching(values: Float64Array, weights: Float64Array, target: number): number {
  const order = Array.from(values.keys())
    .filter((i) => weights[i] !== 0)
    .sort((a, b) => (values[a] as number) - (values[b] as number));
  let reached = 0;
  for (const i of order) {
    reached += weights[i] as number;
    if (reached >= target) return values[i] as number;
  }
  return values[order[order.length - 1] as number] as number;
}
