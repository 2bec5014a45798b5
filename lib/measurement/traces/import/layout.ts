import { isMissing, readNumber } from './read-number';
import { splitRow } from './split-row';
import { dateParts, readClock, readTime } from './read-time';
import type { TextLine } from './lines';
import { TraceProblem, type TimeFormat, type TraceCorrections } from './types';

/** How a file is laid out: found from its first lines, before any reading counts. */
export interface Layout {
  delimiter: string;
  decimalMark: '.' | ',';
  headerLine: number | null;
  header: string[];
  /** A row of units below the header, or the header's own words. */
  units: string[];
  /** The first line of data. */
  dataFrom: number;
  /** Cells of the first rows of data. */
  sample: { line: number; cells: string[] }[];
}

const DELIMITERS = [';', '\t', ',', '|'];
const MOST_COLUMNS = 500;

/**
 * Finds delimiter, decimal mark, header and where the data begin.
 *
 * @param head the first lines of the file, some hundreds.
 * @throws {TraceProblem} empty, too-many-columns, no-value.
 */
export function findLayout(head: readonly TextLine[], corrections: TraceCorrections): Layout {
  const filled = head.filter((line) => line.text.trim() !== '');
  if (filled.length === 0)
    throw new TraceProblem('empty', 'The file holds no lines. Export the log again, and choose that file.');
  const delimiter = corrections.delimiter ?? findDelimiter(filled);
  const rows = filled.map((line) => ({ line: line.number, cells: splitRow(line.text, delimiter) }));
  const wide = rows.find((row) => row.cells.length > MOST_COLUMNS);
  if (wide) {
    throw new TraceProblem(
      'too-many-columns',
      `Line ${wide.line} has more than ${MOST_COLUMNS} columns. Export the log with its time and power alone.`,
      wide.line,
    );
  }
  const decimalMark = corrections.decimalMark ?? findDecimalMark(rows, delimiter);
  const dataAt = rows.findIndex(
    (row, i) =>
      isData(row.cells, decimalMark) &&
      (i === rows.length - 1 || isData(rows[i + 1]?.cells ?? [], decimalMark) || i > 0),
  );
  if (dataAt < 0) {
    throw new TraceProblem(
      'no-value',
      'No line holds a number that could be a reading. Export the log as CSV, one reading a line.',
    );
  }
  const dataRow = rows[dataAt];
  const width = dataRow?.cells.length ?? 0;
  // The header is the nearest line above the data that is as wide and holds words; a row of units may lie between.
  const above = rows
    .slice(0, dataAt)
    .filter((row) => row.cells.length >= width && row.cells.some((cell) => /[a-z]/i.test(cell)));
  const last = above[above.length - 1];
  const before = above[above.length - 2];
  const lastIsUnits =
    before !== undefined && last !== undefined && last.cells.every((cell) => cell.trim() === '' || isUnit(cell));
  const headerRow = lastIsUnits ? before : last;
  return {
    delimiter,
    decimalMark,
    headerLine: headerRow?.line ?? null,
    header: (headerRow?.cells ?? []).map((cell) => cell.trim()),
    units: ((lastIsUnits ? last : headerRow)?.cells ?? []).map((cell) => cell.trim()),
    dataFrom: dataRow?.line ?? 1,
    sample: rows.slice(dataAt, dataAt + 200),
  };
}

/** The one that divides most lines into the same number of cells, two or more. */
function findDelimiter(lines: readonly TextLine[]): string {
  let best = ',';
  let bestScore = 0;
  for (const delimiter of DELIMITERS) {
    const counts = new Map<number, number>();
    for (const line of lines) {
      const cells = splitRow(line.text, delimiter).length;
      if (cells > 1) counts.set(cells, (counts.get(cells) ?? 0) + 1);
    }
    const score = Math.max(0, ...counts.values());
    if (score > bestScore) {
      best = delimiter;
      bestScore = score;
    }
  }
  return best;
}

