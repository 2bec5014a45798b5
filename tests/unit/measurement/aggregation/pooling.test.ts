import { describe, expect, it } from 'vitest';
import { poolKey, poolsOf, type Poolable } from '@/lib/measurement/aggregation/pooling';

const figure: Poolable = {
  variantId: 3,
  modeId: 5,
  quantity: 'mean-power',
  powerKind: 'real',
  supplyClass: 'ac-230',
  averagingSeconds: null,
  methodCounts: true,
};
const apart = { poolsVariants: false, poolsSupplies: false };
const keys = (traits: Partial<Poolable>, category = apart) =>
  poolsOf({ ...figure, ...traits }, category).map((pool) => poolKey(pool));

describe('which figures stand in one pile', () => {
  it('those alike in variant, mode, quantity, kind of power and supply', () => {
    expect(keys({})).toEqual(['mean-power 5 real ac-230 3']);
    expect(keys({ modeId: null, variantId: null })).toEqual(['mean-power - real ac-230 -']);
  });

  it.each([
    ['real and apparent power', { powerKind: 'apparent' }],
    ['AC and DC', { supplyClass: 'dc' }],
    ['120 V and 230 V', { supplyClass: 'ac-120' }],
    ['two modes', { modeId: 6 }],
    ['two quantities', { quantity: 'day-energy' }],
    ['two variants', { variantId: 4 }],
  ] satisfies [string, Partial<Poolable>][])('never %s', (_, traits) => {
    expect(keys(traits)).not.toEqual(keys({}));
    expect(keys(traits)).toHaveLength(1);
  });

  it('real and apparent power stay apart whatever the category pools', () => {
    const all = { poolsVariants: true, poolsSupplies: true };
    const shared = keys({}, all).filter((key) => keys({ powerKind: 'apparent' }, all).includes(key));
    expect(shared).toEqual([]);
  });

  it('variants together where the category says so', () => {
    const pooled = { poolsVariants: true, poolsSupplies: false };
    expect(keys({ variantId: 3 }, pooled)).toEqual(keys({ variantId: 4 }, pooled));
  });

  it('120 V and 230 V together where the category says so, and also apart; DC never with them', () => {
    const pooled = { poolsVariants: false, poolsSupplies: true };
    expect(keys({}, pooled)).toEqual(['mean-power 5 real ac-230 3', 'mean-power 5 real ac-any 3']);
    expect(keys({ supplyClass: 'ac-120' }, pooled)).toEqual([
      'mean-power 5 real ac-120 3',
      'mean-power 5 real ac-any 3',
    ]);
    expect(keys({ supplyClass: 'dc' }, pooled)).toEqual(['mean-power 5 real dc 3']);
  });

  it('none of a method version that doesn’t count', () => {
    expect(keys({ methodCounts: false })).toEqual([]);
  });

  it('of maxima those that are highest 10 s means alone; other quantities whatever their interval', () => {
    expect(keys({ quantity: 'maximum-power', averagingSeconds: 10 })).toHaveLength(1);
    for (const averagingSeconds of [null, 1, 60]) {
      expect(keys({ quantity: 'maximum-power', averagingSeconds })).toEqual([]);
      expect(keys({ quantity: 'mean-power', averagingSeconds })).toHaveLength(1);
    }
  });
});
