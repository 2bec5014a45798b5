import { describe, expect, it } from 'vitest';
import { poolMeans } from '@/lib/measurement/uncertainty/pool-means';
import type { MeasuredFigure, UncertaintyParts } from '@/lib/measurement/uncertainty/types';

const NONE: UncertaintyParts = { gain: 0, offset: 0, resolution: 0, repeatability: 0, drift: 0, belowLimit: 0 };

const mean = (
  value: number,
  hours: number,
  parts: Partial<UncertaintyParts> = {},
  traits: Partial<MeasuredFigure> = {},
): MeasuredFigure => ({
  quantity: 'mean-power',
  powerKind: 'real',
  value,
  standardUncertainty: 0,
  parts: { ...NONE, ...parts },
  censoredAt: null,
  averagingSeconds: hours * 3600,
  coverage: null,
  countedSeconds: hours * 3600,
  ...traits,
});

describe('one mean power of several stretches', () => {
  it('is the documented example: summed energy over summed time', () => {
    expect(poolMeans([mean(40, 1), mean(50, 3)])).toMatchObject({ value: 47.5, countedSeconds: 4 * 3600 });
  });

  it('of one stretch is that stretch', () => {
    const one = mean(40, 1, { gain: 1 });
    expect(poolMeans([one])).toBe(one);
  });

  it('shares what its instrument shifts, and averages what each stretch has of its own', () => {
    // JCGM 100:2008, 5.2.2 note 1: fully correlated inputs add linearly; 5.1.2: independent ones by squares.
    const { parts } = poolMeans([
      mean(40, 1, { gain: 0.3, offset: 0.1, repeatability: 0.4 }),
      mean(40, 1, { gain: 0.3, offset: 0.1, repeatability: 0.4 }),
    ]);
    expect(parts.gain).toBeCloseTo(0.3, 12);
    expect(parts.offset).toBeCloseTo(0.1, 12);
    expect(parts.repeatability).toBeCloseTo(0.4 / Math.SQRT2, 12);
  });

  it('takes the drift of the whole time, not of its parts', () => {
    const short = mean(40, 0.5, { drift: 0.8 });
    expect(poolMeans([short, short, short]).parts.drift).toBeCloseTo(0.4, 12);
    const halfDay = mean(40, 12, { drift: 0.4 });
    expect(poolMeans([halfDay, halfDay]).parts.drift).toBe(0);
  });

  it('is below the limit only where all of it is', () => {
    const below = mean(0.2, 1, {}, { censoredAt: 0.5 });
    expect(poolMeans([below, below]).censoredAt).toBe(0.5);
    expect(poolMeans([below, mean(8, 1)]).censoredAt).toBeNull();
  });

  it('covers as much as the stretch that covers least', () => {
    const recorded = (coverage: number | null) => mean(40, 1, {}, { coverage });
    expect(poolMeans([recorded(0.95), recorded(0.8), recorded(null)]).coverage).toBe(0.8);
    expect(poolMeans([recorded(null), recorded(null)]).coverage).toBeNull();
  });
});
