import { writeFile } from 'node:fs/promises';
import path from 'node:path';
import { inTransaction } from '@/lib/platform/database/transaction';
import { database } from '@/lib/platform/database/connection';
import { now } from '@/lib/platform/clock';
import { publicId } from '@/lib/platform/ids';
import { incomingFolder, storedName } from '@/lib/platform/storage/files';
import type { ReceivedUpload } from '@/lib/platform/storage/receive-upload';
import { addInstrument } from '@/lib/reports/commands/instruments';
import { acceptTrace } from '@/lib/reports/commands/traces';
import type { InstrumentInput, Phase, ReportContent, Submission } from '@/lib/reports/schema';
import type { MadeDevice } from './catalogue';
import { CHECKLIST } from './figures';
import type { MadeMember } from './members';

export const METER: InstrumentInput = {
  name: 'Kitchen meter',
  kind: 'plug-in-meter',
  modelName: 'Plugwell 2',
  percentOfReading: 1,
  percentOfRange: 0,
  rangeWatts: null,
  counts: 1,
  resolutionWatts: 0.1,
  resolutionWattHours: null,
  lowerLimitWatts: 0.5,
  readsTruePower: true,
  supplies: ['ac-230'],
  averagingSeconds: 1,
  calibratedOn: null,
};

/** A member's instrument, made by the command that members use; returns its public id. */
export function anInstrument(member: MadeMember, traits: Partial<InstrumentInput> = {}): Promise<string> {
  return inTransaction((work) => addInstrument(work, member.id, { ...METER, ...traits }));
}

/** A method in force, by default one of ten minutes that asks for no confirmation; returns its code. */
export async function aMethod({ needsConfirmation = false, minimumSeconds = 600, minimumCycles = 0 } = {}) {
  const { Method, MethodRevision } = database().models;
  const code = `method-${publicId().replace(/\d/g, 'x')}`;
  const method = await Method.create({ code });
  const revision = await MethodRevision.create({
    methodId: method.id,
    n: 1,
    name: 'Plug-in meter, steady state',
    summary: 'Let it settle, then read.',
    minimumSeconds,
    minimumCycles,
    caution: 'Keep it dry.',
    needsConfirmation,
    counts: true,
    checklist: CHECKLIST,
    createdAt: now(),
  });
  await method.update({ currentRevisionId: revision.id });
  return code;
}

type TypedPhase = Extract<Phase, { source: 'typed' }>;
type TracedPhase = Extract<Phase, { source: 'trace' }>;

export const typedPhase = (modeCode: string, meanWatts: number, traits: Partial<TypedPhase> = {}): TypedPhase => ({
  source: 'typed',
  modeCode,
  startsAt: null,
  durationSeconds: 3600,
  meanWatts,
  minimumWatts: null,
  maximumWatts: null,
  energyWattHours: null,
  uses: null,
  note: '',
  ...traits,
});

export const tracedPhase = (
  modeCode: string,
  tracePublicId: string,
  fromSeconds: number,
  toSeconds: number,
  traits: Partial<TracedPhase> = {},
): TracedPhase => ({
  source: 'trace',
  modeCode,
  tracePublicId,
  fromSeconds,
  toSeconds,
  uses: null,
  note: '',
  ...traits,
});

export function aContent(methodCode: string, traits: Partial<ReportContent> = {}): ReportContent {
  return {
    variantLabel: null,
    unitLabel: null,
    methodCode,
    cautionConfirmed: false,
    supplyClass: 'ac-230',
    supplyVolts: 231,
    hertz: 50,
    measuringPoint: 'plug',
    isOnlyLoad: true,
    ambientCelsius: 19.5,
    conditions: {},
    heldConstant: 'The place.',
    measuredOn: '2026-11-02',
    phases: [typedPhase('idle', 8.1)],
    traces: [],
    photos: [],
    notes: 'Stood on the *shelf*.',
    ...traits,
  };
}

export interface Sender {
  member: MadeMember;
  device: MadeDevice;
  instrumentPublicId: string;
  methodCode: string;
}

export function aSubmission(
  { device, instrumentPublicId, methodCode }: Omit<Sender, 'member'>,
  traits: Partial<ReportContent> = {},
): Submission {
  return {
    device: { from: 'catalogue', publicId: device.publicId, variantId: null },
    instrumentPublicId,
    licenceAgreed: true,
    content: aContent(methodCode, traits),
  };
}

/** A file as it lies after it was received. */
export async function received(content: string | Uint8Array, name: string): Promise<ReceivedUpload> {
  const file = path.join(await incomingFolder(), storedName('part'));
  await writeFile(file, content);
  return { path: file, name, bytes: Buffer.byteLength(content), fields: {} };
}

/** A log that was sent and understood; returns its trace's public id. */
export async function aTrace(member: MadeMember, log: string, name = 'log.csv'): Promise<string> {
  const reading = await acceptTrace(member.id, await received(log, name), { zone: 'UTC', corrections: {} });
  if (reading.status !== 'read') throw new Error(JSON.stringify(reading.description.questions));
  return reading.tracePublicId;
}

/** 2026-11-02T00:00:00Z, when the logs of these factories begin. */
export const LOG_START = Date.UTC(2026, 10, 2) / 1000;

/** A log of a reading every so many seconds; what is read at second s is the caller's to say. */
export function aLog(seconds: number, wattsAt: (second: number) => number, every = 10, unit = 'power_W'): string {
  const rows: string[] = [`time,${unit}`];
  for (let at = 0; at <= seconds; at += every) {
    rows.push(`${new Date((LOG_START + at) * 1000).toISOString()},${wattsAt(at)}`);
  }
  return `${rows.join('\n')}\n`;
}

/** A compressor that runs 20 minutes of every hour. */
export const freezerWatts = (second: number) => (second % 3600 < 1200 ? 78 + (second % 70) / 100 : 1.6);
