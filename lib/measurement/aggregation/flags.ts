import { modifiedZScores } from '../statistics/modified-z';

const LEAST_MAD = 0.0675;
const LARGEST_Z = 3.5;
const SCORES_FROM = 5;
const LARGEST_FACTOR = 5;

export interface Flaggable {
  value: number;
  censored: boolean;
}

/**
 * Which values a moderator should look at: those whose logarithm lies more than 3.5 modified z-scores from the
 * median's (from five uncensored values), and those more than a factor of five from the category's median. A flag
 * drops nothing; the figure counts until it is set aside with a reason.
 *
 * Source: Iglewicz and Hoaglin (1993) for the score; the least MAD of 0.0675 (10 % as a standard deviation) keeps
 * values that agree closely from flagging one another.
 * @param values of one pile.
 * @param categoryMedian in the same unit, or null where there is none.
 * @example findFlags([1, 1, 1, 1, 10].map((value) => ({ value, censored: false })), null)[4] // true
 */
export function findFlags(values: readonly Flaggable[], categoryMedian: number | null): boolean[] {
  const scored = values.map((item, index) => ({ ...item, index })).filter((item) => !item.censored && item.value > 0);
  const flags = values.map(() => false);
  if (scored.length >= SCORES_FROM) {
    const scores = modifiedZScores(
      scored.map((item) => Math.log(item.value)),
      LEAST_MAD,
    );
    scored.forEach((item, i) => {
      if (Math.abs(scores[i] as number) > LARGEST_Z) flags[item.index] = true;
    });
  }
  if (categoryMedian !== null && categoryMedian > 0) {
    for (const item of scored) {
      const factor = item.value / categoryMedian;
      if (factor > LARGEST_FACTOR || factor < 1 / LARGEST_FACTOR) flags[item.index] = true;
    }
  }
  return flags;
}
