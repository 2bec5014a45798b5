/** From so many hours on a load is continuous. Source: NEC, the 125 % rule (restated). */
const CONTINUOUS_HOURS = 3;
const CONTINUOUS_FACTOR = 1.25;

/** A load as an inverter sees it. */
export interface InverterLoad {
  runningWatts: number;
  startWatts: number | null;
  hoursPerDay: number;
}

/** What an inverter has to give, W. */
export interface InverterNeed {
  /** All loads on at once. */
  continuousWatts: number;
  /** The same with 125 % of what runs three hours or more. */
  withMarginWatts: number;
  /** The largest start-up over the rest running. */
  surgeWatts: number;
}

/**
 * The continuous and the highest power of loads that all are on at once.
 *
 * Source: the 125 % rule of the NEC (restated); Sandia SAND87-7023 for the surge (restated): peak ≥ sum and the largest
 * start-up's extra.
 * @example inverterNeed([{ runningWatts: 24, startWatts: null, hoursPerDay: 3 }]).withMarginWatts // 30
 */
export function inverterNeed(loads: readonly InverterLoad[]): InverterNeed {
  const sum = (of: (load: InverterLoad) => number) => loads.reduce((total, load) => total + of(load), 0);
  const continuousWatts = sum((load) => load.runningWatts);
  const extras = loads.map(({ startWatts, runningWatts }) => Math.max(0, (startWatts ?? 0) - runningWatts));
  return {
    continuousWatts,
    withMarginWatts: sum(
      ({ runningWatts, hoursPerDay }) => runningWatts * (hoursPerDay >= CONTINUOUS_HOURS ? CONTINUOUS_FACTOR : 1),
    ),
    surgeWatts: continuousWatts + Math.max(0, ...extras),
  };
}
