import { describe, expect, it } from 'vitest';
import { rank, type SearchEntry } from '@/lib/platform/search/rank';

const entries: SearchEntry[] = [
  { id: 'a', name: 'Vennholm KX-140', words: ['KX140', 'Kista 140', 'Chest freezer'] },
  { id: 'b', name: 'Ostrigg Frosta 90', words: ['OF90', 'Chest freezer'] },
  { id: 'c', name: 'Corrivane Tidal 4', words: ['CT-4', 'Router'] },
  { id: 'd', name: 'Hallmund Trommel 8 S', words: ['T8S', 'Washing machine'] },
];
const first = (query: string) => rank(entries, query, 3)[0]?.id;

describe('rank', () => {
  it('finds a model with or without its dashes and spaces', () => {
    expect(['KX-140', 'kx140', 'kx 140', 'Vennholm KX 140'].map(first)).toEqual(['a', 'a', 'a', 'a']);
  });

  it('forgives two wrong letters in a maker', () => {
    expect(first('Venhohlm')).toBe('a');
    expect(first('Coriwane')).toBe('c');
  });

  it('takes words in any order', () => {
    expect(first('8 S trommel hallmund')).toBe('d');
  });

  it('knows a device by its other names', () => {
    expect(first('Kista')).toBe('a');
    expect(first('t8s')).toBe('d');
  });

  it('puts every device of a category before the others', () => {
    expect(
      rank(entries, 'freezer', 2)
        .map((entry) => entry.id)
        .sort(),
    ).toEqual(['a', 'b']);
  });

  it('answers an empty query and an endless one with nothing dreadful', () => {
    expect(rank(entries, '   ', 3)).toEqual([]);
    expect(rank(entries, 'x'.repeat(50_000), 3).length).toBeLessThanOrEqual(3);
  });
});
