import { describe, expect, it } from 'vitest';
import { compareWithClaim } from '@/lib/measurement/claims/compare-with-claim';
import reference from '@/tests/reference/published-figures.json';
import { claim, figure } from './samples';

const outcome = (traits: Parameters<typeof figure>[0], of: Parameters<typeof claim>[0] = {}) =>
  compareWithClaim(figure(traits), claim(of)).outcome;
const reason = (traits: Parameters<typeof figure>[0], of: Parameters<typeof claim>[0] = {}) => {
  const found = compareWithClaim(figure(traits), claim(of));
  expect(found).toEqual({
    outcome: 'not-comparable',
    reason: expect.any(String) as string,
    interval: null,
    probability: null,
    canConfirm: false,
    ratioToNearerLimit: null,
    ratioToMiddle: null,
  });
  return found.reason;
};

describe('a figure beside a maker’s claim', () => {
  it('below it is the worked example’s, with its probabilities and ratios', () => {
    const found = compareWithClaim(figure({ value: 43 }), claim({ lower: 60, upper: 75 }));
    expect(found).toMatchObject({
      outcome: 'below',
      reason: null,
      interval: { lower: 60, upper: 75 },
      canConfirm: true,
    });
    expect(found.probability?.below).toBeGreaterThan(0.999);
    expect(found.ratioToNearerLimit).toBeCloseTo(43 / 60, 15);
    expect(found.ratioToMiddle).toBeCloseTo(43 / 67.5, 15);
  });

  it('within it, above it, or too close to call', () => {
    expect(outcome({ value: 67 })).toBe('within');
    expect(outcome({ value: 90 })).toBe('above');
    expect(outcome({ value: 60 })).toBe('too-close');
    expect(outcome({ value: 75 })).toBe('too-close');
  });

  it('is decided from a probability of 0.95: 1.7823 u with 12 degrees of freedom (any t table)', () => {
    expect(outcome({ value: 60 - 1.7823 })).toBe('below');
    expect(outcome({ value: 60 - 1.7822 })).toBe('too-close');
    expect(outcome({ value: 75 + 1.7823 })).toBe('above');
    expect(outcome({ value: 75 + 1.7822 })).toBe('too-close');
    expect(outcome({ value: 75 - 1.7823 })).toBe('within');
    expect(outcome({ value: 75 - 1.7822 })).toBe('too-close');
  });

  it('agrees with scipy’s probabilities on sixty claims (published-figures.py)', () => {
    for (const { y, u, df, lower, upper, outcome: wanted } of reference.conformity) {
      expect(outcome({ value: y, standardUncertainty: u, degreesOfFreedom: df }, { lower, upper })).toBe(wanted);
    }
  });

  it('narrower than 3.92 u can’t be confirmed, but still be missed below or above', () => {
    const narrow = { lower: 60, upper: 60 + 3.9199 };
    expect(compareWithClaim(figure({ value: 62 }), claim(narrow))).toMatchObject({
      outcome: 'too-close',
      canConfirm: false,
    });
    expect(compareWithClaim(figure({ value: 40 }), claim(narrow))).toMatchObject({
      outcome: 'below',
      canConfirm: false,
    });
    expect(outcome({ value: 80 }, narrow)).toBe('above');
    expect(compareWithClaim(figure({ value: 62 }), claim({ lower: 60, upper: 63.9201 })).canConfirm).toBe(true);
    expect(compareWithClaim(figure({ standardUncertainty: 0 }), claim({ lower: 43, upper: 43 }))).toMatchObject({
      outcome: 'within',
      canConfirm: true,
    });
  });

  it('with one limit can always be confirmed', () => {
    for (const limits of [{ lower: null }, { upper: null }]) {
      expect(compareWithClaim(figure({ value: 67, standardUncertainty: 99 }), claim(limits)).canConfirm).toBe(true);
    }
  });

  it('"at least" is missed below only; an upper limit above only', () => {
    expect(outcome({ value: 900 }, { upper: null })).toBe('within');
    expect(outcome({ value: 40 }, { upper: null })).toBe('below');
    expect(outcome({ value: 1 }, { lower: null })).toBe('within');
    expect(outcome({ value: 90 }, { kind: 'standby', lower: null })).toBe('above');
    expect(outcome({ value: 1 }, { kind: 'standby' })).toBe('within');
  });

  it('converts the claim’s limits into the figure’s unit', () => {
    const found = compareWithClaim(
      figure({ quantity: 'use-energy', value: 750, duty: 'per-use' }),
      claim({ kind: 'annual-energy', lower: 210, upper: 210, singleValue: true, unit: 'kWh/a', usesPerYear: 280 }),
    );
    expect(found.outcome).toBe('within');
    expect(found.interval?.lower).toBeCloseTo(675, 10);
    expect(found.interval?.upper).toBeCloseTo(825, 10);
    expect(found.ratioToMiddle).toBeCloseTo(1, 12);
  });
});

