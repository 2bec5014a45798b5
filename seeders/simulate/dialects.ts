import type { Reading } from './instrument';

/** How a kind of logger writes its file; both kinds are invented. */
export type Dialect = 'plain' | 'diary';

/** The text of a logger's file. The same readings come back through the importer, whatever the dialect. */
export function writeLog(dialect: Dialect, readings: readonly Reading[], startMs: number, digits: number): string {
  return dialect === 'plain' ? writePlain(readings, startMs, digits) : writeDiary(readings, startMs, digits);
}

/** Comma, decimal point, UTC in ISO 8601. */
function writePlain(readings: readonly Reading[], startMs: number, digits: number): string {
  const rows = readings.map(
    ({ at, watts }) => `${new Date(startMs + at * 1000).toISOString().replace('.000', '')},${watts.toFixed(digits)}`,
  );
  return `time,power_W\n${rows.join('\n')}\n`;
}

/** A preamble, semicolons, decimal commas, day first, date and time apart, and local time (Atlantic/Faroe: UTC in winter). */
function writeDiary(readings: readonly Reading[], startMs: number, digits: number): string {
  const rows = readings.map(({ at, watts }) => {
    const [date = '', time = ''] = new Date(startMs + at * 1000).toISOString().split('T');
    const [year, month, day] = date.split('-');
    return `${day}.${month}.${year};${time.slice(0, 8)};${watts.toFixed(digits).replace('.', ',')}`;
  });
  return `Log of the socket meter\nInterval means\n\nDate;Time;Power (W)\n${rows.join('\n')}\n`;
}
