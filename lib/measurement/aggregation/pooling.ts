import type { PowerKind, Quantity, SupplyClass } from '../units/quantity';

/** What a pile of figures is a pile of. */
export interface Pool {
  variantId: number | null;
  modeId: number | null;
  quantity: Quantity;
  powerKind: PowerKind;
  supplyStratum: SupplyClass | 'ac-any';
}

/** A figure's own traits, and what its category says of pooling. */
export interface Poolable extends Omit<Pool, 'supplyStratum'> {
  supplyClass: SupplyClass;
  /** Over which interval a maximum is averaged (s). */
  averagingSeconds: number | null;
  /** False where the version of the method it was measured by no longer counts. */
  methodCounts: boolean;
}

/** Maxima over unlike intervals are unlike things: those that are pooled, and compared with a claim, are 10 s means. */
const MAXIMUM_AVERAGING_SECONDS = 10;

/**
 * The piles that a figure counts in. Real and apparent power, AC and DC, modes and quantities are never one pile.
 * 120 V and 230 V stand apart always, and together besides where the category says that it makes no difference;
 * variants stand together only where it says so. A figure measured by a method version that doesn't count, and a
 * maximum that is no highest 10 s mean, count in none.
 *
 * @example poolsOf({ …230 V }, { poolsVariants: true, poolsSupplies: true }).map((pool) => pool.supplyStratum)
 * // ['ac-230', 'ac-any']
 */
export function poolsOf(figure: Poolable, category: { poolsVariants: boolean; poolsSupplies: boolean }): Pool[] {
  const { supplyClass, variantId, modeId, quantity, powerKind } = figure;
  const isOtherMaximum = quantity === 'maximum-power' && figure.averagingSeconds !== MAXIMUM_AVERAGING_SECONDS;
  if (!figure.methodCounts || isOtherMaximum) return [];
  const shared = { variantId: category.poolsVariants ? null : variantId, modeId, quantity, powerKind };
  const own: Pool = { ...shared, supplyStratum: supplyClass };
  return category.poolsSupplies && supplyClass !== 'dc' ? [own, { ...shared, supplyStratum: 'ac-any' }] : [own];
}

/** A pool as one text: figures with the same key may stand in one pile. */
export function poolKey(pool: Pool): string {
  return [pool.quantity, pool.modeId ?? '-', pool.powerKind, pool.supplyStratum, pool.variantId ?? '-'].join(' ');
}
