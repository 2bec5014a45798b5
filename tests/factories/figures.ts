import { database } from '@/lib/platform/database/connection';
import { inTransaction } from '@/lib/platform/database/transaction';
import { now } from '@/lib/platform/clock';
import { publicId, sha256 } from '@/lib/platform/ids';
import type { PowerKind, Quantity, SupplyClass } from '@/lib/measurement/units/quantity';
import type { ReportContent } from '@/lib/reports/schema';
import type { MadeDevice } from './catalogue';
import { aMember, type MadeMember } from './members';

export interface FigureTraits {
  value: number;
  mode?: string | null;
  quantity?: Quantity;
  powerKind?: PowerKind;
  standardUncertainty?: number;
  censoredAt?: number | null;
  averagingSeconds?: number | null;
}

export interface ReportTraits {
  member?: MadeMember;
  supplyClass?: SupplyClass;
  variantId?: number | null;
  unitId?: number | null;
  methodRevisionId?: number;
  instrumentModel?: string;
  content?: Partial<ReportContent>;
}

export interface MadeReport {
  id: number;
  publicId: string;
  revisionId: number;
  member: MadeMember;
  deviceId: number;
  figureIds: number[];
}

export const CHECKLIST = [
  { key: 'identity', label: 'The device is the one named', hint: 'The plate agrees with the catalogue.' },
  { key: 'instrument', label: 'The instrument can resolve it', hint: 'Its accuracy suits the figures.' },
  { key: 'evidence', label: 'Evidence matches the numbers', hint: 'Photos show what the figures say.' },
];

/** A method's revision, by default one that counts. */
export async function aMethodRevision({ counts = true } = {}): Promise<number> {
  const { Method, MethodRevision } = database().models;
  const code = `method-${publicId().replace(/\d/g, 'x')}`;
  const method = await Method.create({ code });
  const revision = await MethodRevision.create({
    methodId: method.id,
    n: 1,
    name: 'Plug-in meter, steady state',
    summary: 'Let it settle, then read.',
    minimumSeconds: 600,
    caution: 'Keep it dry.',
    needsConfirmation: false,
    counts,
    checklist: CHECKLIST,
    createdAt: now(),
  });
  await method.update({ currentRevisionId: revision.id });
  return revision.id;
}

/** A report that waits for review, with its figures as given: nothing is uploaded or computed. */
export async function aSubmittedReport(
  device: MadeDevice,
  figures: FigureTraits[],
  traits: ReportTraits = {},
): Promise<MadeReport> {
  const { models } = database();
  const member = traits.member ?? (await aMember());
  const report = await models.Report.create({
    publicId: publicId(),
    memberId: member.id,
    deviceId: device.id,
    variantId: traits.variantId ?? null,
    unitId: traits.unitId ?? null,
    clientKey: publicId(),
    state: 'draft',
    createdAt: now(),
  });
  const made = { id: report.id, publicId: report.publicId, member, deviceId: device.id };
  return { ...made, ...(await aRevision(made, device, figures, traits)) };
}

/** A further revision of a report, waiting for review. */
export async function aRevision(
  report: Pick<MadeReport, 'id' | 'member'>,
  device: MadeDevice,
  figures: FigureTraits[],
  traits: ReportTraits = {},
): Promise<{ revisionId: number; figureIds: number[] }> {
  const { models } = database();
  const supplyClass = traits.supplyClass ?? 'ac-230';
  const last = await models.ReportRevision.findOne({ where: { reportId: report.id }, order: [['n', 'DESC']] });
  const revision = await models.ReportRevision.create({
    reportId: report.id,
    n: (last?.n ?? 0) + 1,
    schemaVersion: 1,
    content: { ...emptyContent(supplyClass), ...traits.content },
    categoryRevisionId: device.category.revisionId,
    methodRevisionId: traits.methodRevisionId ?? (await aMethodRevision()),
    instrumentRevisionId: await anInstrumentRevision(report.member, traits.instrumentModel),
    supplyClass,
    measuringPoint: 'plug',
    ambientCelsius: 20,
    licence: 'CC-BY-4.0',
    previousHash: last?.hash ?? null,
    hash: sha256(publicId()),
    createdAt: now(),
  });
  const rows = await models.ReportFigure.bulkCreate(
    figures.map((figure) => figureRow(revision.id, device, supplyClass, figure)),
  );
  await models.Report.update(
    { state: 'submitted', pendingRevisionId: revision.id, submittedAt: now() },
    { where: { id: report.id } },
  );
  return { revisionId: revision.id, figureIds: rows.map((row) => row.id) };
}

