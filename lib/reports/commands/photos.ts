import 'server-only';
import { open, readFile } from 'node:fs/promises';
import path from 'node:path';
import { Op } from 'sequelize';
import { now, secondsFromNow } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import { AppError } from '@/lib/platform/errors';
import { publicId, sha256 } from '@/lib/platform/ids';
import { findMetadata } from '@/lib/platform/pictures/find-metadata';
import { inspectPicture } from '@/lib/platform/pictures/inspect';
import { shrinkPicture } from '@/lib/platform/pictures/shrink-picture';
import { dropFile, incomingFolder, keepFile, storedName } from '@/lib/platform/storage/files';
import type { ReceivedUpload } from '@/lib/platform/storage/receive-upload';
import { dropUnnamed } from './drop-unnamed';

/** An evening's measuring has some ten photos. */
const MOST_A_DAY = 100;

export interface AcceptedPhoto {
  publicId: string;
  width: number;
  height: number;
  /** Kinds of metadata that the file carried and the photo doesn't. */
  removedMetadata: string[];
}

/**
 * Writes a received picture anew in two sizes, upright and without metadata, and drops what came.
 * @throws {AppError} unsupported-kind, too-large or quota-reached, saying what to do.
 */
export async function acceptPhoto(memberId: number, upload: ReceivedUpload): Promise<AcceptedPhoto> {
  const folder = await incomingFolder();
  const [large, small] = [path.join(folder, storedName('jpg')), path.join(folder, storedName('jpg'))];
  const kept: string[] = [];
  try {
    await refuseOverQuota(memberId);
    const { originalHash, removedMetadata } = await examine(upload.path);
    const sizes = await shrinkPicture(upload.path, large, small);
    const storedLarge = await keep(large, kept);
    const storedSmall = await keep(small, kept);
    const row = await database().models.Attachment.create({
      publicId: publicId(),
      memberId,
      originalHash,
      storedLarge: storedLarge.name,
      largeHash: storedLarge.hash,
      largeWidth: sizes.large.width,
      largeHeight: sizes.large.height,
      largeBytes: sizes.large.bytes,
      storedSmall: storedSmall.name,
      smallHash: storedSmall.hash,
      smallWidth: sizes.small.width,
      smallHeight: sizes.small.height,
      smallBytes: sizes.small.bytes,
      removedMetadata,
      licence: 'CC-BY-4.0',
      createdAt: now(),
    });
    return { publicId: row.publicId, width: sizes.large.width, height: sizes.large.height, removedMetadata };
  } catch (error) {
    await dropUnnamed(kept);
    throw error;
  } finally {
    for (const file of [upload.path, large, small]) await dropFile(file);
  }
}

/** What is told of a picture before anything is decoded; its bytes are not held while it waits for its turn. */
async function examine(file: string): Promise<{ originalHash: string; removedMetadata: string[] }> {
  const content = await readFile(file);
  inspectPicture(content);
  return { originalHash: sha256(content), removedMetadata: findMetadata(content) };
}

/** Moves a size to where it stays, flushed, and returns its name and hash. */
async function keep(file: string, kept: string[]): Promise<{ name: string; hash: string }> {
  const name = storedName('jpg');
  const hash = sha256(await readFile(file));
  const handle = await open(file, 'r');
  await handle.sync().finally(() => handle.close());
  await keepFile(file, name);
  kept.push(name);
  return { name, hash };
}

async function refuseOverQuota(memberId: number): Promise<void> {
  const today = await database().models.Attachment.count({
    where: { memberId, createdAt: { [Op.gt]: secondsFromNow(-86_400) } },
  });
  if (today >= MOST_A_DAY) {
    throw new AppError('quota-reached', `You have sent ${MOST_A_DAY} photos within a day, the most. Go on tomorrow.`);
  }
}
