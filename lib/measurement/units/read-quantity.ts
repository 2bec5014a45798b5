/** The units that a typed number may carry, as they are written. */
export type TypedUnit = 'W' | 'VA' | 'Wh' | 'Wh/d' | 'V' | 'A' | 'Hz' | '°C' | 's';

/** What a typed text was taken to mean, how sure that is, and why. */
export type QuantityReading =
  | { status: 'empty' }
  /** Read as it stands. */
  | { status: 'understood'; value: number; unit: TypedUnit; approximate: boolean }
  /** Two values: a range. */
  | { status: 'range'; low: number; high: number; unit: TypedUnit }
  /** Something else was probably meant; the form asks. */
  | { status: 'ask'; reason: string; meant: { value: number; unit: TypedUnit; label: string }[] }
  | { status: 'unreadable'; reason: string };

interface UnitMeaning {
  unit: TypedUnit;
  factor: number;
}

const UNITS: [RegExp, UnitMeaning][] = [
  [/^(mw|milliwatts?)$/, { unit: 'W', factor: 0.001 }],
  [/^(w|watts?)$/, { unit: 'W', factor: 1 }],
  [/^(kw|kilowatts?)$/, { unit: 'W', factor: 1000 }],
  [/^va$/, { unit: 'VA', factor: 1 }],
  [/^kva$/, { unit: 'VA', factor: 1000 }],
  [/^(wh|watt.?hours?)$/, { unit: 'Wh', factor: 1 }],
  [/^(kwh|kilowatt.?hours?)$/, { unit: 'Wh', factor: 1000 }],
  [/^(v|volts?)$/, { unit: 'V', factor: 1 }],
  [/^(ma)$/, { unit: 'A', factor: 0.001 }],
  [/^(a|amps?|amperes?)$/, { unit: 'A', factor: 1 }],
  [/^(hz|hertz)$/, { unit: 'Hz', factor: 1 }],
  [/^(°?c|°|degrees?|celsius)$/, { unit: '°C', factor: 1 }],
  [/^(s|sec|secs|seconds?)$/, { unit: 's', factor: 1 }],
  [/^(min|mins|minutes?)$/, { unit: 's', factor: 60 }],
  [/^(h|hrs?|hours?)$/, { unit: 's', factor: 3600 }],
  [/^(d|days?)$/, { unit: 's', factor: 86_400 }],
];

const NUMBER = String.raw`[+-]?\d[\d\s'’]*(?:[.,]\d+)?`;

/**
 * Reads what a person typed into a field that expects a unit. A watt is a rate already, so "watts per hour" and "watts
 * a day" are never taken silently: the reading says what was probably meant, and the form asks. VA is never taken for W.
 *
 * @param expected the unit of a bare number.
 * @example readQuantity('0,6 kW', 'W') // { status: 'understood', value: 600, unit: 'W', approximate: false }
 */
export function readQuantity(text: string, expected: TypedUnit): QuantityReading {
  const typed = text
    .normalize('NFKC')
    .replace(/[\u200b-\u200f\u202a-\u202e]/g, '')
    .trim();
  if (typed === '') return { status: 'empty' };
  const range = new RegExp(`^(?:~|ca\\.?|about)?\\s*(${NUMBER})\\s*(?:[-–—]|to)\\s*(${NUMBER})\\s*(.*)$`, 'i').exec(
    typed,
  );
  if (range) return readRange(range, expected);
  const single = new RegExp(`^(~|≈|ca\\.?|approx\\.?|about)?\\s*(${NUMBER})\\s*(.*)$`, 'i').exec(
    typed.replace('−', '-'),
  );
  if (!single) return { status: 'unreadable', reason: `“${typed.slice(0, 40)}” is no number. Type it like 43.2.` };
  const value = readPlainNumber(single[2] ?? '');
  const words = (single[3] ?? '').toLowerCase().replace(/\s+/g, ' ').trim();
  const approximate = single[1] !== undefined;
  if (words === '') return { status: 'understood', value, unit: expected, approximate };
  return readWithUnit(value, words, expected, approximate);
}

