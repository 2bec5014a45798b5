import { describe, expect, test } from 'vitest';
import { palette } from '@/tailwind.config';

/** Relative luminance and contrast ratio as WCAG 2.2 defines them (glossary, "relative luminance"; from memory). */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const channel = parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(one: string, other: string): number {
  const [low = 0, high = 0] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (high + 0.05) / (low + 0.05);
}

test('black on white has the contrast 21 (WCAG 2.2, from memory)', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 6);
});

describe.each(['light', 'dark'] as const)('in the %s theme', (theme) => {
  const colours = palette[theme];
  describe.each(['paper', 'sheet'] as const)('on %s', (ground) => {
    test.each(['ink', 'muted', 'lichen', 'rust', 'slate'] as const)('text in %s reaches 4.5', (token) => {
      expect(contrast(colours[token], colours[ground])).toBeGreaterThanOrEqual(4.5);
    });
    test.each(['stone-0', 'stone-1', 'stone-2'] as const)('a mark in %s reaches 3', (token) => {
      expect(contrast(colours[token], colours[ground])).toBeGreaterThanOrEqual(3);
    });
  });
});