/** A comma where numbers are written with one, and nothing else says that it parts thousands or cells. */
function findDecimalMark(rows: readonly { cells: string[] }[], delimiter: string): '.' | ',' {
  let commas = 0;
  let points = 0;
  for (const { cells } of rows) {
    for (const cell of cells) {
      if (/^\s*[+-]?\d+(\.\d{3})*,\d+\s*\S{0,3}$/.test(cell) && !/^\s*\d{1,3}(,\d{3})+$/.test(cell)) commas += 1;
      else if (/^\s*[+-]?\d+(,\d{3})*\.\d+\s*\S{0,3}$/.test(cell) && !/^\s*\d{1,3}(\.\d{3})+$/.test(cell)) points += 1;
    }
  }
  if (delimiter === ',' && points >= commas) return '.';
  return commas > points ? ',' : '.';
}

/** A row of data has a number that is no time, or a time and a missing reading. */
function isData(cells: readonly string[], decimalMark: '.' | ','): boolean {
  const first = cells[0] ?? '';
  const timed = dateParts(first) !== null || readClock(first) !== null || readNumber(first, decimalMark) !== null;
  if (!timed)
    return (
      cells.length > 1 && cells.slice(1).every((cell) => readNumber(cell, decimalMark) !== null) && cells.length > 2
    );
  return cells.length === 1
    ? readNumber(first, decimalMark) !== null
    : cells.slice(1).some((cell) => readNumber(cell, decimalMark) !== null || isMissing(cell));
}

function isUnit(cell: string): boolean {
  return /^[[(]?\s*(mW|W|kW|VA|kVA|Wh|kWh|A|mA|V|Hz|s|min|ms|°C|%)\s*[\])]?$/i.test(cell.trim());
}

/** The format that reads nearly all of a column's cells, and whether two orders of a date would do. */
export function findTimeFormat(
  cells: readonly string[],
  name: string,
): { format: TimeFormat; ambiguous: boolean } | null {
  const text = cells.filter((cell) => cell.trim() !== '');
  if (text.length === 0) return null;
  const reads = (format: TimeFormat) =>
    text.filter((cell) => readTime(cell, format) !== null).length >= 0.8 * text.length;
  const parts = text.flatMap((cell) => {
    const found = dateParts(cell);
    return found ? [found] : [];
  });
  if (parts.length >= 0.8 * text.length) {
    if (parts.every(([first]) => first > 1000))
      return { format: reads('iso') ? 'iso' : 'year-first', ambiguous: false };
    const dayFirst = reads('day-first');
    const monthFirst = reads('month-first');
    if (dayFirst && monthFirst) {
      // Points are the day-first world's; with a slash or hyphen only the member knows.
      return { format: 'day-first', ambiguous: !text.every((cell) => /^\s*\d{1,2}\./.test(cell)) };
    }
    return dayFirst || monthFirst ? { format: dayFirst ? 'day-first' : 'month-first', ambiguous: false } : null;
  }
  if (reads('clock')) return { format: 'clock', ambiguous: false };
  return findNumericTime(text, name);
}

function findNumericTime(text: readonly string[], name: string): { format: TimeFormat; ambiguous: boolean } | null {
  const numbers = text.map((cell) => Number(cell.replace(',', '.')));
  if (numbers.some((value) => !Number.isFinite(value))) return null;
  const inRange = (low: number, high: number) => numbers.every((value) => value >= low && value <= high);
  const monotone = numbers.every((value, i) => i === 0 || value >= (numbers[i - 1] ?? 0));
  if (inRange(9e8, 4.2e9)) return { format: 'epoch-seconds', ambiguous: false };
  if (inRange(9e11, 4.2e12)) return { format: 'epoch-milliseconds', ambiguous: false };
  if (inRange(20_000, 80_000) && numbers.some((value) => !Number.isInteger(value)) && monotone) {
    return { format: 'serial-day', ambiguous: false };
  }
  const named = /time|elapsed|sec|^s$|^t$|zeit/i.test(name);
  return monotone &&
    numbers.length > 1 &&
    (named || (numbers[0] ?? 1) === 0) &&
    (numbers.at(-1) ?? 0) > (numbers[0] ?? 0)
    ? { format: 'elapsed-seconds', ambiguous: false }
    : null;
}