describe('a claimed maximum', () => {
  const peak = { quantity: 'maximum-power', averagingSeconds: 10 } as const;
  const limit = { kind: 'maximum', lower: null, upper: 100 } as const;

  it('is exceeded, or not exceeded in what was measured', () => {
    expect(outcome({ ...peak, value: 120 }, limit)).toBe('above');
    expect(outcome({ ...peak, value: 60 }, limit)).toBe('not-exceeded');
    expect(outcome({ ...peak, value: 101 }, limit)).toBe('not-exceeded');
  });

  it('compares with the highest 10 s mean alone', () => {
    const message = 'A maximum compares with the highest 10-second mean alone.';
    expect(reason({ ...peak, averagingSeconds: 60 }, limit)).toBe(message);
    expect(reason({ ...peak, averagingSeconds: 1 }, limit)).toBe(message);
    expect(reason({ ...peak, averagingSeconds: null }, limit)).toBe(message);
    expect(reason({ averagingSeconds: 10 }, limit)).toBe(message);
  });

  it('without an upper limit states nothing to compare with', () => {
    expect(reason(peak, { ...limit, lower: 50, upper: null })).toBe(
      'Such a claim is an upper limit, and this one states none.',
    );
  });

  it('is the only kind that a highest or lowest reading compares with', () => {
    const message = 'The claim is about a mean, not about the highest or lowest reading.';
    expect(reason(peak)).toBe(message);
    expect(reason({ quantity: 'minimum-power' })).toBe(message);
  });
});

describe('a figure below the instrument’s limit', () => {
  it('is "not above" where the limit lies at or below the claim’s upper one', () => {
    const standby = { kind: 'standby', lower: null, upper: 0.5 } as const;
    expect(compareWithClaim(figure({ value: 0.5, atMost: true }), claim(standby))).toEqual({
      outcome: 'not-above',
      reason: null,
      interval: { lower: null, upper: 0.5 },
      probability: null,
      canConfirm: false,
      ratioToNearerLimit: null,
      ratioToMiddle: null,
    });
    expect(outcome({ value: 0.2, atMost: true }, standby)).toBe('not-above');
    expect(outcome({ value: 50, atMost: true })).toBe('not-above');
  });

  it('otherwise tells nothing', () => {
    const message = 'The instrument can’t read low enough to tell.';
    expect(reason({ value: 76, atMost: true })).toBe(message);
    expect(reason({ value: 1, atMost: true }, { upper: null })).toBe(message);
  });
});

