import type { Trace } from '../trace';
import { planColumns, type ColumnPlan } from './columns';
import { joinCounter } from './join-counter';
import { findLayout, type Layout } from './layout';
import { readLines, type TextLine } from './lines';
import { loggerStep } from './logger-step';
import { orderReadings, type OrderedReadings } from './order-readings';
import { RowReader } from './read-rows';
import { findKind } from './trace-kind';
import { TraceProblem, type TraceCorrections, type TraceDescription, type TraceImport } from './types';

const HEAD_LINES = 400;
const MOST_BYTES = 512_000_000;
const MOST_UNREADABLE = 0.01;

export interface ImportOptions {
  /** The IANA zone of local times. */
  zone: string;
  corrections?: TraceCorrections;
  mostBytes?: number;
}

/**
 * Reads a logger's file as it streams in. What was understood is described in full, so that it can be shown and set
 * right; readings themselves are never changed. Memory holds two columns of numbers and a few hundred lines.
 *
 * @returns the trace; or a description with questions that must be answered first; or the problem, with its line.
 * @example await importTrace(lines of "time,power_W", { zone: 'UTC' }) // { ok: true, trace, description }
 */
export async function importTrace(source: AsyncIterable<Uint8Array>, options: ImportOptions): Promise<TraceImport> {
  try {
    return await readTrace(source, options.corrections ?? {}, options);
  } catch (error) {
    if (!(error instanceof TraceProblem)) throw error;
    const { code, message, line } = error;
    return { ok: false, description: null, problem: { code, message, line } };
  }
}

async function readTrace(
  source: AsyncIterable<Uint8Array>,
  corrections: TraceCorrections,
  options: ImportOptions,
): Promise<TraceImport> {
  let encoding = 'utf-8';
  const head: TextLine[] = [];
  let layout: Layout | null = null;
  let plan: ColumnPlan | null = null;
  let reader: RowReader | null = null;
  const begin = () => {
    layout = findLayout(head, corrections);
    plan = planColumns(layout, corrections);
    reader = new RowReader(layout, plan, corrections);
    for (const line of head) reader.read(line);
  };
  for await (const lines of readLines(source, (name) => (encoding = name), options.mostBytes ?? MOST_BYTES)) {
    for (const line of lines) {
      if (reader) (reader as RowReader).read(line);
      else if (head.push(line) >= HEAD_LINES) begin();
    }
  }
  if (!reader) begin();
  return assemble(
    {
      encoding,
      head,
      layout: layout as unknown as Layout,
      plan: plan as unknown as ColumnPlan,
      reader: reader as unknown as RowReader,
    },
    corrections,
    options.zone,
  );
}

interface Parts {
  encoding: string;
  head: TextLine[];
  layout: Layout;
  plan: ColumnPlan;
  reader: RowReader;
}

function assemble(parts: Parts, corrections: TraceCorrections, zone: string): TraceImport {
  const { reader, plan } = parts;
  refuseUnreadable(reader);
  if (reader.seconds.length < 2) {
    throw new TraceProblem(
      'too-few-readings',
      'The file holds fewer than two readings. Export the log again, from start to end.',
    );
  }
  const ordered = orderReadings(
    withStart(reader, plan, corrections),
    reader.values.values(),
    reader.timeKind === 'local' ? zone : null,
  );
  const segment = ordered.segments[corrections.segment ?? 0];
  if (!segment) throw new TraceProblem('correction', 'The file has no such part. Choose one from the list.');
  const seconds = ordered.seconds.slice(segment.first, segment.end);
  const raw = dropRepeatedMinusOne(seconds, ordered.values.slice(segment.first, segment.end), corrections, reader);
  if (raw.values.length < 2)
    throw new TraceProblem('too-few-readings', 'Fewer than two readings are left. Choose another part of the file.');
  return describe(parts, corrections, zone, ordered, raw);
}

/** Clock times, elapsed seconds and values alone count from a start that only the member knows. */
function withStart(reader: RowReader, plan: ColumnPlan, corrections: TraceCorrections): Float64Array {
  const seconds = reader.seconds.values();
  if (reader.timeKind !== 'relative') return seconds;
  if (corrections.startsAt === undefined) {
    plan.questions.push({
      key: 'startsAt',
      message: 'The file counts from its start, or has no date. When was its first row written?',
      choices: [],
    });
    return seconds;
  }
  const start = Date.parse(corrections.startsAt) / 1000;
  if (!Number.isFinite(start)) throw new TraceProblem('correction', 'The start can’t be read. Give a date and a time.');
  const first = seconds[0] as number;
  return seconds.map((value) => value - first + start);
}

function refuseUnreadable({ unreadable, rows }: RowReader): void {
  if (unreadable.count <= MOST_UNREADABLE * rows) return;
  const [first] = unreadable.lines;
  throw new TraceProblem(
    'unreadable-rows',
    `${unreadable.count} of ${rows} rows can’t be read, the first in line ${first?.line ?? 1}: ${first?.reason ?? ''}. Lines: ${unreadable.lines.map(({ line }) => line).join(', ')}. Set delimiter, time and power column right, or take these lines out.`,
    first?.line ?? null,
  );
}

/** Some loggers write −1 where they read nothing: it keeps repeating while nothing else is negative. */
function dropRepeatedMinusOne(
  seconds: Float64Array,
  values: Float64Array,
  corrections: TraceCorrections,
  reader: RowReader,
): { seconds: Float64Array; values: Float64Array } {
  let minusOnes = 0;
  let otherNegatives = 0;
  for (const value of values) {
    if (value === -1) minusOnes += 1;
    else if (value < 0) otherNegatives += 1;
  }
  if (minusOnes < 3 || otherNegatives > 0) return { seconds, values };
  reader.missing.codes.add('-1');
  if (corrections.leaveOutMissing === false) return { seconds, values };
  reader.missing.count += minusOnes;
  const kept = (column: Float64Array) => column.filter((_, i) => values[i] !== -1);
  return { seconds: kept(seconds), values: kept(values) };
}

