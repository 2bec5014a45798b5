import { RULE_VERSION } from '../rule-version';
import { median } from '../statistics/median';
import { deviceUncertainty } from './device-uncertainty';
import { findFlags } from './flags';
import { summarise } from './summary';
import type { FigureInput, PublishedFigure, VerifiedFigure } from './types';
import { byText, groupVoices, type VoiceGroup } from './voices';

export interface DeviceSettings {
  /** The category's unit-to-unit spread, as a share. */
  unitSpread: number;
  /** The category's published median for this mode and quantity, or null. */
  categoryMedian: number | null;
}

/**
 * The published figure of one device in one pool (one mode, quantity, kind of power and supply): one voice a
 * contributor, household or unit. A pure function of the verified figures; their order changes nothing.
 *
 * @param figures of one pool, those set aside among them.
 * @returns null where nothing counts.
 * @example publishDeviceFigure([one figure of 43 W], { unitSpread: 0.05, categoryMedian: null })?.n // 1
 */
export function publishDeviceFigure(
  figures: readonly VerifiedFigure[],
  settings: DeviceSettings,
): PublishedFigure | null {
  const counted = figures.filter((figure) => figure.setAside === null);
  if (counted.length === 0) return null;
  const groups = groupVoices(counted);
  const readings = groups.map(readVoice);
  const flags = findFlags(
    readings.map(({ high, censored }) => ({ value: high, censored })),
    settings.categoryMedian,
  );
  const voices = readings.map(({ voiceId, high, censored }, i) => ({
    voiceId,
    value: high,
    censored,
    flagged: flags[i] as boolean,
  }));
  return {
    ...summarise(
      readings.map(({ low }) => low),
      readings.map(({ high }) => high),
    ),
    ...deviceUncertainty(groups.map(uncertaintyOf), settings.unitSpread),
    flagged: flags.filter(Boolean).length,
    setAside: figures.length - counted.length,
    counts: {
      devices: 1,
      contributors: new Set(counted.map((figure) => figure.contributorId)).size,
      instruments: new Set(counted.map((figure) => figure.instrumentModel)).size,
      reports: new Set(counted.map((figure) => figure.reportId)).size,
    },
    voices,
    inputs: listInputs(figures, groups, flags),
    ruleVersion: RULE_VERSION,
  };
}

/** A voice's median, with its censored figures at 0 and at their limit. */
function readVoice({ voiceId, figures }: VoiceGroup) {
  const low = median(figures.map((figure) => (figure.censoredAt === null ? figure.value : 0)));
  const high = median(figures.map((figure) => figure.censoredAt ?? figure.value));
  return { voiceId, low, high, censored: low !== high };
}

function uncertaintyOf({ figures }: VoiceGroup) {
  return {
    value: median(figures.map((figure) => figure.censoredAt ?? figure.value)),
    standardUncertainty: median(figures.map((figure) => figure.standardUncertainty)),
    gainUncertainty: median(figures.map((figure) => figure.gainUncertainty)),
    instrumentModels: figures.map((figure) => figure.instrumentModel),
  };
}

function listInputs(
  figures: readonly VerifiedFigure[],
  groups: readonly VoiceGroup[],
  flags: readonly boolean[],
): FigureInput[] {
  const counted = groups.flatMap(({ voiceId, figures: own }, i) =>
    own.map((figure) => ({
      figureId: figure.figureId,
      voiceId,
      value: figure.censoredAt ?? figure.value,
      counted: true,
      flagged: flags[i] as boolean,
      reason: null,
    })),
  );
  const leftOut = figures.flatMap((figure) =>
    figure.setAside === null
      ? []
      : [
          {
            figureId: figure.figureId,
            voiceId: figure.contributorId,
            value: figure.censoredAt ?? figure.value,
            counted: false,
            flagged: false,
            reason: `Set aside: ${figure.setAside.reason}`,
          },
        ],
  );
  return [...counted, ...leftOut].sort((a, b) => byText(a.figureId, b.figureId));
}
