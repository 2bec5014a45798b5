/** What is published of a pile, as far as a line that rests on it needs. */
export interface Pile {
  n: number;
  median: number;
  lowerQuartile: number | null;
  upperQuartile: number | null;
  minimum: number;
  maximum: number;
}

/** The quartiles of a normal distribution lie so many standard deviations apart. */
const QUARTILES_APART = 1.3489795003921634;
/** The expected range of 2 and 3 values of a normal distribution, in standard deviations: 2/√π and 3/√π. */
const RANGE_OF: Record<number, number> = { 2: 2 / Math.sqrt(Math.PI), 3: 3 / Math.sqrt(Math.PI) };

/**
 * How far one household's device may lie from a published median: a line that rests on other households' devices carries
 * their spread, not the median's own uncertainty. From the quartiles from n = 4, from the range of two or three; never
 * less than the category's unit-to-unit spread.
 *
 * @param unitSpread of the category, a share: 0.05 is 5 %.
 * @returns a standard deviation in the unit of the median.
 * @example communitySpread({ n: 1, median: 40, minimum: 40, maximum: 40, lowerQuartile: null, upperQuartile: null }, 0.05) // 2
 */
export function communitySpread(pile: Pile, unitSpread: number): number {
  const { n, median, lowerQuartile, upperQuartile, minimum, maximum } = pile;
  const least = unitSpread * Math.abs(median);
  if (lowerQuartile !== null && upperQuartile !== null) {
    return Math.max(least, (upperQuartile - lowerQuartile) / QUARTILES_APART);
  }
  const expected = RANGE_OF[n];
  return expected === undefined ? least : Math.max(least, (maximum - minimum) / expected);
}
