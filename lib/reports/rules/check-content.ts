import type { FieldProblem } from '@/lib/platform/errors';
import type { Phase, ReportContent } from '../schema';

/** What a report's content is held against. */
export interface ContentSurroundings {
  now: Date;
  modeCodes: ReadonlySet<string>;
  conditionKeys: ReadonlySet<string>;
  /** Of the content's traces, those that are the member's own. */
  traces: ReadonlyMap<string, TraceSpan>;
}

export interface TraceSpan {
  startsAt: Date;
  endsAt: Date;
  samples: number;
}

/** It is tomorrow already where the day begins first. */
const EARLIEST_ZONE_MS = 14 * 3_600_000;
/** A clock may be fast by so much. */
const FAST_CLOCK_MS = 10 * 60_000;
const A_DAY_MS = 86_400_000;

/** What stands against a content, field by field, beyond what its schema can see. */
export function checkContent(content: ReportContent, around: ContentSurroundings): FieldProblem[] {
  return [
    ...checkDay(content, around.now),
    ...checkConditions(content, around.conditionKeys),
    ...checkTwice(content.traces, '/content/traces', 'This trace stands there twice. Remove one of them.'),
    ...checkTwice(
      content.photos.map((photo) => photo.publicId),
      '/content/photos',
      'This photo stands there twice. Remove one of them.',
    ),
    ...content.traces.flatMap((publicId, i) => checkTrace(publicId, i, around)),
    ...content.phases.flatMap((phase, i) => checkPhase(phase, i, content, around)),
  ];
}

function checkDay({ measuredOn }: ReportContent, now: Date): FieldProblem[] {
  const latest = new Date(now.getTime() + EARLIEST_ZONE_MS).toISOString().slice(0, 10);
  if (measuredOn <= latest) return [];
  return [{ pointer: '/content/measuredOn', message: 'This day is still to come. Give the day on which you began.' }];
}

function checkConditions({ conditions }: ReportContent, known: ReadonlySet<string>): FieldProblem[] {
  return Object.keys(conditions)
    .filter((key) => !known.has(key))
    .map((key) => ({
      pointer: `/content/conditions/${key.replaceAll('~', '~0').replaceAll('/', '~1')}`,
      message: 'This category doesn’t ask for that. Write it into the notes.',
    }));
}

function checkTwice(ids: readonly string[], pointer: string, message: string): FieldProblem[] {
  return ids.flatMap((id, i) => (ids.indexOf(id) < i ? [{ pointer: `${pointer}/${i}`, message }] : []));
}

function checkTrace(publicId: string, i: number, { traces, now }: ContentSurroundings): FieldProblem[] {
  const trace = traces.get(publicId);
  const pointer = `/content/traces/${i}`;
  if (!trace) return [{ pointer, message: 'This trace is not there any more. Send its file again.' }];
  if (trace.endsAt.getTime() <= now.getTime() + A_DAY_MS) return [];
  return [{ pointer, message: 'This trace ends in the future. Set its start or its time zone right.' }];
}

function checkPhase(
  phase: Phase,
  i: number,
  content: ReportContent,
  { modeCodes, traces, now }: ContentSurroundings,
): FieldProblem[] {
  const problems: FieldProblem[] = [];
  const problem = (field: string, message: string) =>
    problems.push({ pointer: `/content/phases/${i}/${field}`, message });
  if (!modeCodes.has(phase.modeCode)) problem('modeCode', 'Choose one of the category’s operating modes.');
  if (phase.source === 'typed') {
    const ends = phase.startsAt === null ? null : Date.parse(phase.startsAt) + phase.durationSeconds * 1000;
    if (ends !== null && ends > now.getTime() + FAST_CLOCK_MS) {
      problem('startsAt', 'This phase ends in the future. Check its start and how long it lasted.');
    }
    return problems;
  }
  const trace = content.traces.includes(phase.tracePublicId) ? traces.get(phase.tracePublicId) : undefined;
  if (!trace) problem('tracePublicId', 'This phase’s trace is not among the report’s. Import it again.');
  else if (liesOutside(phase, trace)) problem('fromSeconds', 'This phase reaches beyond its trace. Move its edges.');
  const overlapped = content.phases.findIndex((other, k) => k < i && overlaps(other, phase));
  if (overlapped >= 0) {
    problem('fromSeconds', `This phase overlaps phase ${overlapped + 1} of the same mode. Move one of the edges.`);
  }
  return problems;
}

type TracedPhase = Extract<Phase, { source: 'trace' }>;

/** Edges are set by hand and by clock, so a few readings more than there are do no harm. */
function liesOutside({ fromSeconds, toSeconds }: TracedPhase, { startsAt, endsAt, samples }: TraceSpan): boolean {
  const [start, end] = [startsAt.getTime() / 1000, endsAt.getTime() / 1000];
  const slack = Math.max(120, (3 * (end - start)) / Math.max(1, samples - 1));
  return fromSeconds < start - slack || toSeconds > end + slack;
}

/** Of one mode and one trace: what lies in both would count twice. */
function overlaps(other: Phase, phase: TracedPhase): boolean {
  if (other.source !== 'trace' || other.modeCode !== phase.modeCode) return false;
  if (other.tracePublicId !== phase.tracePublicId) return false;
  return other.toSeconds > phase.fromSeconds && phase.toSeconds > other.fromSeconds;
}
