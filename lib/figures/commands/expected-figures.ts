import 'server-only';
import { receiptText } from '@/lib/measurement/aggregation/receipt';
import { sha256 } from '@/lib/platform/ids';
import type { CountedDevice } from '../queries/stored-figures';
import type { DeviceSettings, ReportedFigure } from '../queries/verified-figures';
import { columnsOf, type FigureScope, type ScopedFigure } from '../rules/columns';
import { figuresOfDevices, figuresOfReports, type PooledFigure } from '../rules/pile-figures';

/** What a device's verified reports yield, as its rows should stand, and what that brings to its category. */
export function expectedOfDevice(
  device: DeviceSettings,
  figures: readonly ReportedFigure[],
): { figures: ScopedFigure[]; contributions: CountedDevice[] } {
  const byId = new Map(figures.map((figure) => [figure.figureId, figure]));
  const pooled = figuresOfReports(figures, device);
  return {
    figures: pooled.map((one) =>
      scoped({ kind: 'device', id: device.deviceId }, device.publicId, one, ({ figureId }) => ({
        reportFigureId: Number(figureId),
        reportRevisionId: Number(byId.get(figureId)?.revisionId),
        deviceId: null,
      })),
    ),
    contributions: device.inCatalogue ? pooled.map((one) => contributionOf(device, one, byId)) : [],
  };
}

/** What a category's devices yield, as its rows should stand. */
export function expectedOfCategory(
  category: { id: number; publicId: string },
  contributions: readonly CountedDevice[],
): ScopedFigure[] {
  const rowOf = new Map(contributions.map((one) => [one.deviceId, one.ofDevice]));
  return figuresOfDevices(contributions).map((one) =>
    scoped({ kind: 'category', id: category.id }, category.publicId, one, ({ figureId }) => ({
      reportFigureId: null,
      reportRevisionId: null,
      deviceId: rowOf.get(figureId) ?? null,
    })),
  );
}

function contributionOf(
  device: DeviceSettings,
  { pool, figure }: PooledFigure,
  byId: ReadonlyMap<string, ReportedFigure>,
): CountedDevice {
  const counted = figure.inputs.flatMap((input) => {
    const known = input.counted ? byId.get(input.figureId) : undefined;
    return known ? [known] : [];
  });
  return {
    deviceId: device.publicId,
    ofDevice: device.deviceId,
    pool,
    median: figure.median,
    medianLow: figure.medianLow,
    setAside: figure.setAside,
    contributors: counted.map((one) => one.contributorId),
    instruments: counted.map((one) => one.instrumentModel),
    reports: counted.map((one) => one.reportId),
  };
}

function scoped(
  scope: FigureScope,
  publicId: string,
  { pool, figure }: PooledFigure,
  rowsBehind: (input: PooledFigure['figure']['inputs'][number]) => {
    reportFigureId: number | null;
    reportRevisionId: number | null;
    deviceId: number | null;
  },
): ScopedFigure {
  const receiptHash = sha256(receiptText({ kind: scope.kind, id: publicId, pool }, figure));
  return {
    scope,
    columns: columnsOf(pool, figure, receiptHash),
    inputs: figure.inputs.map((input) => ({
      ...rowsBehind(input),
      voice: input.voiceId,
      value: input.value,
      counted: input.counted,
      flagged: input.flagged,
      reason: input.reason,
    })),
  };
}

/** Groups by the number that each item belongs to. */
export function byNumber<T>(items: readonly T[], numberOf: (item: T) => number): Map<number, T[]> {
  const groups = new Map<number, T[]>();
  for (const item of items) {
    const known = groups.get(numberOf(item));
    if (known) known.push(item);
    else groups.set(numberOf(item), [item]);
  }
  return groups;
}
