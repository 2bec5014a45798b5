/** Real power is what a device turns into work and heat (W); apparent power is RMS volts times RMS amperes (VA). */
export type PowerKind = 'real' | 'apparent';

/** What a figure states. Units: W (VA where the power is apparent), Wh/d, Wh a use, Wh. */
export const QUANTITIES = [
  'mean-power',
  'minimum-power',
  'maximum-power',
  'day-energy',
  'use-energy',
  'start-extra-energy',
] as const;

export type Quantity = (typeof QUANTITIES)[number];

/** How a category's devices draw (product words: "duty type"). */
export type Duty = 'continuous' | 'cyclic' | 'per-use' | 'modulating';

/** The supplies that figures are pooled within; 120 V and 230 V together only where a category says so. */
export type SupplyClass = 'ac-230' | 'ac-120' | 'dc';