describe('apparent power', () => {
  it('says nothing of a claim in watts', () => {
    expect(reason({ powerKind: 'apparent', value: 900 })).toBe(
      'What was measured is apparent power (VA), which says nothing certain about watts.',
    );
  });

  it('compares with a claim in VA', () => {
    expect(outcome({ powerKind: 'apparent', value: 90 }, { unit: 'VA' })).toBe('above');
    expect(outcome({ powerKind: 'apparent', value: 67 }, { unit: 'VA' })).toBe('within');
    expect(outcome({ powerKind: 'apparent', value: 50, atMost: true }, { unit: 'VA' })).toBe('not-above');
  });

  it('that is claimed is contradicted by more real power; less says nothing of it', () => {
    const message = 'Real power below a claimed apparent power says nothing about it.';
    expect(outcome({ value: 90 }, { unit: 'VA' })).toBe('above');
    expect(reason({ value: 67 }, { unit: 'VA' })).toBe(message);
    expect(reason({ value: 40 }, { unit: 'VA' })).toBe(message);
    expect(reason({ value: 40, atMost: true }, { unit: 'VA' })).toBe(message);
  });
});

describe('a claim and a figure about different things', () => {
  it('are not comparable where the claim’s definition contradicts the mode, in the words of whoever recorded it', () => {
    expect(reason({}, { contradictsMode: 'The maker’s "idle" is asleep by schedule.' })).toBe(
      'The maker’s "idle" is asleep by schedule.',
    );
  });

  it('nor where the mode was not measured; a claim or a figure over all modes stands', () => {
    expect(reason({ modeCode: 'idle' })).toBe('The claim’s mode is not one that was measured.');
    expect(outcome({ modeCode: 'idle' }, { modeCode: null })).toBe('below');
    expect(outcome({ modeCode: null })).toBe('below');
  });

  it('nor where the variant differs; one that is pooled, or a claim about all, stands', () => {
    expect(reason({ variantId: '1' }, { variantId: '2' })).toBe('The claim is about another variant.');
    expect(outcome({ variantId: '1' }, { variantId: '1' })).toBe('below');
    expect(outcome({ variantId: '1' })).toBe('below');
    expect(outcome({ variantId: null }, { variantId: '2' })).toBe('below');
  });

  it('nor where the unit can’t be converted', () => {
    expect(reason({ quantity: 'day-energy' })).toBe('The claim’s unit can’t be converted into what was measured.');
  });
});

describe('a thermostat’s energy', () => {
  const day = { quantity: 'day-energy', duty: 'cyclic', value: 600, ambientCelsius: 24 } as const;
  const year = { kind: 'annual-energy', lower: 219, upper: 219, singleValue: true, unit: 'kWh/a' } as const;

  it('compares within 2 °C of the claim’s room, without correction', () => {
    expect(outcome(day, { ...year, ambientCelsius: 24 })).toBe('within');
    expect(outcome(day, { ...year, ambientCelsius: 26 })).toBe('within');
    expect(outcome(day, { ...year, ambientCelsius: 22 })).toBe('within');
    expect(reason({ ...day, ambientCelsius: 18 }, { ...year, ambientCelsius: 24 })).toBe(
      'The claim is for a room of 24 °C; it was measured at 18 °C.',
    );
    expect(reason(day, { ...year, ambientCelsius: 26.1 })).toContain('26.1 °C');
  });

  it('does not where either room is unknown', () => {
    expect(reason(day, year)).toBe('The claim does not state the room’s temperature, and its figure depends on it.');
    expect(reason({ ...day, ambientCelsius: null }, { ...year, ambientCelsius: 24 })).toBe(
      'The room’s temperature was not recorded, and the claim depends on it.',
    );
  });

  it('needs a statement on defrost of a device that has one', () => {
    const room = { ...year, ambientCelsius: 24 };
    expect(reason({ ...day, defrostIncluded: null }, room)).toBe(
      'Whether a defrost is part of what was measured was not stated.',
    );
    expect(outcome({ ...day, defrostIncluded: true }, room)).toBe('within');
    expect(outcome({ ...day, defrostIncluded: false }, room)).toBe('within');
  });

  it('asks for no room of other duties, nor of a thermostat’s power', () => {
    expect(outcome({ ...day, duty: 'continuous', ambientCelsius: null }, year)).toBe('within');
    expect(outcome({ duty: 'cyclic' })).toBe('below');
  });
});
