import type { FigureSummary } from '../schema';

type Ordered = Pick<FigureSummary, 'mode' | 'quantity' | 'powerKind' | 'supplyStratum' | 'variant' | 'n'>;

export interface Basis {
  quantity: FigureSummary['quantity'];
  modeCode: string | null;
}

const STRATA = ['ac-any', 'ac-230', 'ac-120', 'dc'];

/**
 * Puts figures in the order in which a page shows them, and says which of them lead: of one mode and quantity the one
 * over both mains voltages where there is one, otherwise the largest pile; and on the category's basis the headline.
 *
 * @param modeCodes the category's modes in their order.
 */
export function orderFigures<T extends Ordered>(
  figures: readonly T[],
  basis: Basis,
  modeCodes: readonly string[],
): (T & { isHeadline: boolean; isMain: boolean })[] {
  const isOnBasis = ({ quantity, mode, powerKind }: Ordered) =>
    quantity === basis.quantity && (mode?.code ?? null) === basis.modeCode && powerKind === 'real';
  const placeOf = ({ mode }: Ordered) => (mode ? modeCodes.indexOf(mode.code) : -1);
  const ordered = [...figures].sort(
    (a, b) =>
      Number(isOnBasis(b)) - Number(isOnBasis(a)) ||
      placeOf(a) - placeOf(b) ||
      (a.quantity < b.quantity ? -1 : a.quantity > b.quantity ? 1 : 0) ||
      (a.powerKind < b.powerKind ? 1 : a.powerKind > b.powerKind ? -1 : 0) ||
      Number(b.supplyStratum === 'ac-any') - Number(a.supplyStratum === 'ac-any') ||
      b.n - a.n ||
      (a.variant?.id ?? 0) - (b.variant?.id ?? 0) ||
      STRATA.indexOf(a.supplyStratum) - STRATA.indexOf(b.supplyStratum),
  );
  const seen = new Set<string>();
  let headlineGiven = false;
  return ordered.map((figure) => {
    const pile = `${figure.mode?.code ?? ''} ${figure.quantity} ${figure.powerKind} ${figure.variant?.id ?? ''}`;
    const isMain = !seen.has(pile);
    seen.add(pile);
    const isHeadline = !headlineGiven && isOnBasis(figure);
    headlineGiven ||= isHeadline;
    return { ...figure, isMain, isHeadline };
  });
}