/** A report that counts. Its figures are published only where the caller has lib/figures registered. */
export async function aVerifiedReport(
  device: MadeDevice,
  figures: FigureTraits[],
  traits: ReportTraits = {},
): Promise<MadeReport> {
  const report = await aSubmittedReport(device, figures, traits);
  await verifyDirectly(report);
  return report;
}

/** What a verdict does to a report, without the review behind it. */
export async function verifyDirectly(report: MadeReport): Promise<void> {
  await inTransaction(async (work) => {
    await work.models.Report.update(
      { state: 'verified', publishedRevisionId: report.revisionId, pendingRevisionId: null, decidedAt: now() },
      { where: { id: report.id }, transaction: work.transaction },
    );
    work.touch({ kind: 'device', id: report.deviceId });
  });
}

async function anInstrumentRevision(member: MadeMember, modelName = 'Plugwell 2'): Promise<number> {
  const { Instrument, InstrumentRevision } = database().models;
  const instrument = await Instrument.create({
    publicId: publicId(),
    memberId: member.id,
    name: 'Kitchen meter',
    createdAt: now(),
  });
  const revision = await InstrumentRevision.create({
    instrumentId: instrument.id,
    n: 1,
    kind: 'plug-in-meter',
    modelName,
    percentOfReading: 1,
    percentOfRange: 0,
    counts: 2,
    resolutionWatts: 0.1,
    lowerLimitWatts: 0.5,
    readsTruePower: true,
    supplies: ['ac-230', 'ac-120', 'dc'],
    averagingSeconds: 1,
    createdAt: now(),
  });
  await instrument.update({ currentRevisionId: revision.id });
  return revision.id;
}

function figureRow(reportRevisionId: number, device: MadeDevice, supplyClass: SupplyClass, figure: FigureTraits) {
  const { value, mode = 'idle', quantity = 'mean-power' } = figure;
  const isMaximum = quantity === 'maximum-power';
  return {
    reportRevisionId,
    modeId: mode === null ? null : (device.category.modes[mode] as number),
    quantity,
    powerKind: figure.powerKind ?? 'real',
    supplyClass,
    value,
    standardUncertainty: figure.standardUncertainty ?? 0.01 * Math.abs(value),
    gain: 0.005 * Math.abs(value),
    offset: 0,
    resolution: 0.03,
    repeatability: 0,
    drift: 0,
    belowLimit: 0,
    censoredAt: figure.censoredAt ?? null,
    averagingSeconds: figure.averagingSeconds ?? (isMaximum ? 10 : 600),
    coverage: 1,
    countedSeconds: 600,
    computationVersion: '1',
  };
}

function emptyContent(supplyClass: SupplyClass): ReportContent {
  return {
    variantLabel: null,
    unitLabel: null,
    methodCode: 'plug-in-steady',
    cautionConfirmed: false,
    supplyClass,
    supplyVolts: 230,
    hertz: 50,
    measuringPoint: 'plug',
    isOnlyLoad: true,
    ambientCelsius: 20,
    conditions: {},
    heldConstant: '',
    measuredOn: '2026-11-02',
    phases: [
      {
        source: 'typed',
        modeCode: 'idle',
        startsAt: null,
        durationSeconds: 600,
        meanWatts: 8,
        minimumWatts: null,
        maximumWatts: null,
        energyWattHours: null,
        uses: null,
        note: '',
      },
    ],
    traces: [],
    photos: [],
    notes: '',
  };
}
