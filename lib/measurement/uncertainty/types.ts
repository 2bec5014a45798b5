import type { PowerKind, Quantity } from '../units/quantity';

/** What a maker states of an instrument: ±(a % of reading + b % of range + c counts of the resolution). */
export interface StatedAccuracy {
  percentOfReading: number;
  percentOfRange: number;
  /** Full scale in W; needed where percentOfRange is not zero. */
  rangeWatts: number | null;
  counts: number;
  /** The display's or logger's step in W. */
  resolutionWatts: number;
  /** The step of its energy counter in Wh, where it has one. */
  resolutionWattHours: number | null;
  /** Below this it does not read (W); null where none is stated. */
  lowerLimitWatts: number | null;
  readsTruePower: boolean;
}

/** Standard uncertainties (k = 1) in the figure's unit, kept apart so that a page can show what dominates. */
export interface UncertaintyParts {
  /** The part that scales with the reading (a %): shared by every figure of one instrument. */
  gain: number;
  /** The rest of the stated accuracy (b %, counts): an offset that cancels in a difference. */
  offset: number;
  resolution: number;
  repeatability: number;
  /** Slow drift that a short recording can't show. */
  drift: number;
  /** What a share of time below the instrument's lower limit leaves open. */
  belowLimit: number;
}

/** A number that one report yields. */
export interface MeasuredFigure {
  quantity: Quantity;
  powerKind: PowerKind;
  /** W, VA, Wh/d, Wh a use or Wh, by quantity; at a censored figure the reading, kept for the record. */
  value: number;
  standardUncertainty: number;
  parts: UncertaintyParts;
  /** "At most" this: the instrument's lower limit, where the figure lies below it; otherwise null. */
  censoredAt: number | null;
  /** Over which interval the figure averages (s); for a mean power the counted time. */
  averagingSeconds: number | null;
  /** Counted time over recorded time, 0 to 1; null for typed figures. */
  coverage: number | null;
  countedSeconds: number;
}
