import { describe, expect, it } from 'vitest';
import { claimFactor } from '@/lib/measurement/claims/convert-claim';
import type { Duty, Quantity } from '@/lib/measurement/units/quantity';
import { claim, figure } from './samples';
import type { ClaimUnit } from '@/lib/measurement/claims/types';

function factor(
  unit: ClaimUnit,
  quantity: Quantity,
  duty: Duty = 'continuous',
  modes: { claimed?: string | null; measured?: string | null; usesPerYear?: number | null } = {},
) {
  const { claimed = 'working', measured = 'working', usesPerYear = null } = modes;
  return claimFactor(claim({ unit, modeCode: claimed, usesPerYear }), figure({ quantity, duty, modeCode: measured }));
}

describe('a claim’s unit in a figure’s', () => {
  it.each(['W', 'VA'] as const)('%s is power, not energy', (unit) => {
    expect(factor(unit, 'mean-power')).toBe(1);
    expect(factor(unit, 'maximum-power')).toBe(1);
    for (const quantity of ['minimum-power', 'day-energy', 'use-energy', 'start-extra-energy'] as const) {
      expect(factor(unit, quantity)).toBeNull();
    }
  });

  it('kWh a year over 365 is Wh a day, of continuous and cyclic devices: 219 kWh/a is 600 Wh/d', () => {
    expect(219 * (factor('kWh/a', 'day-energy', 'cyclic') ?? 0)).toBeCloseTo(600, 10);
    expect(219 * (factor('kWh/a', 'day-energy', 'continuous') ?? 0)).toBeCloseTo(600, 10);
    expect(factor('kWh/a', 'day-energy', 'cyclic')).toBeCloseTo(2.7397, 4);
  });

  it('kWh a year is no day of a modulating device, nor of one that is used', () => {
    expect(factor('kWh/a', 'day-energy', 'modulating')).toBeNull();
    expect(factor('kWh/a', 'day-energy', 'per-use')).toBeNull();
  });

  it('kWh a year over the stated uses is Wh a use: 210 kWh in 280 uses is 750 Wh', () => {
    expect(210 * (factor('kWh/a', 'use-energy', 'per-use', { usesPerYear: 280 }) ?? 0)).toBeCloseTo(750, 10);
  });

  it('kWh a year without uses, or with none, is no energy of a use', () => {
    expect(factor('kWh/a', 'use-energy', 'per-use')).toBeNull();
    expect(factor('kWh/a', 'use-energy', 'per-use', { usesPerYear: 0 })).toBeNull();
  });

  it('a year’s and a day’s energy are 24 h of the mean power that a continuous device has in the claimed mode', () => {
    expect(87.6 * (factor('kWh/a', 'mean-power') ?? 0)).toBeCloseTo(10, 12);
    expect(240 * (factor('Wh/d', 'mean-power') ?? 0)).toBeCloseTo(10, 12);
  });

  it('but not of another mode, of none, or of a device that does not draw all day', () => {
    for (const unit of ['kWh/a', 'Wh/d'] as const) {
      expect(factor(unit, 'mean-power', 'continuous', { measured: 'idle' })).toBeNull();
      expect(factor(unit, 'mean-power', 'continuous', { claimed: null, measured: null })).toBeNull();
      expect(factor(unit, 'mean-power', 'cyclic')).toBeNull();
      expect(factor(unit, 'maximum-power')).toBeNull();
    }
  });

  it('Wh a day is a day’s energy, Wh a use that of a use', () => {
    expect(factor('Wh/d', 'day-energy', 'modulating')).toBe(1);
    expect(factor('Wh/d', 'use-energy')).toBeNull();
    expect(factor('Wh/use', 'use-energy')).toBe(1);
    expect(factor('Wh/use', 'day-energy')).toBeNull();
  });
});
