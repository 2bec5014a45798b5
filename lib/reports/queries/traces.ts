import 'server-only';
import { readFile } from 'node:fs/promises';
import { QueryTypes } from 'sequelize';
import type { Actor } from '@/lib/auth/schema';
import type { TraceDescription } from '@/lib/measurement/traces/import/types';
import type { TraceLevel } from '@/lib/measurement/traces/levels';
import type { Trace } from '@/lib/measurement/traces/trace';
import { database } from '@/lib/platform/database/connection';
import { notFound } from '@/lib/platform/errors';
import { keptPath } from '@/lib/platform/storage/files';
import type { Trace as TraceRow } from '@/models/trace';
import { decodeSeries } from '../rules/trace-series';
import { maySeeEvidence, type EvidenceStanding } from '../policy';

/** What is shown of a trace without its readings. */
export interface TraceSummary {
  publicId: string;
  fileName: string;
  kind: Trace['kind'];
  powerKind: Trace['powerKind'];
  samples: number;
  startsAt: string;
  endsAt: string;
  averagingSeconds: number | null;
  levels: TraceLevel[];
}

/**
 * A trace that this reader may see: its member's own, a submitted report's for moderators, a published report's for all.
 * @throws {AppError} not-found otherwise, whether or not it exists.
 */
export async function visibleTrace(
  actor: Actor | null,
  publicId: string,
): Promise<TraceRow & { isPublished: boolean }> {
  const row = await database().models.Trace.findOne({ where: { publicId } });
  if (!row) throw notFound('trace');
  const standing = await standingOf('report_revision_trace', 'trace_id', row.id);
  if (!maySeeEvidence(actor, { memberId: row.memberId, ...standing })) throw notFound('trace');
  return Object.assign(row, { isPublished: standing.isPublished });
}

/** Whether a trace or a photo stands in a revision that is published, or waiting for review. */
export async function standingOf(
  table: 'report_revision_trace' | 'report_revision_attachment',
  column: 'trace_id' | 'attachment_id',
  id: number,
): Promise<Omit<EvidenceStanding, 'memberId'>> {
  const [row] = await database().sequelize.query<Omit<EvidenceStanding, 'memberId'>>(
    `select coalesce(bool_or(r.published_revision_id = v.id and r.state not in ('withdrawn', 'lapsed')), false)
              as "isPublished",
            coalesce(bool_or(r.state <> 'draft'), false) as "isSubmitted"
     from ${table} l
     join report_revision v on v.id = l.report_revision_id
     join report r on r.id = v.report_id
     where l.${column} = $1`,
    { bind: [id], type: QueryTypes.SELECT },
  );
  return row ?? { isPublished: false, isSubmitted: false };
}

/** Whoever looks through a trace asks for one window after the other; a series never changes, so a few are kept. */
const recent = new Map<string, Trace>();
const MOST_RECENT = 4;

/** A trace's readings, from its column file. */
export async function readSeries(
  row: Pick<TraceRow, 'storedSeries' | 'kind' | 'powerKind' | 'averagingSeconds' | 'step' | 'description'>,
): Promise<Trace> {
  const name = row.storedSeries;
  const trace =
    recent.get(name) ??
    decodeSeries(await readFile(keptPath(name)), {
      kind: row.kind,
      powerKind: row.powerKind,
      averagingSeconds: row.averagingSeconds,
      stamp: (row.description as TraceDescription).stamp,
      step: row.step,
    });
  recent.delete(name);
  recent.set(name, trace);
  for (const oldest of recent.keys()) if (recent.size > MOST_RECENT) recent.delete(oldest);
  return trace;
}

export function summariseTrace(row: TraceRow, withName: boolean): TraceSummary {
  return {
    publicId: row.publicId,
    fileName: withName ? row.fileName : `trace-${row.publicId}.csv`,
    kind: row.kind,
    powerKind: row.powerKind,
    samples: row.samples,
    startsAt: row.startsAt.toISOString(),
    endsAt: row.endsAt.toISOString(),
    averagingSeconds: row.averagingSeconds,
    levels: row.levels as TraceLevel[],
  };
}
