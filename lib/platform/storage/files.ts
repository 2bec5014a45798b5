import 'server-only';
import { createReadStream } from 'node:fs';
import { mkdir, open, readdir, rename, rm, stat } from 'node:fs/promises';
import path from 'node:path';
import { Readable } from 'node:stream';
import { secretToken } from '../ids';
import { env } from '../env';

/** Files are received here and moved to where they stay; both lie on one file system, so that a move is one step. */
const folders = () => ({
  incoming: path.join(env().uploadsDirectory, 'incoming'),
  kept: path.join(env().uploadsDirectory, 'kept'),
  lost: path.join(env().uploadsDirectory, 'lost-and-found'),
});

/** The folder for what is being received; made when it is missing. */
export async function incomingFolder(): Promise<string> {
  const { incoming, kept } = folders();
  await mkdir(incoming, { recursive: true });
  await mkdir(kept, { recursive: true });
  return incoming;
}

/** A name of our own: nothing of what a member called the file reaches the disk. */
export function storedName(ending: string): string {
  return `${secretToken()}.${ending}`;
}

/** Where a kept file lies. Names are ours, so one that isn't shaped like ours is nobody's. */
export function keptPath(name: string): string {
  if (!/^[\w-]{43}\.[a-z0-9]{1,8}$/.test(name)) throw new Error('A stored name has another shape.');
  return path.join(folders().kept, name);
}

/**
 * Moves a received file to where it stays, durably: the file was flushed when it was written, and the folder is flushed
 * here. To be done before the commit that names it.
 */
export async function keepFile(incomingPath: string, name: string): Promise<void> {
  await rename(incomingPath, keptPath(name));
  await flushFolder(folders().kept);
}

/** Writes bytes of our own making to where they stay, durably. */
export async function writeKept(name: string, content: Uint8Array): Promise<void> {
  const incoming = path.join(await incomingFolder(), name);
  const file = await open(incoming, 'wx', 0o600);
  try {
    await file.writeFile(content);
    await file.sync();
  } finally {
    await file.close();
  }
  await keepFile(incoming, name);
}

export async function dropFile(anyPath: string): Promise<void> {
  await rm(anyPath, { force: true });
}

/** Takes back a kept file that no row came to name. */
export async function dropKept(name: string): Promise<void> {
  await dropFile(keptPath(name));
}

/** A kept file as a web stream with its size. */
export async function openKept(name: string): Promise<{ stream: ReadableStream; bytes: number }> {
  const { size } = await stat(keptPath(name));
  return { stream: Readable.toWeb(createReadStream(keptPath(name))) as ReadableStream, bytes: size };
}

/**
 * Clears what a kill left behind, before anything is served: what was being received is dropped, and a kept file that
 * no row names is moved aside, where it can be looked at.
 *
 * @param isNamed which of these stored names a row holds.
 */
export async function sweepFiles(isNamed: (names: string[]) => Promise<Set<string>>): Promise<{ moved: number }> {
  const { incoming, kept, lost } = folders();
  await incomingFolder();
  for (const name of await readdir(incoming)) await dropFile(path.join(incoming, name));
  const names = await readdir(kept);
  const known = await isNamed(names);
  const strays = names.filter((name) => !known.has(name));
  if (strays.length > 0) await mkdir(lost, { recursive: true });
  for (const name of strays) await rename(path.join(kept, name), path.join(lost, name));
  return { moved: strays.length };
}

async function flushFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}
