import { RULE_VERSION } from '../rule-version';
import { median } from '../statistics/median';
import { deviceUncertainty } from './device-uncertainty';
import { findFlags } from './flags';
import { listInputs, REPLACED_REASON } from './inputs';
import { latestRevisions } from './latest-revisions';
import { summarise } from './summary';
import type { Counts, PublishedFigure, VerifiedFigure } from './types';
import { groupVoices, type VoiceGroup } from './voices';

export interface DeviceSettings {
  /** The category's unit-to-unit spread, as a share. */
  unitSpread: number;
  /** The category's published median for this mode and quantity, or null. */
  categoryMedian: number | null;
}

/**
 * The published figure of one device in one pool (one mode, quantity, kind of power and supply): one voice a
 * contributor, household or unit, over the latest verified revision of each report. A pure function of the verified
 * figures; their order changes nothing, to the last digit.
 *
 * @param figures of one pool, those set aside among them.
 * @returns null where nothing counts.
 * @throws {RangeError} where the figures are of more than one device, or a value is not a finite number.
 * @example publishDeviceFigure([one figure of 43 W], { unitSpread: 0.05, categoryMedian: null })?.n // 1
 */
export function publishDeviceFigure(
  figures: readonly VerifiedFigure[],
  settings: DeviceSettings,
): PublishedFigure | null {
  if (figures.some(({ deviceId }) => deviceId !== figures[0]?.deviceId)) {
    throw new RangeError('A device’s figure pools figures of that device alone.');
  }
  const { latest, replaced } = latestRevisions(figures);
  const counted = latest.filter((figure) => figure.setAside === null);
  if (counted.length === 0) return null;
  const groups = groupVoices(counted);
  const readings = groups.map(readVoice);
  const low = readings.map((reading) => reading.low);
  const high = readings.map((reading) => reading.high);
  const flags = findFlags(
    readings.map(({ high: value, censored }) => ({ value, censored })),
    settings.categoryMedian,
  );
  const setAside = latest.flatMap((figure) =>
    figure.setAside === null ? [] : [{ figure, reason: `Set aside: ${figure.setAside.reason}` }],
  );
  const leftOut = [...setAside, ...replaced.map((figure) => ({ figure, reason: REPLACED_REASON }))];
  return {
    ...summarise(low, high),
    ...uncertaintyOf(groups, low, high, settings.unitSpread),
    flagged: flags.filter(Boolean).length,
    setAside: setAside.length,
    counts: countWhatCounts(counted),
    voices: readings.map(({ voiceId, high: value, censored }, i) => ({
      voiceId,
      value,
      censored,
      flagged: flags[i] === true,
    })),
    inputs: listInputs(groups, flags, leftOut),
    ruleVersion: RULE_VERSION,
  };
}

/** A voice's median, with its censored figures at 0 and at their limit. */
function readVoice({ voiceId, figures }: VoiceGroup) {
  const low = median(figures.map((figure) => (figure.censoredAt === null ? figure.value : 0)));
  const high = median(figures.map((figure) => figure.censoredAt ?? figure.value));
  return { voiceId, low, high, censored: low !== high };
}

/** Like every statistic it is computed with censored figures at 0 and at their limit; the larger is at most. */
function uncertaintyOf(groups: readonly VoiceGroup[], low: number[], high: number[], unitSpread: number) {
  const parts = groups.map(({ figures }) => ({
    standardUncertainty: median(figures.map((figure) => figure.standardUncertainty)),
    gainUncertainty: median(figures.map((figure) => figure.gainUncertainty)),
    instrumentModels: figures.map((figure) => figure.instrumentModel),
  }));
  const at = (values: readonly number[]) =>
    deviceUncertainty(
      parts.map((part, i) => ({ ...part, value: values[i] as number })),
      unitSpread,
    );
  const lower = at(low);
  const upper = at(high);
  return lower.standardUncertainty > upper.standardUncertainty ? lower : upper;
}

function countWhatCounts(counted: readonly VerifiedFigure[]): Counts {
  const distinct = (trait: 'deviceId' | 'contributorId' | 'instrumentModel' | 'reportId') =>
    new Set(counted.map((figure) => figure[trait])).size;
  return {
    devices: distinct('deviceId'),
    contributors: distinct('contributorId'),
    instruments: distinct('instrumentModel'),
    reports: distinct('reportId'),
  };
}