function readWithUnit(value: number, words: string, expected: TypedUnit, approximate: boolean): QuantityReading {
  const [, unitWords = '', per = null] = /^(.*?)\s*(?:\/|\bper\b|\ban?\b|\beach\b|\bin\b)\s*(\S.*)$/.exec(words) ?? [
    null,
    words,
  ];
  const meaning = UNITS.find(([shape]) => shape.test(unitWords.trim()))?.[1];
  if (!meaning)
    return { status: 'unreadable', reason: `The unit “${words.slice(0, 30)}” is not known. Use ${expected}.` };
  const scaled = tidy(value * meaning.factor);
  if (per !== null) return readRate(scaled, meaning.unit, per.trim());
  if (meaning.unit === expected) return { status: 'understood', value: scaled, unit: expected, approximate };
  return wrongUnit(scaled, meaning.unit, expected);
}

/** "watts per hour", "kWh a day": a power over a time is no quantity; an energy over a day is. */
function readRate(value: number, unit: TypedUnit, per: string): QuantityReading {
  const isHour = /^(1 ?)?(h|hr|hour|hours)$/.test(per);
  const isDay = /^(1 ?)?(d|day|days|24 ?h|24 ?hours?)$/.test(per);
  if (unit === 'W' && isHour) {
    return {
      status: 'ask',
      reason: 'A watt is a rate already: so much energy in a second. “Watts per hour” is either a power or an energy.',
      meant: [
        { value, unit: 'W', label: `${value} W, a power` },
        { value, unit: 'Wh', label: `${value} Wh, an energy` },
      ],
    };
  }
  if (unit === 'W' && isDay) {
    return {
      status: 'ask',
      reason: 'A watt is a rate already, whatever the time. “Watts a day” is either a power or the energy of a day.',
      meant: [
        { value, unit: 'Wh/d', label: `${value} Wh a day` },
        { value, unit: 'W', label: `${value} W, all day long` },
      ],
    };
  }
  if (unit === 'Wh' && isDay) return { status: 'understood', value, unit: 'Wh/d', approximate: false };
  if (unit === 'Wh' && isHour) {
    return {
      status: 'ask',
      reason: 'Watt-hours per hour are watts.',
      meant: [{ value, unit: 'W', label: `${value} W` }],
    };
  }
  return {
    status: 'unreadable',
    reason: `“per ${per.slice(0, 20)}” can’t be read here. Give a power in W or an energy in Wh.`,
  };
}

function wrongUnit(value: number, unit: TypedUnit, expected: TypedUnit): QuantityReading {
  if (unit === 'VA' && expected === 'W') {
    return {
      status: 'ask',
      reason: 'VA is apparent power; a device that draws 35 VA may use far fewer watts. It is never taken for W.',
      meant: [{ value, unit: 'VA', label: `${value} VA, kept as apparent power` }],
    };
  }
  return {
    status: 'ask',
    reason: `This field takes ${expected}, and you gave ${unit}.`,
    meant: [{ value, unit, label: `${value} ${unit}` }],
  };
}

function readRange(match: RegExpExecArray, expected: TypedUnit): QuantityReading {
  const [low, high] = [readPlainNumber(match[1] ?? ''), readPlainNumber(match[2] ?? '')];
  const words = (match[3] ?? '').toLowerCase().trim();
  const meaning = words === '' ? { unit: expected, factor: 1 } : UNITS.find(([shape]) => shape.test(words))?.[1];
  if (!meaning)
    return { status: 'unreadable', reason: `The unit “${words.slice(0, 30)}” is not known. Use ${expected}.` };
  if (meaning.unit !== expected) return wrongUnit(tidy(((low + high) / 2) * meaning.factor), meaning.unit, expected);
  if (low > high) return { status: 'unreadable', reason: 'The first value of the range is the larger one.' };
  return { status: 'range', low: tidy(low * meaning.factor), high: tidy(high * meaning.factor), unit: expected };
}

/** Decimal comma or point; spaces and apostrophes part thousands, and so does a mark before exactly three digits twice. */
function readPlainNumber(text: string): number {
  return Number(text.replace(/[\s'’]/g, '').replace(',', '.'));
}

/** 0.6 · 1000 is 600, not 600.0000000001: what was typed has few digits. */
function tidy(value: number): number {
  return Number(value.toPrecision(12));
}
