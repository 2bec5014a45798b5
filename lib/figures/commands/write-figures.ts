import 'server-only';
import { now } from '@/lib/platform/clock';
import type { Work } from '@/lib/platform/database/transaction';
import type { StoredFigure } from '../queries/stored-figures';
import { emptied, type ScopedFigure } from '../rules/columns';
import type { Difference } from '../rules/differences';

/** The scopes' rows, by kind and by device or category. */
export type ScopeRows = Record<'device' | 'category', ReadonlyMap<number, number>>;

/** Makes what is stored equal to what is expected, and keeps in the history what moved and why. */
export async function writeFigures(
  work: Work,
  scopes: ScopeRows,
  differences: readonly Difference<StoredFigure>[],
): Promise<void> {
  if (differences.length === 0) return;
  const { PublishedFigure, PublishedFigureInput, PublishedFigureHistory } = work.models;
  const { transaction } = work;
  const changedAt = now();
  const scopeId = ({ scope }: ScopedFigure) => {
    const id = scopes[scope.kind].get(scope.id);
    if (id === undefined) throw new Error(`The figures of ${scope.kind} ${scope.id} are not locked.`);
    return id;
  };
  const changed: { id: number; figure: ScopedFigure }[] = [];
  const gone: number[] = [];
  const added: ScopedFigure[] = [];
  for (const { stored, expected } of differences) {
    if (stored && expected) changed.push({ id: stored.id, figure: expected });
    else if (expected) added.push(expected);
    else if (stored) gone.push(stored.id);
  }
  // The inputs of a deleted figure go with it.
  await PublishedFigure.destroy({ where: { id: gone }, transaction });
  await PublishedFigureInput.destroy({ where: { publishedFigureId: changed.map(({ id }) => id) }, transaction });
  for (const { id, figure } of changed) {
    await PublishedFigure.update({ ...figure.columns, changedAt }, { where: { id }, transaction });
  }
  const rows = await PublishedFigure.bulkCreate(
    added.map((figure) => ({ ...figure.columns, scopeId: scopeId(figure), changedAt })),
    { transaction },
  );
  const written = [...changed, ...rows.map((row, i) => ({ id: row.id, figure: added[i] as ScopedFigure }))];
  await PublishedFigureInput.bulkCreate(
    written.flatMap(({ id, figure }) => figure.inputs.map((input) => ({ ...input, publishedFigureId: id }))),
    { transaction },
  );
  await PublishedFigureHistory.bulkCreate(
    differences.flatMap(({ stored, expected }) => {
      const figure = expected ?? stored;
      if (!figure) return [];
      const columns = expected ? expected.columns : emptied(figure.columns);
      return [{ ...columns, scopeId: scopeId(figure), eventId: work.eventId, at: changedAt }];
    }),
    { transaction },
  );
}
