import { describe, expect, it } from 'vitest';
import { findStandby } from '@/lib/measurement/phases/standby';
import { evenTrace, levels, traceOf } from '../traces/build-trace';

describe('standby', () => {
  it('has the example of its docstring: twenty minutes of 0.5 W are stable', () => {
    const trace = evenTrace('samples', 1, levels([0.5, 1201]));
    expect(findStandby(trace, 0, 1200, 900)).toMatchObject({ stable: true, reason: null });
  });

  it('is stable up to 5 % from the whole over any five minutes, and no further (US DOE on IEC 62301 first edition)', () => {
    const at = (high: number) => evenTrace('averages', 1, levels([10, 300], [high, 300]));
    expect(findStandby(at(11.05), 0, 599, 0)).toMatchObject({ stable: true });
    expect(findStandby(at(11.06), 0, 599, 0)).toMatchObject({ stable: false });
  });

  it('allows 50 mW where 5 % are less (10 CFR 430 subpart B, appendix Z)', () => {
    const at = (high: number) => evenTrace('averages', 1, levels([0.2, 300], [high, 300]));
    expect(findStandby(at(0.3), 0, 599, 0)).toMatchObject({ stable: true, allowedWatts: 0.05 });
    expect(findStandby(at(0.302), 0, 599, 0)).toMatchObject({ stable: false });
  });

  it('looks at every five minutes, not at a grid of them', () => {
    const values = levels([1, 450], [1.3, 300], [1, 450]);
    expect(findStandby(evenTrace('averages', 1, values), 0, 1199, 0).largestDeviationWatts).toBeCloseTo(0.3 * 0.75, 9);
  });

  it('applies the method’s minimum beside it', () => {
    const trace = evenTrace('samples', 1, levels([0.5, 601]));
    expect(findStandby(trace, 0, 600, 900)).toMatchObject({
      stable: false,
      reason: expect.stringContaining('15 minutes'),
    });
  });

  it('needs five minutes without a gap, and counted time at all', () => {
    expect(findStandby(evenTrace('samples', 1, levels([0.5, 200])), 0, 199, 0).reason).toContain('Five minutes');
    const gap = traceOf('samples', [
      [0, 1],
      [1, 1],
      [2, 1],
      [900, 1],
    ]);
    expect(findStandby(gap, 100, 200, 0)).toMatchObject({ stable: false, meanWatts: null });
  });
});
