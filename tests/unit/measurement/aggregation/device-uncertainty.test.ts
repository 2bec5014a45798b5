import { describe, expect, it } from 'vitest';
import { deviceUncertainty } from '@/lib/measurement/aggregation/device-uncertainty';

const voice = (value: number, standardUncertainty = 0, gainUncertainty = 0, ...instrumentModels: string[]) => ({
  value,
  standardUncertainty,
  gainUncertainty,
  instrumentModels: instrumentModels.length > 0 ? instrumentModels : [`model ${value}`],
});

describe('the uncertainty of a device’s figure', () => {
  it('of one voice is the unit-to-unit spread, with four degrees of freedom', () => {
    expect(deviceUncertainty([voice(100)], 0.05)).toEqual({ standardUncertainty: 5, degreesOfFreedom: 4 });
  });

  it('of one voice adds its own uncertainty, and no gain a second time', () => {
    expect(deviceUncertainty([voice(100, 12, 9)], 0.05).standardUncertainty).toBe(13);
  });

  it('of two voices weighs the spread of units four to one, without the median’s factor', () => {
    // s² = 50, s_w² = (4 · 25 + 50)/5 = 30.125 with m = 105: (4 · 5.25² + 50)/5 = 32.05; u² = s_w²/2.
    const { standardUncertainty, degreesOfFreedom } = deviceUncertainty([voice(100), voice(110)], 0.05);
    expect(standardUncertainty).toBeCloseTo(Math.sqrt(32.05 / 2), 12);
    expect(degreesOfFreedom).toBe(5);
  });

  it('of three voices has the median’s factor of 1.2533', () => {
    // s² = 100, m = 100: s_w² = (4 · 25 + 2 · 100)/6 = 50; u² = 1.2533² · 50/3.
    expect(deviceUncertainty([voice(90), voice(100), voice(110)], 0.05).standardUncertainty).toBeCloseTo(
      Math.sqrt((1.2533 ** 2 * 50) / 3),
      12,
    );
  });

  it('takes the median of the voices’ own uncertainties, undivided', () => {
    const alone = deviceUncertainty([voice(100), voice(100), voice(100)], 0).standardUncertainty;
    expect(alone).toBe(0);
    expect(deviceUncertainty([voice(100, 1), voice(100, 2), voice(100, 9)], 0).standardUncertainty).toBe(2);
  });

  it('adds the gain of the one model that all voices used, undivided', () => {
    const same = [voice(100, 3, 4, 'alpha'), voice(100, 3, 4, 'alpha')];
    expect(deviceUncertainty(same, 0).standardUncertainty).toBe(5);
    const unlike = [voice(100, 3, 4, 'alpha'), voice(100, 3, 4, 'alpha', 'beta')];
    expect(deviceUncertainty(unlike, 0).standardUncertainty).toBe(3);
  });

  it('takes the category’s own spread', () => {
    expect(deviceUncertainty([voice(100)], 0.2).standardUncertainty).toBe(20);
  });

  it('of none throws, and so does one with a NaN', () => {
    expect(() => deviceUncertainty([], 0.05)).toThrow(RangeError);
    expect(() => deviceUncertainty([voice(Number.NaN)], 0.05)).toThrow(RangeError);
  });
});
