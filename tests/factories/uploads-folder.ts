import { readdir, readlink, rm } from 'node:fs/promises';
import path from 'node:path';
import { env } from '@/lib/platform/env';

/** What lies in a folder of the uploads. */
export async function filesIn(folder: 'incoming' | 'kept' | 'lost-and-found'): Promise<string[]> {
  return readdir(path.join(env().uploadsDirectory, folder)).catch(() => []);
}

/** The uploads that this process holds open. */
export async function openUploads(): Promise<string[]> {
  const descriptors = await readdir('/proc/self/fd');
  const targets = await Promise.all(descriptors.map((fd) => readlink(`/proc/self/fd/${fd}`).catch(() => '')));
  return targets.filter((target) => target.startsWith(env().uploadsDirectory));
}

/** Takes everything out of the test's own folder. */
export async function emptyUploads(): Promise<void> {
  await rm(env().uploadsDirectory, { recursive: true, force: true });
}
