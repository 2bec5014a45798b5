import { publishCategoryFigure, type DeviceFigure } from '@/lib/measurement/aggregation/publish-category';
import { publishDeviceFigure } from '@/lib/measurement/aggregation/publish-device';
import type { VerifiedFigure } from '@/lib/measurement/aggregation/types';
import { median } from '@/lib/measurement/statistics/median';

/*
 * How long a category of 100,000 device figures takes: at most 0.3 s, as the median of the rounds. The same number of
 * verified reports, five a device, is aggregated besides, from the reports up. Exits with 1 above the limit.
 */

const DEVICES = 100_000;
const REPORTS_A_DEVICE = 5;
const ROUNDS = 9;
const LIMIT_SECONDS = 0.3;

/** Numbers between 0 and 1 that are the same on every run (a linear congruential generator). */
function* repeatable(): Generator<number, never> {
  let state = 20_261_201;
  for (;;) {
    state = (state * 1_664_525 + 1_013_904_223) % 4_294_967_296;
    yield state / 4_294_967_296;
  }
}

const dice = repeatable();
const roll = () => dice.next().value;

function makeDevices(): DeviceFigure[] {
  return Array.from({ length: DEVICES }, () => {
    const watts = 5 * Math.exp(3 * roll());
    return {
      deviceId: String(Math.floor(roll() * Number.MAX_SAFE_INTEGER)),
      median: watts,
      medianLow: roll() < 0.02 ? 0 : watts,
      setAside: 0,
    };
  });
}

function makeReports(): VerifiedFigure[][] {
  return Array.from({ length: DEVICES / REPORTS_A_DEVICE }, (_, device) =>
    Array.from({ length: REPORTS_A_DEVICE }, (__, n) => {
      const id = String(device * REPORTS_A_DEVICE + n);
      const value = 40 * (0.9 + 0.2 * roll());
      return {
        figureId: id,
        reportId: id,
        revisionId: id,
        contributorId: String(Math.floor(roll() * 5000)),
        householdId: roll() < 0.2 ? String(Math.floor(roll() * 2000)) : null,
        unitId: null,
        deviceId: String(device),
        instrumentModel: String(Math.floor(roll() * 12)),
        value,
        standardUncertainty: 0.01 * value,
        gainUncertainty: 0.005 * value,
        censoredAt: roll() < 0.02 ? value : null,
        setAside: null,
      };
    }),
  );
}

function aggregateReports(reports: readonly VerifiedFigure[][]) {
  const devices = reports.flatMap((figures, device): DeviceFigure[] => {
    const figure = publishDeviceFigure(figures, { unitSpread: 0.05, categoryMedian: 40 });
    return figure ? [{ ...figure, deviceId: String(device) }] : [];
  });
  return publishCategoryFigure(devices, COUNTS);
}

function secondsOf(work: () => unknown): number {
  const rounds = Array.from({ length: ROUNDS }, () => {
    const start = performance.now();
    work();
    return (performance.now() - start) / 1000;
  });
  return median(rounds);
}

const COUNTS = { devices: DEVICES, contributors: 5000, instruments: 12, reports: DEVICES };
const devices = makeDevices();
const reports = makeReports();
const ofCategory = secondsOf(() => publishCategoryFigure(devices, COUNTS));
const ofReports = secondsOf(() => aggregateReports(reports));
const share = (ofCategory / LIMIT_SECONDS).toFixed(2);

console.log(
  `category of ${DEVICES} device figures: ${ofCategory.toFixed(3)} s, ${share} of the ${LIMIT_SECONDS} s allowed`,
);
console.log(`${DEVICES} verified reports of ${reports.length} devices, and their category: ${ofReports.toFixed(3)} s`);
console.log(`median of ${ROUNDS} rounds, on one core`);
if (ofCategory > LIMIT_SECONDS) process.exitCode = 1;
