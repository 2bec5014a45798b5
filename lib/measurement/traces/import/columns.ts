import { findTimeFormat, type Layout } from './layout';
import { readNumber } from './read-number';
import { readClock } from './read-time';
import type { ColumnRole, TimeFormat, TraceCorrections, TraceDescription, TraceQuestion, ValueUnit } from './types';
import { TraceProblem } from './types';

export interface ColumnPlan {
  columns: TraceDescription['columns'];
  timeFormat: TimeFormat;
  timeColumn: number | null;
  dateColumn: number | null;
  valueColumn: number;
  unit: ValueUnit;
  unitStated: boolean;
  questions: TraceQuestion[];
}

/** Which column is the time and which the reading, what unit it has, and what the member must choose. */
export function planColumns(layout: Layout, corrections: TraceCorrections): ColumnPlan {
  const width = Math.max(...layout.sample.map((row) => row.cells.length));
  const cellsOf = (index: number) => layout.sample.map((row) => row.cells[index] ?? '');
  const columns = Array.from({ length: width }, (_, index) => {
    const name = layout.header[index] ?? '';
    const { role, unit } = roleOf(`${name} ${layout.units[index] ?? ''}`, cellsOf(index));
    return { index, name: name || `column ${index + 1}`, role, unit };
  });
  const questions: TraceQuestion[] = [];
  const time = planTime(columns, cellsOf, corrections, questions);
  const used = new Set([time.timeColumn, time.dateColumn]);
  const numeric = columns.filter(
    ({ index }) => !used.has(index) && cellsOf(index).some((cell) => readNumber(cell, layout.decimalMark) !== null),
  );
  const chosen = chooseValue(numeric, corrections, questions);
  for (const column of columns) {
    if (column.index === time.timeColumn) column.role = 'time';
    if (column.index === time.dateColumn) column.role = 'date';
  }
  const unit = corrections.unit ?? chosen.unit;
  return {
    columns,
    ...time,
    valueColumn: chosen.index,
    unit: unit ?? 'W',
    unitStated: unit !== null,
    questions,
  };
}

function planTime(
  columns: TraceDescription['columns'],
  cellsOf: (index: number) => string[],
  corrections: TraceCorrections,
  questions: TraceQuestion[],
) {
  const candidates = columns.flatMap(({ index, name, role }) => {
    if (corrections.timeColumn !== undefined && index !== corrections.timeColumn) return [];
    if (role !== 'other' && role !== 'time' && corrections.timeColumn === undefined) return [];
    const found = findTimeFormat(cellsOf(index), name);
    return found ? [{ index, ...found }] : [];
  });
  const dated = candidates.find((candidate) => candidate.format !== 'clock' && candidate.format !== 'elapsed-seconds');
  const clock = candidates.find((candidate) => candidate.format === 'clock');
  const main = dated ?? clock ?? candidates[0];
  if (!main) {
    if (corrections.stepSeconds === undefined) {
      if (columns.length > 1)
        throw new TraceProblem(
          'no-time',
          'No column holds times. Export the log with its times, or give a file of readings alone and say their interval.',
        );
      questions.push({
        key: 'stepSeconds',
        message: 'The file holds readings without times. How many seconds lie between them?',
        choices: [],
      });
    }
    return { timeFormat: 'none' as TimeFormat, timeColumn: null, dateColumn: null };
  }
  if (main.ambiguous && corrections.timeFormat === undefined) {
    const example = cellsOf(main.index).find((cell) => cell.trim() !== '') ?? '';
    questions.push({
      key: 'timeFormat',
      message: `“${example.trim()}” may have the day or the month first. Which is it?`,
      choices: [
        { value: 'day-first', label: 'the day first' },
        { value: 'month-first', label: 'the month first' },
      ],
    });
  }
  // A date without a clock, and a clock beside it, are one time in two columns.
  const hasClock = cellsOf(main.index).some((cell) => cell.includes(':'));
  const twoColumns = dated !== undefined && clock !== undefined && !hasClock && dated.format !== 'serial-day';
  const timeFormat = corrections.timeFormat ?? main.format;
  return twoColumns
    ? { timeFormat, timeColumn: clock.index, dateColumn: dated.index }
    : { timeFormat, timeColumn: main.index, dateColumn: null };
}

const WORTH: Record<ColumnRole, number> = {
  power: 4,
  'apparent-power': 3,
  energy: 2,
  current: 1,
  other: 0,
  time: -1,
  date: -1,
};

function chooseValue(
  numeric: TraceDescription['columns'],
  corrections: TraceCorrections,
  questions: TraceQuestion[],
): TraceDescription['columns'][number] {
  const corrected = numeric.find((column) => column.index === corrections.valueColumn);
  if (corrected) return corrected;
  const [first] = [...numeric].sort((a, b) => WORTH[b.role] - WORTH[a.role]);
  if (!first)
    throw new TraceProblem('no-value', 'No column beside the time holds numbers. Export the log with its power.');
  const rivals = numeric.filter((column) => column.role === first.role);
  if (rivals.length > 1) {
    questions.push({
      key: 'valueColumn',
      message: 'Several columns may be the device’s power. Which one is it?',
      choices: rivals.map((column) => ({ value: column.index, label: column.name })),
    });
  }
  return first;
}

const UNIT = /(?:^|[\s_([/])(mW|kW|W|kVA|VA|kWh|Wh|mA|A|V|Hz|var|kvar)(?:$|[\s)\]_/.])/;

function roleOf(words: string, cells: readonly string[]): { role: ColumnRole; unit: ValueUnit | null } {
  const inCells = cells.map((cell) => /\d\s*(mW|kW|W|kVA|VA|kWh|Wh|A)$/.exec(cell.trim())?.[1]).find(Boolean);
  const stated = UNIT.exec(words)?.[1] ?? inCells ?? null;
  switch (stated) {
    case 'mW':
    case 'W':
    case 'kW':
      return { role: 'power', unit: stated };
    case 'VA':
    case 'kVA':
      return { role: 'apparent-power', unit: stated };
    case 'Wh':
    case 'kWh':
      return { role: 'energy', unit: stated };
    case 'A':
      return { role: 'current', unit: stated };
  }
  if (stated !== null || /volt|freq|reactive|power.?factor|\bpf\b|cos|temp|humid/i.test(words)) {
    return { role: 'other', unit: null };
  }
  if (/apparent/i.test(words)) return { role: 'apparent-power', unit: 'VA' };
  if (/power|watt|load|active/i.test(words)) return { role: 'power', unit: /watt/i.test(words) ? 'W' : null };
  if (/energy|counter|total/i.test(words)) return { role: 'energy', unit: null };
  if (/current|amp/i.test(words)) return { role: 'current', unit: null };
  if (/time|date|stamp/i.test(words) || cells.every((cell) => readClock(cell) !== null))
    return { role: 'time', unit: null };
  return { role: 'other', unit: null };
}
