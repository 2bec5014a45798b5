import { publishDeviceFigure } from '@/lib/measurement/aggregation/publish-device';
import type { VerifiedFigure } from '@/lib/measurement/aggregation/types';
import { compareWithClaim } from '@/lib/measurement/claims/compare-with-claim';
import { findCycles } from '@/lib/measurement/phases/cycles';
import { stretchFigures } from '@/lib/measurement/traces/figures';
import type { Trace } from '@/lib/measurement/traces/trace';
import { combineParts } from '@/lib/measurement/uncertainty/combine';
import { instrumentUncertainty, resolutionUncertainty } from '@/lib/measurement/uncertainty/stated-accuracy';

const samples = (points: [seconds: number, watts: number][]): Trace => ({
  kind: 'samples',
  timeSeconds: Float64Array.from(points, ([seconds]) => seconds),
  values: Float64Array.from(points, ([, watts]) => watts),
  powerKind: 'real',
  averagingSeconds: null,
  stamp: 'end',
  step: 0.1,
});

/** Ten readings in the first ten seconds at 100 W, then one a minute at 10 W: rows that lie. */
export function unevenTrace() {
  const points: [number, number][] = [];
  for (let t = 0; t < 10; t += 1) points.push([t, 100]);
  for (let t = 10; t <= 610; t += 60) points.push([t, 10]);
  const trace = samples(points);
  const figures = stretchFigures(trace, 0, 610);
  const plain = points.reduce((sum, [, watts]) => sum + watts, 0) / points.length;
  return { plainMean: plain, weightedMean: figures?.meanWatts ?? 0, rows: points.length };
}

/** Twelve hours of a thermostat: 20 minutes at 80 W, 40 minutes at 2 W. */
export function thermostat() {
  const points: [number, number][] = [];
  for (let t = 0; t <= 12 * 3600; t += 10) points.push([t, t % 3600 < 1200 ? 80 : 2]);
  const finding = findCycles(samples(points), 0, 12 * 3600);
  return finding.accepted ? finding : null;
}

/** A meter of ±(1 % + 1 count of 0.1 W) that shows 43.2 W. */
export function meterReading() {
  const watts = 43.2;
  const stated = { percentOfReading: 1, percentOfRange: 0, rangeWatts: null, counts: 1, resolutionWatts: 0.1 };
  const { gain, offset } = instrumentUncertainty(stated, watts);
  const resolution = resolutionUncertainty(stated.resolutionWatts, stated);
  const parts = { gain, offset, resolution, repeatability: 0.25, drift: 0, belowLimit: 0 };
  return { watts, halfWidth: (gain + offset) * Math.sqrt(3), parts, standard: combineParts(parts) };
}

const voice = (contributorId: string, value: number, n = 0): VerifiedFigure => ({
  figureId: `${contributorId}${n}`,
  reportId: `${contributorId}${n}`,
  revisionId: `${contributorId}${n}`,
  contributorId,
  householdId: null,
  unitId: null,
  deviceId: 'example',
  instrumentModel: contributorId,
  value,
  standardUncertainty: 0.4,
  gainUncertainty: 0.3,
  censoredAt: null,
  setAside: null,
});

/** Six contributors; then one of them sends nine further reports of 60 W. */
export function oneVoice() {
  const six = [41, 42, 43, 44, 45, 46].map((watts, i) => voice(`m${i}`, watts));
  const zeal = Array.from({ length: 9 }, (_, n) => voice('m0', 60, n + 1));
  const settings = { unitSpread: 0.05, categoryMedian: null };
  return {
    before: publishDeviceFigure(six, settings),
    after: publishDeviceFigure([...six, ...zeal], settings),
  };
}

/** Those six beside a maker's 60 to 75 W. */
export function besideClaim() {
  const { before } = oneVoice();
  if (!before) return null;
  const comparison = compareWithClaim(
    {
      quantity: 'mean-power',
      modeCode: 'idle',
      powerKind: 'real',
      value: before.median,
      standardUncertainty: before.standardUncertainty ?? 0,
      degreesOfFreedom: before.degreesOfFreedom ?? 1,
      atMost: false,
      variantId: null,
      ambientCelsius: null,
      averagingSeconds: null,
      duty: 'continuous',
    },
    {
      kind: 'typical',
      lower: 60,
      upper: 75,
      singleValue: false,
      lastDigit: null,
      tolerancePercent: null,
      unit: 'W',
      usesPerYear: null,
      modeCode: 'idle',
      contradictsMode: null,
      variantId: null,
      ambientCelsius: null,
    },
  );
  return { published: before, comparison };
}
