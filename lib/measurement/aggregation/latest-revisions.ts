import type { VerifiedFigure } from './types';

/** The figures that speak for their report, and those that a later revision has replaced. */
export interface RevisionSplit {
  latest: VerifiedFigure[];
  replaced: VerifiedFigure[];
}

/**
 * Parts the figures of each report's latest verified revision from those of its earlier ones. A report speaks once,
 * with what it says now.
 *
 * @param figures any order; their order is kept.
 * @example latestRevisions([revision 9 of a report, revision 10 of it]).latest[0].revisionId // '10'
 */
export function latestRevisions(figures: readonly VerifiedFigure[]): RevisionSplit {
  const newest = new Map<string, string>();
  for (const { reportId, revisionId } of figures) {
    const known = newest.get(reportId);
    if (known === undefined || comesLater(revisionId, known)) newest.set(reportId, revisionId);
  }
  const split: RevisionSplit = { latest: [], replaced: [] };
  for (const figure of figures) {
    (newest.get(figure.reportId) === figure.revisionId ? split.latest : split.replaced).push(figure);
  }
  return split;
}

/** Ids are rising numbers written as text: "10" comes after "9". */
function comesLater(a: string, b: string): boolean {
  return a.length === b.length ? a > b : a.length > b.length;
}
