import 'server-only';
import path from 'node:path';
import { AppError } from '../errors';
import { oneAtATime } from '../jobs/one-at-a-time';
import { runLimited } from '../jobs/run-limited';
import { log } from '../log';

export interface ShrunkSize {
  width: number;
  height: number;
  bytes: number;
}

export interface ShrunkSizes {
  large: ShrunkSize;
  small: ShrunkSize;
}

/** 24 megapixels take some 900 MB and ten seconds on a small machine. */
const MOST_ADDRESS_KB = 2_000_000;
const MOST_MS = 60_000;

const takeTurn = oneAtATime(12);

/**
 * Two sizes of a picture, made in a process of its own, one picture at a time.
 *
 * @param input, large, small paths: what is read, and where the two sizes go.
 * @throws {AppError} unsupported-kind where the picture can't be decoded within the limits; unavailable where too many
 * wait.
 */
export function shrinkPicture(input: string, large: string, small: string): Promise<ShrunkSizes> {
  const worker = path.join(process.cwd(), 'lib/platform/pictures/shrink-worker.mjs');
  return takeTurn(async () => {
    try {
      const args = [worker, input, large, small];
      return JSON.parse(await runLimited({ args, mostAddressKb: MOST_ADDRESS_KB, mostMs: MOST_MS })) as ShrunkSizes;
    } catch (error) {
      log().warn({ reason: (error as Error).message }, 'a picture could not be decoded');
      const message =
        'The picture can’t be decoded; it may be cut off or too large. Save it again as JPEG and choose that file.';
      throw new AppError('unsupported-kind', message);
    }
  });
}
