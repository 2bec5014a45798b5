import { RULE_VERSION } from '../rule-version';
import { findFlags } from './flags';
import { summarise } from './summary';
import type { Counts, PublishedFigure } from './types';
import { byText } from './voices';

/** One device's published figure, as it counts in its category. */
export interface DeviceFigure {
  deviceId: string;
  median: number;
  /** The median with censored figures at 0; equal to the median where nothing is censored. */
  medianLow: number;
  setAside: number;
}

/**
 * The published figure of a category in one pool: one device, one voice, each with its device's median. No uncertainty
 * is stated: devices of a category differ, and their range says how much.
 *
 * @param devices of one pool, each device once; any order.
 * @param counts how many devices, distinct contributors, instruments and reports stand behind them: a member who
 * measured two of the devices is one contributor, which the devices' own counts can't tell.
 * @returns null where there is none.
 * @throws {RangeError} where a device comes twice.
 * @example publishCategoryFigure([device of 8 W, device of 12 W], counts)?.median // 10
 */
export function publishCategoryFigure(devices: readonly DeviceFigure[], counts: Counts): PublishedFigure | null {
  if (devices.length === 0) return null;
  const sorted = [...devices].sort((a, b) => byText(a.deviceId, b.deviceId));
  if (sorted.some((device, i) => i > 0 && device.deviceId === sorted[i - 1]?.deviceId)) {
    throw new RangeError('A device has one voice in its category.');
  }
  const summary = summarise(
    sorted.map((device) => device.medianLow),
    sorted.map((device) => device.median),
    true,
  );
  const flags = findFlags(
    sorted.map(({ median, medianLow }) => ({ value: median, censored: median !== medianLow })),
    summary.median,
  );
  return {
    ...summary,
    standardUncertainty: null,
    degreesOfFreedom: null,
    flagged: flags.filter(Boolean).length,
    setAside: sorted.reduce((total, device) => total + device.setAside, 0),
    counts,
    voices: sorted.map((device, i) => ({
      voiceId: device.deviceId,
      value: device.median,
      censored: device.median !== device.medianLow,
      flagged: flags[i] as boolean,
    })),
    inputs: sorted.map((device, i) => ({
      figureId: device.deviceId,
      voiceId: device.deviceId,
      value: device.median,
      counted: true,
      flagged: flags[i] as boolean,
      reason: null,
    })),
    ruleVersion: RULE_VERSION,
  };
}
