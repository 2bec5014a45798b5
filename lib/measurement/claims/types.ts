import type { Duty, PowerKind, Quantity } from '../units/quantity';

export type ClaimKind = 'typical' | 'maximum' | 'standby' | 'networked-standby' | 'annual-energy' | 'use-energy';
export type ClaimUnit = 'W' | 'VA' | 'kWh/a' | 'Wh/d' | 'Wh/use';

/** What a maker states, as far as a comparison needs it. */
export interface ComparableClaim {
  kind: ClaimKind;
  lower: number | null;
  upper: number | null;
  singleValue: boolean;
  /** The place of the last printed digit of a single value: 0.1 for "4.5"; null where it is not known. */
  lastDigit: number | null;
  /** A tolerance that the maker states, in percent. */
  tolerancePercent: number | null;
  unit: ClaimUnit;
  /** For a year's energy of a device that is used: how many uses the maker counts. */
  usesPerYear: number | null;
  /** The mode it is taken to mean; null where it covers all of them. */
  modeCode: string | null;
  /** Why the maker's own definition is another thing than that mode. */
  contradictsMode: string | null;
  variantId: string | null;
  ambientCelsius: number | null;
}

/** A published figure of the device, as far as a comparison needs it. */
export interface ComparableFigure {
  quantity: Quantity;
  modeCode: string | null;
  powerKind: PowerKind;
  value: number;
  standardUncertainty: number;
  degreesOfFreedom: number;
  /** The figure is "at most" its value. */
  atMost: boolean;
  variantId: string | null;
  /** The middle of the rooms it was measured in; null where it was not recorded. */
  ambientCelsius: number | null;
  /** Of a device that defrosts: whether one is part of the figure, null where not stated. Left out for all others. */
  defrostIncluded?: boolean | null;
  /**
   * Over which interval a maximum is averaged. A highest 10 s mean, which a claimed maximum is compared with, is taken
   * from readings at most 5 s apart and outside start-up. Null for other quantities.
   */
  averagingSeconds: number | null;
  duty: Duty;
}

export type ClaimOutcome = 'below' | 'within' | 'above' | 'too-close' | 'not-above' | 'not-exceeded' | 'not-comparable';

export interface ClaimComparison {
  outcome: ClaimOutcome;
  /** Why it can't be compared; null otherwise. */
  reason: string | null;
  /** The claim in the figure's unit, after what a single value means; null where not comparable. */
  interval: { lower: number | null; upper: number | null } | null;
  probability: { below: number; within: number; above: number } | null;
  /** False where the interval is narrower than 3.92 u: no reading like this can confirm it. */
  canConfirm: boolean;
  /** The figure over the nearer limit, and over the interval's middle; null where that is zero or missing. */
  ratioToNearerLimit: number | null;
  ratioToMiddle: number | null;
}
