import { variantLabel } from '@/lib/catalogue/rules';
import type { FigureColumns } from './rules/columns';
import { unitOf } from '@/lib/measurement/units/unit-of';
import type { FigureSummary } from './schema';

/** A published figure's row, with the names of what its ids stand for. */
export interface NamedFigure extends FigureColumns {
  id: number;
  deviceId: number | null;
  categoryId: number | null;
  modeCode: string | null;
  modeName: string | null;
  generation: string | null;
  region: string | null;
  changedAt: Date;
}

type Unordered = Omit<FigureSummary, 'isHeadline' | 'isMain'>;

/** A published figure as pages and the API show it: named fields only, no inner ids. */
export function presentFigure(row: NamedFigure): Unordered {
  const { modeCode, modeName, variantId, generation, region, intervalLow, intervalHigh, intervalCoverage } = row;
  return {
    mode: modeCode !== null && modeName !== null ? { code: modeCode, name: modeName } : null,
    quantity: row.quantity,
    powerKind: row.powerKind,
    supplyStratum: row.supplyStratum,
    variant:
      variantId !== null && generation !== null ? { id: variantId, label: variantLabel({ generation, region }) } : null,
    unit: unitOf(row.quantity, row.powerKind),
    n: row.n,
    median: published(row.median),
    atMost: row.atMost,
    minimum: published(row.minimum),
    maximum: published(row.maximum),
    lowerQuartile: row.lowerQuartile,
    upperQuartile: row.upperQuartile,
    tenthPercentile: row.tenthPercentile,
    ninetiethPercentile: row.ninetiethPercentile,
    interval:
      intervalLow !== null && intervalHigh !== null && intervalCoverage !== null
        ? { low: intervalLow, high: intervalHigh, coverage: intervalCoverage }
        : null,
    standardUncertainty: row.standardUncertainty,
    degreesOfFreedom: row.degreesOfFreedom,
    flagged: row.flagged,
    setAside: row.setAside,
    counts: {
      devices: row.devices,
      contributors: row.contributors,
      instruments: row.instruments,
      reports: row.reports,
    },
    ruleVersion: row.ruleVersion,
    receiptHash: row.receiptHash,
    changedAt: row.changedAt.toISOString(),
  };
}

/** A published row always has these; one without is damaged, and `npm run recompute` repairs it. */
function published(value: number | null): number {
  if (value === null) throw new Error('A published figure has no median or range.');
  return value;
}
