// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, test } from 'vitest';
import { RangeBar } from '@/components/charts/range-bar';
import { placeOnScale, rangeTicks, shareScale } from '@/components/charts/range-scale';

afterEach(cleanup);

describe('the scale that a list shares', () => {
  test('is linear and begins at zero where the hits are of one size', () => {
    const scale = shareScale([
      { low: 20, high: 30 },
      { low: 60, high: 86 },
    ]);
    expect(scale).toEqual({ kind: 'linear', domain: [0, 100] });
    expect(rangeTicks(scale).map((tick) => tick.label)).toEqual(['0', '20', '40', '60', '80', '100']);
  });

  test('is logarithmic from power to power of ten where they are far apart', () => {
    const scale = shareScale([
      { low: 0.4, high: 0.9 },
      { low: 900, high: 2200 },
    ]);
    expect(scale).toEqual({ kind: 'log', domain: [0.1, 10000] });
    expect(rangeTicks(scale).map((tick) => tick.label)).toEqual(['0.1', '1', '10', '100', '1000', '10000']);
    expect(placeOnScale(scale, 10)).toBeCloseTo(40, 9);
  });

  test('draws a zero at the edge of a logarithmic scale', () => {
    const scale = shareScale([
      { low: 0, high: 1 },
      { low: 900, high: 2200 },
    ]);
    expect(placeOnScale(scale, 0)).toBe(0);
  });

  test.each([
    ['nothing', []],
    ['zeros', [{ low: 0, high: 0 }]],
  ])('of %s still is a scale', (_, ranges) => {
    expect(shareScale(ranges)).toEqual({ kind: 'linear', domain: [0, 1] });
  });
});

test('a bar says its name, range and median', () => {
  const scale = shareScale([{ low: 71, high: 86 }]);
  render(<RangeBar scale={scale} low={71} high={86} median={78} unit="W" name="Vennholm KX-140" />);
  expect(screen.getByRole('img', { name: 'Vennholm KX-140: 71.0 to 86.0 W, median 78.0 W' })).toBeTruthy();
});
