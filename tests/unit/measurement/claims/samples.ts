import type { ComparableClaim, ComparableFigure } from '@/lib/measurement/claims/types';

/** A mean power of 43 W in the mode "working", with a standard uncertainty of 1 W and nine voices. */
export function figure(traits: Partial<ComparableFigure> = {}): ComparableFigure {
  return {
    quantity: 'mean-power',
    modeCode: 'working',
    powerKind: 'real',
    value: 43,
    standardUncertainty: 1,
    degreesOfFreedom: 12,
    atMost: false,
    variantId: null,
    ambientCelsius: null,
    averagingSeconds: null,
    duty: 'continuous',
    ...traits,
  };
}

/** A typical power of 60 to 75 W in the same mode. */
export function claim(traits: Partial<ComparableClaim> = {}): ComparableClaim {
  return {
    kind: 'typical',
    lower: 60,
    upper: 75,
    singleValue: false,
    lastDigit: null,
    tolerancePercent: null,
    unit: 'W',
    usesPerYear: null,
    modeCode: 'working',
    contradictsMode: null,
    variantId: null,
    ambientCelsius: null,
    ...traits,
  };
}
