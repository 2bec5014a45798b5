import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { describeBasis, slugFrom, variantLabel } from '@/lib/catalogue/rules';

describe('slugFrom', () => {
  it('keeps letters without accents, digits and single hyphens', () => {
    expect(slugFrom('Vennholm KX-140')).toBe('vennholm-kx-140');
    expect(slugFrom('  Ströﬂi  Ølmé//2 ')).toBe('strofli-lme-2');
  });

  it('gives a name of emoji alone an address all the same', () => {
    expect(slugFrom('🧊🧊')).toBe('device');
  });

  it('never gives a word that an address of ours uses', () => {
    expect(slugFrom('New')).toBe('new-device');
    expect(slugFrom('API')).toBe('api-device');
  });

  it('is always what the database accepts', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 300 }), (name) => {
        const slug = slugFrom(name);
        expect(slug).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/);
        expect(slug.length).toBeLessThanOrEqual(120);
      }),
    );
  });
});

describe('describeBasis', () => {
  it('names the mode where power is compared, and the day or use where energy is', () => {
    expect(describeBasis('mean-power', { code: 'idle', name: 'Idle' })).toEqual({
      quantity: 'mean-power',
      modeCode: 'idle',
      unit: 'W',
      label: 'power when idle',
    });
    expect(describeBasis('day-energy', null)).toMatchObject({ unit: 'Wh/d', modeCode: null });
    expect(describeBasis('use-energy', null)).toMatchObject({ unit: 'Wh/use', label: 'energy of a use' });
  });
});

describe('variantLabel', () => {
  it('leaves out a region that is not known', () => {
    expect(variantLabel({ generation: 'hardware 2', region: null })).toBe('hardware 2');
    expect(variantLabel({ generation: 'hardware 2', region: 'north' })).toBe('hardware 2, north');
  });
});
