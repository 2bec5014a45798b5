import type { Pile } from '../energy/community-spread';

/** A value as it is usually, and at its cautious end. */
export interface TwoSided {
  typical: number;
  cautious: number;
}

/** One device as a supply sees it. */
export interface SupplyLoad {
  name: string;
  /** W while it runs. */
  runningWatts: TwoSided;
  /** W for a moment when it starts; null where it starts no higher than it runs. */
  startWatts: TwoSided | null;
  /** Wh in a day, at the device. */
  dayWattHours: TwoSided;
  /** Hours that it runs in a day: three or more count as continuous. */
  hoursPerDay: number;
  /** When it draws, hours of the day; evenly through the day where it is null. */
  window: { fromHour: number; toHour: number } | null;
  /** Whether an inverter feeds it, or the battery itself. */
  behindInverter: boolean;
}

/**
 * The two ends of a line that rests on a pile: the median, and the upper quartile, or the maximum below four voices. A sum
 * of such ends lies higher than a quartile of the sum: it is called cautious, not a quartile.
 *
 * @example typicalAndCautious({ n: 2, median: 42, minimum: 40, maximum: 44, lowerQuartile: null, upperQuartile: null })
 *   // { typical: 42, cautious: 44 }
 */
export function typicalAndCautious(pile: Pile): TwoSided {
  return {
    typical: pile.median,
    cautious: pile.n >= 4 && pile.upperQuartile !== null ? pile.upperQuartile : pile.maximum,
  };
}

/**
 * Watts for so many hours a day, as a load.
 *
 * @example steadyLoad('lights', 150, 2).dayWattHours.typical // 300
 */
export function steadyLoad(name: string, watts: number, hoursPerDay: number): SupplyLoad {
  return {
    name,
    runningWatts: { typical: watts, cautious: watts },
    startWatts: null,
    dayWattHours: { typical: watts * hoursPerDay, cautious: watts * hoursPerDay },
    hoursPerDay,
    window: null,
    behindInverter: true,
  };
}
