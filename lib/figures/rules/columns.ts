import type { Pool } from '@/lib/measurement/aggregation/pooling';
import type { PublishedFigure } from '@/lib/measurement/aggregation/types';

/** Whose figures: a device's or a category's. */
export interface FigureScope {
  kind: 'device' | 'category';
  id: number;
}

/** A published figure as its table keeps it, without what the database adds. */
export interface FigureColumns {
  variantId: number | null;
  modeId: number | null;
  quantity: Pool['quantity'];
  powerKind: Pool['powerKind'];
  supplyStratum: Pool['supplyStratum'];
  n: number;
  median: number | null;
  medianLow: number | null;
  lowerQuartile: number | null;
  upperQuartile: number | null;
  minimum: number | null;
  maximum: number | null;
  intervalLow: number | null;
  intervalHigh: number | null;
  intervalCoverage: number | null;
  tenthPercentile: number | null;
  ninetiethPercentile: number | null;
  atMost: boolean;
  standardUncertainty: number | null;
  degreesOfFreedom: number | null;
  flagged: number;
  setAside: number;
  devices: number;
  contributors: number;
  instruments: number;
  reports: number;
  ruleVersion: string;
  receiptHash: string;
}

/** What became of one report's figure, or of one device in its category. */
export interface InputColumns {
  reportFigureId: number | null;
  reportRevisionId: number | null;
  deviceId: number | null;
  voice: string;
  value: number;
  counted: boolean;
  flagged: boolean;
  reason: string | null;
}

/** One published figure with everything it rests on: what is compared, written and checked. */
export interface ScopedFigure {
  scope: FigureScope;
  columns: FigureColumns;
  inputs: InputColumns[];
}

/** The statistics as columns. */
export function columnsOf(pool: Pool, figure: PublishedFigure, receiptHash: string): FigureColumns {
  const { interval, counts } = figure;
  return {
    variantId: pool.variantId,
    modeId: pool.modeId,
    quantity: pool.quantity,
    powerKind: pool.powerKind,
    supplyStratum: pool.supplyStratum,
    n: figure.n,
    median: figure.median,
    medianLow: figure.medianLow,
    lowerQuartile: figure.lowerQuartile,
    upperQuartile: figure.upperQuartile,
    minimum: figure.minimum,
    maximum: figure.maximum,
    intervalLow: interval?.low ?? null,
    intervalHigh: interval?.high ?? null,
    intervalCoverage: interval?.coverage ?? null,
    tenthPercentile: figure.tenthPercentile,
    ninetiethPercentile: figure.ninetiethPercentile,
    atMost: figure.atMost,
    standardUncertainty: figure.standardUncertainty,
    degreesOfFreedom: figure.degreesOfFreedom,
    flagged: figure.flagged,
    setAside: figure.setAside,
    devices: counts.devices,
    contributors: counts.contributors,
    instruments: counts.instruments,
    reports: counts.reports,
    ruleVersion: figure.ruleVersion,
    receiptHash,
  };
}

/** The columns of a pool that nothing counts in any more: what its history ends with. */
export function emptied(columns: FigureColumns): FigureColumns {
  const { variantId, modeId, quantity, powerKind, supplyStratum, ruleVersion, receiptHash } = columns;
  return {
    variantId,
    modeId,
    quantity,
    powerKind,
    supplyStratum,
    n: 0,
    median: null,
    medianLow: null,
    lowerQuartile: null,
    upperQuartile: null,
    minimum: null,
    maximum: null,
    intervalLow: null,
    intervalHigh: null,
    intervalCoverage: null,
    tenthPercentile: null,
    ninetiethPercentile: null,
    atMost: false,
    standardUncertainty: null,
    degreesOfFreedom: null,
    flagged: 0,
    setAside: 0,
    devices: 0,
    contributors: 0,
    instruments: 0,
    reports: 0,
    ruleVersion,
    receiptHash,
  };
}
