import type { ColumnPlan } from './columns';
import { GrowableColumn } from './growable';
import type { Layout } from './layout';
import type { TextLine } from './lines';
import { isMissing, readNumber } from './read-number';
import { readClock, readTime, type ReadTime } from './read-time';
import { splitRow } from './split-row';
import { TraceProblem, type TraceCorrections, type TraceDescription, type ValueUnit } from './types';

/** What a unit is worth in W, VA or Wh. Amperes are multiplied by their voltage besides. */
export const UNIT_FACTOR: Record<ValueUnit, number> = {
  mW: 0.001,
  W: 1,
  kW: 1000,
  VA: 1,
  kVA: 1000,
  Wh: 1,
  kWh: 1000,
  A: 1,
};

const MOST_NAMED = 20;
const FIRST_ROWS = 8;
/** Three months at a reading a second. */
const MOST_ROWS = 8_000_000;
/** No reading in W or Wh is larger, and sums of larger ones would leave the range of numbers. */
const LARGEST_READING = 1e12;
/** 1970 to 2100, in seconds: a time outside is a column that is none. */
const LATEST_SECONDS = 4_102_444_800;

/** Collects the readings of a file row by row; nothing is kept of a row but its two numbers. */
export class RowReader {
  readonly seconds = new GrowableColumn();
  readonly values = new GrowableColumn();
  readonly firstRows: TraceDescription['firstRows'] = [];
  readonly unreadable: TraceDescription['unreadable'] = { count: 0, lines: [] };
  readonly missing = { count: 0, codes: new Set<string>() };
  rows = 0;
  timeKind: ReadTime['kind'] = 'utc';
  private clockDays = 0;
  private lastClock = -1;
  private readonly factor: number;

  constructor(
    private readonly layout: Layout,
    private readonly plan: ColumnPlan,
    private readonly corrections: TraceCorrections,
  ) {
    const volts = plan.unit === 'A' ? (corrections.volts ?? 1) : 1;
    this.factor = UNIT_FACTOR[plan.unit] * volts * (corrections.turnSign ? -1 : 1);
  }

  read(line: TextLine): void {
    if (line.number < this.layout.dataFrom || line.text.trim() === '') return;
    const cells = splitRow(line.text, this.layout.delimiter);
    this.rows += 1;
    if (this.rows > MOST_ROWS) throw tooManyRows();
    const time = this.readTime(cells);
    const cell = cells[this.plan.valueColumn] ?? '';
    const value = readNumber(cell, this.layout.decimalMark);
    if (this.firstRows.length < FIRST_ROWS) this.remember(line.number, cells, time, value);
    if (time === null)
      return this.refuse(line.number, cells.join(' ').trim() === '' ? 'an empty row' : 'its time can’t be read');
    if (time.seconds < 0 || time.seconds > LATEST_SECONDS) {
      return this.refuse(line.number, 'its time lies outside 1970 to 2100');
    }
    if (value !== null && Math.abs(value * this.factor) > LARGEST_READING) {
      return this.refuse(line.number, `“${cell.slice(0, 30)}” is too large to be a reading`);
    }
    if (value === null || !Number.isFinite(value)) {
      if (!isMissing(cell)) return this.refuse(line.number, `“${cell.slice(0, 30)}” is no number`);
      this.missing.count += 1;
      this.missing.codes.add(cell.trim() === '' ? '(empty)' : cell.trim());
      return;
    }
    this.timeKind = time.kind;
    this.seconds.push(time.seconds);
    this.values.push(value * this.factor);
  }

  private readTime(cells: readonly string[]): ReadTime | null {
    const { timeColumn, dateColumn, timeFormat } = this.plan;
    if (timeColumn === null)
      return { seconds: (this.rows - 1) * (this.corrections.stepSeconds ?? 1), kind: 'relative' };
    const cell = cells[timeColumn] ?? '';
    if (dateColumn !== null) {
      const date = readTime(cells[dateColumn] ?? '', timeFormat);
      const clock = readClock(cell);
      return date === null || clock === null ? null : { seconds: date.seconds + clock, kind: date.kind };
    }
    const time = readTime(cell, timeFormat);
    if (time === null || timeFormat !== 'clock') return time;
    // A clock that falls by hours has passed midnight.
    if (this.lastClock - time.seconds > 12 * 3600) this.clockDays += 1;
    this.lastClock = time.seconds;
    return { ...time, seconds: time.seconds + this.clockDays * 86_400 };
  }

  private remember(line: number, cells: string[], time: ReadTime | null, value: number | null): void {
    this.firstRows.push({
      line,
      cells: cells.slice(0, 20).map((cell) => cell.slice(0, 60)),
      time: time === null ? null : describeTime(time),
      value: value === null ? null : value * this.factor,
    });
  }

  private refuse(line: number, reason: string): void {
    this.unreadable.count += 1;
    if (this.unreadable.lines.length < MOST_NAMED) this.unreadable.lines.push({ line, reason });
  }
}

/** A time as it was read, before its zone: what the member compares with the file. */
function describeTime({ seconds, kind }: ReadTime): string {
  if (kind === 'relative') return `${seconds} s`;
  if (!(seconds >= 0 && seconds <= LATEST_SECONDS)) return 'outside 1970 to 2100';
  return new Date(seconds * 1000)
    .toISOString()
    .replace('T', ' ')
    .replace(/\.?0*Z$/, kind === 'utc' ? ' UTC' : '');
}

function tooManyRows(): TraceProblem {
  const most = (MOST_ROWS / 1e6).toFixed(0);
  return new TraceProblem(
    'too-large',
    `The file has more than ${most} million rows. Cut it to the days you need, or log at longer steps.`,
  );
}
