import 'server-only';
import { createReadStream } from 'node:fs';
import { open } from 'node:fs/promises';
import { importTrace } from '@/lib/measurement/traces/import/import-trace';
import type { TraceCorrections, TraceDescription, TraceProblemCode } from '@/lib/measurement/traces/import/types';
import { traceLevels, type TraceLevel } from '@/lib/measurement/traces/levels';
import type { Trace } from '@/lib/measurement/traces/trace';
import { encodeSeries } from '../rules/trace-series';

export interface LogToRead {
  /** The file as it came. */
  log: string;
  /** Where its series is to be written. */
  series: string;
  /** The IANA zone of local times. */
  zone: string;
  corrections: TraceCorrections;
}

/** What a row keeps of a trace; its readings stand in the series' file. */
export interface SeriesSummary {
  kind: Trace['kind'];
  powerKind: Trace['powerKind'];
  averagingSeconds: number | null;
  step: number;
  samples: number;
  startsAtSeconds: number;
  endsAtSeconds: number;
  levels: TraceLevel[];
}

export type LogReading =
  | { status: 'read'; description: TraceDescription; summary: SeriesSummary }
  | { status: 'needs-answers'; description: TraceDescription }
  | { status: 'unreadable'; problem: { code: TraceProblemCode; message: string; line: number | null } };

/** Reads a log in this process and writes its series, flushed. */
export async function readLogHere({ log, series, zone, corrections }: LogToRead): Promise<LogReading> {
  const found = await importTrace(createReadStream(log, { highWaterMark: 64 * 1024 }), { zone, corrections });
  if (!found.ok) {
    if (found.problem) return { status: 'unreadable', problem: found.problem };
    return { status: 'needs-answers', description: found.description };
  }
  const { trace, description } = found;
  const file = await open(series, 'wx', 0o600);
  try {
    await file.writeFile(encodeSeries(trace));
    await file.sync();
  } finally {
    await file.close();
  }
  return { status: 'read', description, summary: summarise(trace) };
}

function summarise(trace: Trace): SeriesSummary {
  const { kind, powerKind, averagingSeconds, step, timeSeconds } = trace;
  return {
    kind,
    powerKind,
    averagingSeconds,
    step,
    samples: timeSeconds.length,
    startsAtSeconds: timeSeconds[0] as number,
    endsAtSeconds: timeSeconds[timeSeconds.length - 1] as number,
    levels: traceLevels(trace),
  };
}
