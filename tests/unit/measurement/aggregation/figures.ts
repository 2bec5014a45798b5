import type { PublishedFigure, VerifiedFigure } from '@/lib/measurement/aggregation/types';
import { publishDeviceFigure } from '@/lib/measurement/aggregation/publish-device';

let next = 0;

/** A verified figure of device "skerry-fridge"; each call is another report by another member. */
export function figure(traits: Partial<VerifiedFigure> = {}): VerifiedFigure {
  next += 1;
  const id = String(1000 + next);
  return {
    figureId: id,
    reportId: `report-${id}`,
    revisionId: id,
    contributorId: `member-${id}`,
    householdId: null,
    unitId: null,
    deviceId: 'skerry-fridge',
    instrumentModel: `meter-${id}`,
    value: 43,
    standardUncertainty: 0.5,
    gainUncertainty: 0.2,
    censoredAt: null,
    setAside: null,
    ...traits,
  };
}

/** One figure a value, each from a member of their own. */
export function figures(...values: number[]): VerifiedFigure[] {
  return values.map((value) => figure({ value }));
}

/** The published figure; the tests that use it have figures that count. */
export function published(input: readonly VerifiedFigure[], categoryMedian: number | null = null): PublishedFigure {
  const result = publishDeviceFigure(input, { unitSpread: 0.05, categoryMedian });
  if (!result) throw new Error('Nothing counts.');
  return result;
}
