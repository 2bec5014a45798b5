import { describe, expect, it } from 'vitest';
import { unitOf } from '@/lib/measurement/units/unit-of';

describe('the unit of a figure', () => {
  it('is watts for real power, volt-amperes for apparent, and watt-hours a day or a use for energies', () => {
    expect(unitOf('mean-power', 'apparent')).toBe('VA');
    expect(unitOf('maximum-power', 'real')).toBe('W');
    expect(unitOf('day-energy', 'real')).toBe('Wh/d');
    expect(unitOf('use-energy', 'real')).toBe('Wh/use');
    expect(unitOf('start-extra-energy', 'real')).toBe('Wh');
  });
});
