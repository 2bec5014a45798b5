import { modifiedZScores } from '../statistics/modified-z';

const LEAST_MAD = 0.0675;
const LARGEST_Z = 3.5;
const SCORES_FROM = 5;
const LARGEST_FACTOR = 5;

/** What 0 and less count as: they have no logarithm, and lie further below any reading than a factor can say. */
const LEAST_VALUE = Number.MIN_VALUE;

export interface Flaggable {
  /** A censored one's is its limit: it lies somewhere at or below. */
  value: number;
  censored: boolean;
}

/**
 * Which values a moderator should look at: those whose logarithm lies more than 3.5 modified z-scores from the
 * median's (from five values; censored ones have no score and don't count here), and those more than a factor of five
 * from the category's median, a censored one where even its limit is that far below. A flag drops nothing; the figure
 * counts until it is set aside with a reason.
 *
 * Source: Iglewicz and Hoaglin (1993) for the score; the least MAD of 0.0675 (10 % as a standard deviation) keeps
 * values that agree closely from flagging one another.
 * @param values of one pile.
 * @param categoryMedian in the same unit, or null where there is none.
 * @example findFlags([1, 1, 1, 1, 10].map((value) => ({ value, censored: false })), null)[4] // true
 */
export function findFlags(values: readonly Flaggable[], categoryMedian: number | null): boolean[] {
  const scores = scoresOf(values);
  const farFromCategory = ({ value, censored }: Flaggable) =>
    categoryMedian !== null &&
    categoryMedian > 0 &&
    ((!censored && value > LARGEST_FACTOR * categoryMedian) || LARGEST_FACTOR * value < categoryMedian);
  return values.map((item, i) => Math.abs(scores[i] ?? 0) > LARGEST_Z || farFromCategory(item));
}

/** The score of each value, null where it has none. */
function scoresOf(values: readonly Flaggable[]): (number | null)[] {
  const uncensored = values.filter((item) => !item.censored);
  if (uncensored.length < SCORES_FROM) return values.map(() => null);
  const scores = modifiedZScores(
    uncensored.map((item) => Math.log(Math.max(item.value, LEAST_VALUE))),
    LEAST_MAD,
  );
  let next = 0;
  return values.map((item) => (item.censored ? null : (scores[next++] as number)));
}
