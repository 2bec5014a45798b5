import 'server-only';
import path from 'node:path';
import { AppError } from '@/lib/platform/errors';
import { oneAtATime } from '@/lib/platform/jobs/one-at-a-time';
import { runLimited } from '@/lib/platform/jobs/run-limited';
import { log as serverLog } from '@/lib/platform/log';
import { readLogHere, type LogReading, type LogToRead } from './read-log-here';

/** Some 50,000 rows: read here in pieces of a few milliseconds. Starting a process costs more than that. */
const LARGEST_HERE = 2_000_000;
const MOST_MS = 120_000;
/** The columns lie beside this heap; the most rows that the importer takes need some 600 MB with all copies. */
const HEAP = '--max-old-space-size=512';

const takeTurn = oneAtATime(8);

/**
 * Reads a log: a small one here, a large one in a process of its own, so that a million rows hold up nobody's request.
 *
 * @param bytes the log's size.
 * @throws {AppError} bad-input where that process was stopped; unavailable where too many wait.
 */
export function readLog(task: LogToRead, bytes: number): Promise<LogReading> {
  if (bytes <= LARGEST_HERE) return readLogHere(task);
  const program = path.join(process.cwd(), 'lib/reports/commands/read-log-program.ts');
  return takeTurn(async () => {
    try {
      const args = [HEAP, '--conditions=react-server', '--import', 'tsx', program];
      const input = JSON.stringify(task);
      return JSON.parse(await runLimited({ args, input, mostMs: MOST_MS })) as LogReading;
    } catch (error) {
      serverLog().warn({ reason: (error as Error).message }, 'a log could not be read within its limits');
      const message =
        'The file took too long or too much memory to read. Cut it to the days you need and send it again.';
      throw new AppError('bad-input', message, { fields: [{ pointer: '/file', message }] });
    }
  });
}
