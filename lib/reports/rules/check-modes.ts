import type { ReportFigureDraft } from './compute-figures';

/** Modes of rest, and modes of work: by what they mean, none of the first draws more than one of the second. */
const AT_REST = ['off', 'standby', 'networked-standby', 'sleep', 'idle', 'between-cycles'];
const AT_WORK = ['active', 'busy', 'running', 'heating', 'cooking', 'spin'];

/** A mode of work may draw the same, give or take what two readings of it differ by. */
const MARGIN = 1.2;
const MARGIN_WATTS = 0.5;

/**
 * Modes whose figures contradict what the modes mean, most likely because two were exchanged.
 * @returns the mode at rest and the mode at work that draws less, for each such pair.
 */
export function exchangedModes(figures: readonly ReportFigureDraft[]): { rest: string; work: string }[] {
  const means = figures.filter(({ quantity, powerKind }) => quantity === 'mean-power' && powerKind === 'real');
  const among = (codes: readonly string[]) => means.filter(({ modeCode }) => codes.includes(modeCode ?? ''));
  return among(AT_REST).flatMap((rest) =>
    among(AT_WORK)
      .filter((work) => rest.censoredAt === null && rest.value > MARGIN * work.value + MARGIN_WATTS)
      .map((work) => ({ rest: rest.modeCode ?? '', work: work.modeCode ?? '' })),
  );
}
