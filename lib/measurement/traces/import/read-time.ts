import type { TimeFormat } from './types';

/** A time as a cell writes it: absolute (UTC), local to the file's zone, or counted from an unknown start. */
export interface ReadTime {
  seconds: number;
  kind: 'utc' | 'local' | 'relative';
}

const CLOCK = /^(\d{1,3}):(\d{2})(?::(\d{2})(?:[.,](\d+))?)?\s*([ap])?\.?m?\.?$/i;
const DATED = /^(\d{1,4})[./-](\d{1,2})[./-](\d{1,4})(?:[T\s,]+(\d{1,2}:\d{2}.*?))?\s*(Z|[+-]\d{2}:?\d{2})?$/i;
const FAST_ISO = /^\d{4}-\d{2}-\d{2}[T ]\d{2}:\d{2}:\d{2}(Z|$)/;

const SERIAL_DAY_OF_1970 = 25_569;

/**
 * Reads a time by its format.
 *
 * @returns null where the cell is none.
 * @example readTime('03.10.2026 12:00', 'day-first') // { seconds: 1791028800, kind: 'local' }
 */
export function readTime(cell: string, format: TimeFormat): ReadTime | null {
  const text = cell.trim();
  switch (format) {
    case 'iso':
    case 'year-first':
      return FAST_ISO.test(text) ? fastIso(text) : readDated(text, format);
    case 'day-first':
    case 'month-first':
      return readDated(text, format);
    case 'epoch-seconds':
      return absolute(text, 1);
    case 'epoch-milliseconds':
      return absolute(text, 1000);
    case 'serial-day': {
      const days = Number(text.replace(',', '.'));
      return text !== '' && Number.isFinite(days)
        ? { seconds: Math.round((days - SERIAL_DAY_OF_1970) * 86_400_000) / 1000, kind: 'local' }
        : null;
    }
    case 'clock': {
      const seconds = readClock(text);
      return seconds === null ? null : { seconds, kind: 'relative' };
    }
    case 'elapsed-seconds': {
      const seconds = Number(text.replace(',', '.'));
      return text !== '' && Number.isFinite(seconds) ? { seconds, kind: 'relative' } : null;
    }
    case 'none':
      return null;
  }
}

/** Seconds since midnight, or since the start, of hh:mm[:ss[.fff]], with am or pm where the clock has twelve hours. */
export function readClock(text: string): number | null {
  const match = CLOCK.exec(text.trim());
  if (!match) return null;
  const [, hours = '', minutes = '', seconds = '0', fraction = '', half] = match;
  if (Number(minutes) > 59 || Number(seconds) > 59) return null;
  let hour = Number(hours);
  if (half) {
    if (hour < 1 || hour > 12) return null;
    hour = (hour % 12) + (half.toLowerCase() === 'p' ? 12 : 0);
  }
  return hour * 3600 + Number(minutes) * 60 + Number(seconds) + (fraction ? Number(`0.${fraction}`) : 0);
}

/** The parts of a date that is written with numbers, as they stand; for telling day-first from month-first. */
export function dateParts(text: string): [number, number, number] | null {
  const match = DATED.exec(text.trim());
  return match ? [Number(match[1]), Number(match[2]), Number(match[3])] : null;
}

function readDated(text: string, format: TimeFormat): ReadTime | null {
  const match = DATED.exec(text);
  if (!match) return null;
  const [first, second, third] = [Number(match[1]), Number(match[2]), Number(match[3])];
  const yearFirst = format === 'iso' || format === 'year-first';
  const year = yearFirst ? first : third < 100 ? 2000 + third : third;
  const month = yearFirst ? second : format === 'day-first' ? second : first;
  const day = yearFirst ? third : format === 'day-first' ? first : second;
  const clock = match[4] === undefined ? 0 : readClock(match[4]);
  if (clock === null || clock >= 86_401 || month < 1 || month > 12 || day < 1 || day > 31) return null;
  const midnight = Date.UTC(year, month - 1, day) / 1000;
  if (new Date(midnight * 1000).getUTCDate() !== day) return null;
  const offset = readOffset(match[5]);
  return offset === null
    ? { seconds: midnight + clock, kind: 'local' }
    : { seconds: midnight + clock - offset, kind: 'utc' };
}

function readOffset(text: string | undefined): number | null {
  if (text === undefined) return null;
  if (text.toUpperCase() === 'Z') return 0;
  const sign = text.startsWith('-') ? -1 : 1;
  return sign * (Number(text.slice(1, 3)) * 3600 + Number(text.slice(-2)) * 60);
}

/** The form that most loggers write, without a regular expression's groups: a million rows of it are ordinary. */
function fastIso(text: string): ReadTime | null {
  const digits = (from: number, length: number) => {
    let value = 0;
    for (let i = from; i < from + length; i += 1) value = value * 10 + (text.charCodeAt(i) - 48);
    return value;
  };
  const [month, day] = [digits(5, 2), digits(8, 2)];
  const [hour, minute, second] = [digits(11, 2), digits(14, 2), digits(17, 2)];
  if (month < 1 || month > 12 || day < 1 || day > 31 || hour > 24 || minute > 59 || second > 60) return null;
  const seconds = Date.UTC(digits(0, 4), month - 1, day) / 1000 + hour * 3600 + minute * 60 + second;
  return { seconds, kind: text.length > 19 ? 'utc' : 'local' };
}

function absolute(text: string, perSecond: number): ReadTime | null {
  const value = Number(text.replace(',', '.'));
  return text !== '' && Number.isFinite(value) ? { seconds: value / perSecond, kind: 'utc' } : null;
}
