import { describe, expect, it } from 'vitest';
import { compareWithClaim } from '@/lib/measurement/claims/compare-with-claim';
import { outcomeSentence, type MeasuredRange } from '@/lib/measurement/claims/outcome-sentence';
import { OUTCOME_WORDS } from '@/lib/measurement/claims/outcome-words';
import type { ComparableClaim } from '@/lib/measurement/claims/types';
import { claim, figure } from './samples';

const range: MeasuredRange = {
  minimum: 41,
  maximum: 46,
  atMost: false,
  n: 9,
  quantity: 'mean-power',
  powerKind: 'real',
};
const below = { outcome: 'below', reason: null, canConfirm: true, ratioToNearerLimit: 0.72 } as const;
const claimed = (traits: Partial<ComparableClaim>) => outcomeSentence(range, claim(traits), below).split('states ')[1];
const measured = (traits: Partial<MeasuredRange>) =>
  outcomeSentence({ ...range, ...traits }, claim(), below).split(';')[0];

describe('a comparison in a sentence', () => {
  it('is the worked example’s', () => {
    expect(outcomeSentence(range, claim(), compareWithClaim(figure(), claim()))).toBe(
      'Measured 41 to 46 W by nine contributors; the maker states 60 to 75 W on average: below the claim.',
    );
  });

  it('tells the range, or the one value, and by how many', () => {
    expect(measured({ n: 1, minimum: 43.26, maximum: 43.26 })).toBe('Measured 43.3 W on one unit');
    expect(measured({ n: 10 })).toBe('Measured 41 to 46 W by ten contributors');
    expect(measured({ n: 11, minimum: 0.41239, maximum: 1234.5 })).toBe('Measured 0.412 to 1235 W by 11 contributors');
    expect(measured({ n: 2, maximum: 100.4 })).toBe('Measured 41 to 100 W by two contributors');
    expect(measured({ atMost: true, minimum: 0.5, maximum: 0.5 })).toBe('Measured at most 0.5 W by nine contributors');
  });

  it('names the unit of what was measured', () => {
    expect(measured({ powerKind: 'apparent' })).toContain(' 46 VA by');
    expect(measured({ quantity: 'day-energy' })).toContain(' 46 Wh a day by');
    expect(measured({ quantity: 'use-energy' })).toContain(' 46 Wh a use by');
    expect(measured({ quantity: 'start-extra-energy' })).toContain(' 46 Wh by');
    expect(measured({ quantity: 'maximum-power' })).toContain(' 46 W by');
  });

  it('tells the claim by its kind and its limits, its numbers as they were stated', () => {
    expect(claimed({ kind: 'typical', lower: 49.95, upper: 49.95, singleValue: true })).toBe(
      '49.95 W on average: below the claim.',
    );
    expect(claimed({ lower: null, upper: 50, singleValue: true })).toContain('50 W on average');
    expect(claimed({ lower: 50, upper: null, singleValue: true })).toMatch(/^50 W on average/);
    expect(claimed({ upper: null })).toMatch(/^at least 60 W on average/);
    expect(claimed({ lower: null })).toMatch(/^at most 75 W on average/);
    expect(claimed({ lower: 60, upper: 60 })).toMatch(/^60 W on average/);
    expect(claimed({ kind: 'maximum', lower: null, upper: 100 })).toMatch(/^100 W as a maximum/);
    expect(claimed({ kind: 'maximum', unit: 'VA' })).toMatch(/^60 to 75 VA as a maximum/);
    expect(claimed({ kind: 'standby', lower: null, upper: 0.5 })).toMatch(/^at most 0.5 W in standby/);
    expect(claimed({ kind: 'networked-standby', lower: 2, upper: 2, singleValue: true })).toMatch(
      /^at most 2 W in networked standby/,
    );
    expect(claimed({ kind: 'annual-energy', unit: 'kWh/a' })).toMatch(/^60 to 75 kWh a year:/);
    expect(claimed({ kind: 'annual-energy', unit: 'Wh/d' })).toMatch(/^60 to 75 Wh a day:/);
    expect(claimed({ kind: 'use-energy', unit: 'Wh/use' })).toMatch(/^60 to 75 Wh a use:/);
  });

  it.each(Object.entries(OUTCOME_WORDS))('ends with the words of "%s"', (outcome, words) => {
    const comparison = { ...below, outcome: outcome as keyof typeof OUTCOME_WORDS };
    expect(outcomeSentence(range, claim(), comparison)).toMatch(new RegExp(`: ${words}\\.$`));
  });

  it('says why two things are not comparable', () => {
    const found = compareWithClaim(figure({ modeCode: 'idle' }), claim());
    expect(outcomeSentence(range, claim(), found)).toMatch(
      /: not comparable\. The claim’s mode is not one that was measured\.$/,
    );
  });

  it('says where a reading can’t confirm the claim', () => {
    const found = compareWithClaim(figure({ value: 62 }), claim({ lower: 61, upper: 63 }));
    expect(outcomeSentence(range, claim(), found)).toMatch(/: too close to call, and this reading can’t confirm it\.$/);
  });

  it('does not call a maximum unexceeded where a reading lies above it', () => {
    const peak = figure({ quantity: 'maximum-power', averagingSeconds: 10, value: 101 });
    const limit = claim({ kind: 'maximum', lower: null, upper: 100 });
    expect(outcomeSentence(range, limit, compareWithClaim(peak, limit))).toMatch(
      /: not shown to be exceeded in what was measured\.$/,
    );
    const exact = compareWithClaim({ ...peak, value: 100 }, limit);
    expect(outcomeSentence(range, limit, exact)).toMatch(/: not exceeded in what was measured\.$/);
  });
});
