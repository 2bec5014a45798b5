import 'server-only';
import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { Op } from 'sequelize';
import { importTrace } from '@/lib/measurement/traces/import/import-trace';
import { IMPORTER_VERSION, type TraceCorrections, type TraceDescription } from '@/lib/measurement/traces/import/types';
import { traceLevels } from '@/lib/measurement/traces/levels';
import type { Trace } from '@/lib/measurement/traces/trace';
import { now, secondsFromNow } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import { AppError, notFound } from '@/lib/platform/errors';
import { publicId } from '@/lib/platform/ids';
import { dropFile, keepFile, keptPath, storedName, writeKept } from '@/lib/platform/storage/files';
import type { ReceivedUpload } from '@/lib/platform/storage/receive-upload';
import type { TraceUpload } from '@/models/trace-upload';
import { encodeSeries } from '../rules/trace-series';

/** A day's worth of the largest ordinary files; more at once is no evening's measuring. */
const MOST_BYTES_A_DAY = 600_000_000;

/** What came of reading a file: a trace, or what must be answered first. */
export type TraceReading =
  | { status: 'read'; uploadPublicId: string; tracePublicId: string; description: TraceDescription }
  | { status: 'needs-answers'; uploadPublicId: string; description: TraceDescription };

export interface ReadingOptions {
  zone: string;
  corrections: TraceCorrections;
}

/**
 * Keeps a received file, private to its member, and reads it.
 * @throws {AppError} quota-reached, or bad-input with what is wrong with the file, which is then dropped.
 */
export async function acceptTrace(
  memberId: number,
  upload: ReceivedUpload,
  options: ReadingOptions,
): Promise<TraceReading> {
  try {
    await refuseOverQuota(memberId, upload.bytes);
    const fileHash = await hashOf(upload.path);
    const read = await readFile(upload.path, options);
    const storedFile = storedName('log');
    await keepFile(upload.path, storedFile);
    const row = await database().models.TraceUpload.create({
      publicId: publicId(),
      memberId,
      fileName: upload.name,
      fileHash,
      fileBytes: upload.bytes,
      storedFile,
      createdAt: now(),
    });
    return await keepReading(row, read, options);
  } catch (error) {
    await dropFile(upload.path);
    throw error;
  }
}

/** Reads a kept file again with what the member set right: another trace, since a trace never changes. */
export async function readAgain(
  memberId: number,
  uploadPublicId: string,
  options: ReadingOptions,
): Promise<TraceReading> {
  const row = await database().models.TraceUpload.findOne({ where: { publicId: uploadPublicId, memberId } });
  if (!row) throw notFound('file');
  return keepReading(row, await readFile(keptPath(row.storedFile), options), options);
}

type Reading = { description: TraceDescription; trace: Trace | null };

async function readFile(path: string, options: ReadingOptions): Promise<Reading> {
  const result = await importTrace(createReadStream(path, { highWaterMark: 64 * 1024 }), options);
  if (result.ok) return { description: result.description, trace: result.trace };
  if (result.problem === null) return { description: result.description, trace: null };
  throw new AppError('bad-input', result.problem.message, {
    fields: [{ pointer: '/file', message: result.problem.message }],
    facts: { problem: result.problem.code, line: result.problem.line },
  });
}

async function keepReading(
  upload: TraceUpload,
  { description, trace }: Reading,
  options: ReadingOptions,
): Promise<TraceReading> {
  if (!trace) return { status: 'needs-answers', uploadPublicId: upload.publicId, description };
  const storedSeries = storedName('series');
  await writeKept(storedSeries, encodeSeries(trace));
  const at = (i: number) => new Date((trace.timeSeconds[i] as number) * 1000);
  const row = await database().models.Trace.create({
    publicId: publicId(),
    memberId: upload.memberId,
    uploadId: upload.id,
    fileName: upload.fileName,
    fileHash: upload.fileHash,
    fileBytes: upload.fileBytes,
    storedFile: upload.storedFile,
    storedSeries,
    kind: trace.kind,
    powerKind: trace.powerKind,
    zone: options.zone,
    description,
    corrections: options.corrections,
    importerVersion: IMPORTER_VERSION,
    samples: trace.timeSeconds.length,
    startsAt: at(0),
    endsAt: at(trace.timeSeconds.length - 1),
    averagingSeconds: trace.averagingSeconds,
    step: trace.step,
    levels: traceLevels(trace),
    createdAt: now(),
  });
  return { status: 'read', uploadPublicId: upload.publicId, tracePublicId: row.publicId, description };
}

async function refuseOverQuota(memberId: number, bytes: number): Promise<void> {
  const recent = await database().models.TraceUpload.sum('fileBytes', {
    where: { memberId, createdAt: { [Op.gt]: secondsFromNow(-86_400) } },
  });
  const left = MOST_BYTES_A_DAY - (recent ?? 0);
  if (bytes > left) {
    const mb = Math.max(0, Math.floor(left / 1e6));
    throw new AppError(
      'quota-reached',
      `You have ${mb} MB of logs left today. Send a smaller file, or go on tomorrow.`,
    );
  }
}

async function hashOf(path: string): Promise<string> {
  const hash = createHash('sha256');
  for await (const chunk of createReadStream(path)) hash.update(chunk as Uint8Array);
  return hash.digest('hex');
}