function describe(
  { encoding, head, layout, plan, reader }: Parts,
  corrections: TraceCorrections,
  zone: string,
  ordered: OrderedReadings,
  raw: { seconds: Float64Array; values: Float64Array },
): TraceImport {
  const column = plan.columns[plan.valueColumn];
  const role = plan.unit === 'Wh' || plan.unit === 'kWh' ? 'energy' : (column?.role ?? 'other');
  const words = head
    .filter((line) => line.number < layout.dataFrom)
    .map((line) => line.text)
    .join(' ');
  const found = findKind(raw.seconds, raw.values, role, words);
  const kind = corrections.kind ?? found.kind;
  const joined = kind === 'counter' ? joinCounter(raw.values) : { values: raw.values, resets: 0 };
  const values =
    found.energyOfInterval && kind === 'averages' ? toMeanPower(raw.seconds, joined.values) : joined.values;
  const averagingSeconds =
    kind === 'averages' ? (corrections.averagingSeconds ?? found.averagingSeconds ?? null) : null;
  const negative = values.reduce((count, value) => count + (value < 0 ? 1 : 0), 0) / values.length;
  if (plan.unit === 'A' && corrections.volts === undefined) {
    plan.questions.push({
      key: 'volts',
      message: 'The readings are amperes. Which voltage do they belong to?',
      choices: [],
    });
  }
  if (ordered.segments.length > 1 && corrections.segment === undefined) {
    plan.questions.push({
      key: 'segment',
      message: 'The times step back, so the file holds several recordings. Which one is it?',
      choices: ordered.segments.map(({ first, end }, i) => ({
        value: i,
        label: `${iso(ordered.seconds[first] as number)} to ${iso(ordered.seconds[end - 1] as number)}, ${end - first} readings`,
      })),
    });
  }
  const description: TraceDescription = {
    encoding,
    delimiter: layout.delimiter,
    decimalMark: layout.decimalMark,
    headerLine: layout.headerLine,
    columns: plan.columns,
    time: {
      format: plan.timeFormat,
      zone: reader.timeKind === 'local' ? zone : 'UTC',
      timeColumn: plan.timeColumn,
      dateColumn: plan.dateColumn,
    },
    value: { column: plan.valueColumn, name: column?.name ?? '', unit: plan.unit, unitStated: plan.unitStated },
    kind,
    kindReason: corrections.kind === undefined ? found.reason : 'you said so',
    averagingSeconds,
    stamp: corrections.stamp ?? 'end',
    firstRows: reader.firstRows,
    rows: reader.rows,
    readings: values.length,
    unreadable: reader.unreadable,
    missing: { count: reader.missing.count, codes: [...reader.missing.codes] },
    averagedDuplicates: ordered.averagedDuplicates,
    sortedRows: ordered.sortedRows,
    newestFirst: ordered.newestFirst,
    resets: joined.resets,
    shareNegative: negative,
    segments: ordered.segments.map(({ first, end }) => ({
      from: iso(ordered.seconds[first] as number),
      to: iso(ordered.seconds[end - 1] as number),
      readings: end - first,
    })),
    step: loggerStep(raw.values),
    warnings: [],
    questions: plan.questions,
  };
  description.warnings = warningsOf(description);
  if (plan.questions.length > 0) return { ok: false, description, problem: null };
  const trace: Trace = {
    kind,
    timeSeconds: raw.seconds,
    values,
    powerKind: plan.unit === 'VA' || plan.unit === 'kVA' || plan.unit === 'A' ? 'apparent' : 'real',
    averagingSeconds,
    stamp: description.stamp,
    step: description.step,
  };
  return { ok: true, description, trace };
}

function warningsOf(description: TraceDescription): TraceDescription['warnings'] {
  const warnings: TraceDescription['warnings'] = [];
  const warn = (message: string, line: number | null = null) => warnings.push({ line, message });
  if (!description.value.unitStated)
    warn('The file names no unit; the readings are taken as watts. Check the first rows.');
  for (const { line, reason } of description.unreadable.lines) warn(`Left out: ${reason}.`, line);
  if (description.missing.count > 0) {
    warn(
      `${description.missing.count} rows hold a code for “no reading” (${description.missing.codes.join(', ')}) and were left out.`,
    );
  }
  if (description.averagedDuplicates > 0)
    warn(
      `${description.averagedDuplicates} readings stand at a time of another one; each time’s readings were averaged.`,
    );
  if (description.sortedRows > 0) warn(`${description.sortedRows} rows were out of order and were sorted in.`);
  if (description.newestFirst) warn('The file begins with its newest row and was turned.');
  if (description.resets > 0) warn(`The counter fell ${description.resets} times; each fall is taken as a reset.`);
  if (description.shareNegative > 0) {
    const share = Math.max(1, Math.round(description.shareNegative * 100));
    warn(`${share} % of the readings are negative. If the clamp or shunt was the wrong way round, turn the sign.`);
  }
  return warnings;
}

/** The energy of each interval over its length; the first interval is as long as the second. */
function toMeanPower(seconds: Float64Array, wattHours: Float64Array): Float64Array {
  return wattHours.map((energy, i) => {
    const from = i === 0 ? 1 : i;
    return (energy * 3600) / ((seconds[from] as number) - (seconds[from - 1] as number));
  });
}

const iso = (seconds: number) => new Date(seconds * 1000).toISOString();
