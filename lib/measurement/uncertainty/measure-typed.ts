import type { Quantity } from '../units/quantity';
import { combineParts, scaleParts } from './combine';
import { driftUncertainty } from './drift';
import { spotRepeatability } from './repeatability';
import { instrumentUncertainty, resolutionUncertainty } from './stated-accuracy';
import { counterStepUncertainty } from './trace-stretch';
import type { MeasuredFigure, StatedAccuracy, UncertaintyParts } from './types';

/** A stretch as it was read off a display. */
export interface TypedStretch {
  durationSeconds: number;
  meanWatts: number | null;
  minimumWatts: number | null;
  maximumWatts: number | null;
  energyWattHours: number | null;
  /** How many uses the energy covers. */
  uses: number | null;
}

/**
 * The mean power of typed readings: their energy over their time where an energy was read, otherwise the power.
 *
 * Source: JCGM 100:2008 (GUM), 4.3.7; a spot reading's repeatability (max − min)/√12; a counter's energy q/√6.
 * @returns null where neither was read.
 * @example measureTypedMean({ energyWattHours: 1056, durationSeconds: 86400, … }, accuracy)?.value // 44
 */
export function measureTypedMean(stretch: TypedStretch, accuracy: StatedAccuracy): MeasuredFigure | null {
  const { durationSeconds, energyWattHours, meanWatts, minimumWatts, maximumWatts } = stretch;
  const hours = durationSeconds / 3600;
  const value = energyWattHours === null ? meanWatts : energyWattHours / hours;
  if (value === null) return null;
  const counterStep = accuracy.resolutionWattHours ?? 0;
  const spread = minimumWatts === null || maximumWatts === null ? 0 : spotRepeatability([minimumWatts, maximumWatts]);
  const parts: UncertaintyParts = {
    ...instrumentUncertainty(accuracy, value),
    resolution:
      energyWattHours === null
        ? resolutionUncertainty(accuracy.resolutionWatts, accuracy)
        : counterStepUncertainty(counterStep) / hours,
    // An energy is the mean of all that was drawn: minimum and maximum say nothing about how it repeats.
    repeatability: energyWattHours === null ? spread : 0,
    drift: driftUncertainty(value, durationSeconds),
    belowLimit: 0,
  };
  const limit = accuracy.lowerLimitWatts ?? 0;
  return {
    quantity: 'mean-power',
    powerKind: accuracy.readsTruePower ? 'real' : 'apparent',
    value,
    standardUncertainty: combineParts(parts),
    parts,
    censoredAt: limit > 0 && Math.abs(value) < limit ? limit : null,
    averagingSeconds: durationSeconds,
    coverage: null,
    countedSeconds: durationSeconds,
  };
}

/** A mean power as the energy of so many hours: of a day (24), or of one use's length. */
export function asEnergy(figure: MeasuredFigure, hours: number, quantity: Quantity): MeasuredFigure {
  return {
    ...figure,
    quantity,
    value: figure.value * hours,
    standardUncertainty: figure.standardUncertainty * hours,
    parts: scaleParts(figure.parts, hours),
    censoredAt: figure.censoredAt === null ? null : figure.censoredAt * hours,
  };
}
