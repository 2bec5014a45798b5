import type { FigureInput, VerifiedFigure } from './types';
import { byText, type VoiceGroup } from './voices';

/** Why a figure of an earlier revision does not count. */
export const REPLACED_REASON = 'A later revision of this report counts.';

/**
 * What became of every figure, counted or not, in the order of their ids.
 *
 * @param groups the voices, with the figures that count.
 * @param flags one a voice.
 * @param leftOut each figure that does not count, with the reason a reader sees.
 * @example listInputs(groups, [false], [])[0].counted // true
 */
export function listInputs(
  groups: readonly VoiceGroup[],
  flags: readonly boolean[],
  leftOut: readonly { figure: VerifiedFigure; reason: string }[],
): FigureInput[] {
  const inputs: FigureInput[] = [];
  const voiceOf = new Map<string, string>();
  groups.forEach(({ voiceId, figures }, i) => {
    for (const figure of figures) {
      voiceOf.set(figure.contributorId, voiceId);
      inputs.push(inputOf(figure, voiceId, { counted: true, flagged: flags[i] === true, reason: null }));
    }
  });
  for (const { figure, reason } of leftOut) {
    const voiceId = voiceOf.get(figure.contributorId) ?? figure.contributorId;
    inputs.push(inputOf(figure, voiceId, { counted: false, flagged: false, reason }));
  }
  return inputs.sort((a, b) => byText(a.figureId, b.figureId));
}

function inputOf(
  { figureId, censoredAt, value }: VerifiedFigure,
  voiceId: string,
  fate: Pick<FigureInput, 'counted' | 'flagged' | 'reason'>,
): FigureInput {
  return { figureId, voiceId, value: censoredAt ?? value, ...fate };
}
