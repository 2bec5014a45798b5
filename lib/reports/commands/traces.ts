import 'server-only';
import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import path from 'node:path';
import { Op } from 'sequelize';
import { IMPORTER_VERSION, type TraceCorrections, type TraceDescription } from '@/lib/measurement/traces/import/types';
import { now, secondsFromNow } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import { AppError, notFound } from '@/lib/platform/errors';
import { publicId } from '@/lib/platform/ids';
import { dropFile, incomingFolder, keepFile, keptPath, storedName } from '@/lib/platform/storage/files';
import type { ReceivedUpload } from '@/lib/platform/storage/receive-upload';
import type { TraceUpload } from '@/models/trace-upload';
import { canonicalJson } from '../rules/canonical-json';
import { dropOldReadings } from './drop-old-readings';
import { dropUnnamed } from './drop-unnamed';
import { readLog } from './read-log';
import type { LogReading } from './read-log-here';

/** A day's worth of the largest ordinary files; more at once is no evening's measuring. */
export const MOST_LOG_BYTES_A_DAY = 600_000_000;

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
  const series = await seriesPath();
  const storedFile = storedName('log');
  try {
    await refuseOverQuota(memberId, upload.bytes);
    const fileHash = await hashOf(upload.path);
    const reading = await readOrRefuse(upload.path, upload.bytes, series, options);
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
    return await keepReading(row, reading, series, options);
  } catch (error) {
    await dropUnnamed([storedFile]);
    throw error;
  } finally {
    await dropFile(upload.path);
    await dropFile(series);
  }
}

/**
 * Reads a kept file again with what the member set right: another trace, since a trace never changes. The same
 * corrections again are the same trace.
 */
export async function readAgain(
  memberId: number,
  uploadPublicId: string,
  options: ReadingOptions,
): Promise<TraceReading> {
  const { Trace, TraceUpload } = database().models;
  const row = await TraceUpload.findOne({ where: { publicId: uploadPublicId, memberId } });
  if (!row) throw notFound('file');
  const before = await Trace.findAll({
    where: { uploadId: row.id, zone: options.zone, importerVersion: IMPORTER_VERSION },
  });
  const same = before.find((trace) => canonicalJson(trace.corrections) === canonicalJson(options.corrections));
  if (same) {
    const description = same.description as TraceDescription;
    return { status: 'read', uploadPublicId: row.publicId, tracePublicId: same.publicId, description };
  }
  const series = await seriesPath();
  try {
    const reading = await readOrRefuse(keptPath(row.storedFile), row.fileBytes, series, options);
    return await keepReading(row, reading, series, options);
  } finally {
    await dropFile(series);
  }
}

async function seriesPath(): Promise<string> {
  return path.join(await incomingFolder(), storedName('series'));
}

async function readOrRefuse(
  log: string,
  bytes: number,
  series: string,
  options: ReadingOptions,
): Promise<Exclude<LogReading, { status: 'unreadable' }>> {
  const reading = await readLog({ log, series, ...options }, bytes);
  if (reading.status !== 'unreadable') return reading;
  const { code, message, line } = reading.problem;
  throw new AppError('bad-input', message, {
    fields: [{ pointer: '/file', message }],
    facts: { problem: code, line },
  });
}

async function keepReading(
  upload: TraceUpload,
  reading: Exclude<LogReading, { status: 'unreadable' }>,
  series: string,
  options: ReadingOptions,
): Promise<TraceReading> {
  const { description } = reading;
  if (reading.status !== 'read') return { status: 'needs-answers', uploadPublicId: upload.publicId, description };
  const { startsAtSeconds, endsAtSeconds, ...summary } = reading.summary;
  const storedSeries = storedName('series');
  await keepFile(series, storedSeries);
  const row = await database()
    .models.Trace.create({
      ...summary,
      publicId: publicId(),
      memberId: upload.memberId,
      uploadId: upload.id,
      fileName: upload.fileName,
      fileHash: upload.fileHash,
      fileBytes: upload.fileBytes,
      storedFile: upload.storedFile,
      storedSeries,
      zone: options.zone,
      description,
      corrections: options.corrections,
      importerVersion: IMPORTER_VERSION,
      startsAt: new Date(startsAtSeconds * 1000),
      endsAt: new Date(endsAtSeconds * 1000),
      createdAt: now(),
    })
    .catch(async (error: unknown) => {
      await dropUnnamed([storedSeries]);
      throw error;
    });
  await dropOldReadings(upload.id);
  return { status: 'read', uploadPublicId: upload.publicId, tracePublicId: row.publicId, description };
}

async function refuseOverQuota(memberId: number, bytes: number): Promise<void> {
  const recent = await database().models.TraceUpload.sum('fileBytes', {
    where: { memberId, createdAt: { [Op.gt]: secondsFromNow(-86_400) } },
  });
  const left = MOST_LOG_BYTES_A_DAY - (recent ?? 0);
  if (bytes > left) {
    const mb = Math.max(0, Math.floor(left / 1e6));
    const message = `Of the 600 MB of logs that a member may send within a day, ${mb} MB are left to you. Send a smaller file, or go on tomorrow.`;
    throw new AppError('quota-reached', message, { facts: { bytesLeft: Math.max(0, left) } });
  }
}

async function hashOf(file: string): Promise<string> {
  const hash = createHash('sha256');
  for await (const chunk of createReadStream(file)) hash.update(chunk as Uint8Array);
  return hash.digest('hex');
}
