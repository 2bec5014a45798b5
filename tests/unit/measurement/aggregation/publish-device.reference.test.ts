import { describe, expect, it } from 'vitest';
import { publishDeviceFigure } from '@/lib/measurement/aggregation/publish-device';
import type { VerifiedFigure } from '@/lib/measurement/aggregation/types';
import reference from '@/tests/reference/published-figures.json';

describe('devices’ published figures by numpy and scipy (published-figures.py)', () => {
  it.each(reference.published.map((entry, i) => [i, entry.expected.n, entry] as const))(
    'case %i, %i voices',
    (_, __, { figures, unitSpread, categoryMedian, expected }) => {
      const result = publishDeviceFigure(figures as VerifiedFigure[], { unitSpread, categoryMedian });
      const close = (value: number | null) => (value === null ? null : expect.closeTo(value, 9));
      expect(result).toMatchObject({
        n: expected.n,
        median: close(expected.median),
        medianLow: close(expected.medianLow),
        minimum: close(expected.minimum),
        maximum: close(expected.maximum),
        lowerQuartile: close(expected.lowerQuartile),
        upperQuartile: close(expected.upperQuartile),
        standardUncertainty: close(expected.standardUncertainty),
        degreesOfFreedom: expected.degreesOfFreedom,
        flagged: expected.flagged,
        setAside: expected.setAside,
        counts: {
          devices: 1,
          contributors: expected.contributors,
          instruments: expected.instruments,
          reports: expected.reports,
        },
      });
      expect([...(result?.atMostOf ?? [])].sort()).toEqual(expected.atMostOf);
      expect(result?.interval ?? null).toEqual(
        expected.coverage === null
          ? null
          : {
              low: close(expected.intervalLow),
              high: close(expected.intervalHigh),
              coverage: close(expected.coverage),
            },
      );
    },
  );

  it('cover one voice and many, censored, flagged, set-aside and replaced figures', () => {
    const answers = reference.published.map((entry) => entry.expected);
    expect(answers.some((answer) => answer.n === 1)).toBe(true);
    expect(answers.some((answer) => answer.n >= 10)).toBe(true);
    expect(answers.some((answer) => answer.flagged > 0)).toBe(true);
    expect(answers.some((answer) => answer.setAside > 0)).toBe(true);
    expect(answers.some((answer) => answer.median !== answer.medianLow)).toBe(true);
  });
});
