import { describe, expect, it } from 'vitest';
import { orderFigures } from '@/lib/figures/rules/order';
import { stonesOf, type StoneInput } from '@/lib/figures/rules/stones';

const input = (voice: string, value: number, traits: Partial<StoneInput> = {}): StoneInput => ({
  voice,
  label: voice,
  value,
  censored: false,
  counted: true,
  flagged: false,
  ...traits,
});

describe('the stones of a figure', () => {
  it('are none where nothing was measured', () => {
    expect(stonesOf([], null)).toEqual([]);
  });

  it('are one a voice at its median, and name everybody in it', () => {
    const stones = stonesOf([input('ina', 8), input('ina', 10, { label: 'orla' })], null);
    expect(stones).toEqual([
      { id: 'ina', value: 9, atMost: false, flagged: false, setAside: false, label: 'ina and orla' },
    ]);
  });

  it('are hollow for what does not count, beside the voice’s own', () => {
    const stones = stonesOf([input('ina', 8), input('ina', 80, { counted: false })], null);
    expect(stones.map(({ value, setAside }) => [value, setAside])).toEqual([
      [8, false],
      [80, true],
    ]);
    expect(new Set(stones.map((stone) => stone.id)).size).toBe(2);
  });

  it('are flagged beyond a factor of five from the category’s median, not at it', () => {
    const flagged = (value: number) => stonesOf([input('ina', value)], 10)[0]?.flagged;
    expect([flagged(50), flagged(51), flagged(2), flagged(1.9)]).toEqual([false, true, false, true]);
  });
});

describe('the order of figures', () => {
  const figure = (code: string, supplyStratum: 'ac-any' | 'ac-230' | 'dc', n: number) => ({
    mode: { code, name: code },
    quantity: 'mean-power' as const,
    powerKind: 'real' as const,
    supplyStratum,
    variant: null,
    n,
  });
  const basis = { quantity: 'mean-power' as const, modeCode: 'idle' };

  it('leads with the basis, then follows the modes; both mains voltages together lead their mode', () => {
    const given = [figure('boot', 'ac-230', 9), figure('idle', 'dc', 5), figure('idle', 'ac-any', 3)];
    const ordered = orderFigures(given, basis, ['boot', 'idle']);
    expect(ordered.map((one) => [one.mode.code, one.supplyStratum, one.isHeadline, one.isMain])).toEqual([
      ['idle', 'ac-any', true, true],
      ['idle', 'dc', false, false],
      ['boot', 'ac-230', false, true],
    ]);
  });

  it('lets the larger pile lead where supplies stand apart, whatever the order given', () => {
    const given = [figure('idle', 'dc', 2), figure('idle', 'ac-230', 5)];
    const leaders = [given, [...given].reverse()].map((some) => orderFigures(some, basis, ['idle'])[0]?.supplyStratum);
    expect(leaders).toEqual(['ac-230', 'ac-230']);
  });

  it('has no headline where nothing stands on the basis', () => {
    expect(orderFigures([figure('boot', 'ac-any', 3)], basis, ['boot']).some((one) => one.isHeadline)).toBe(false);
  });
});
