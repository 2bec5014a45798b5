/** A figure in parts, ready to be set: value and uncertainty are rounded to the same place. */
export interface FormattedFigure {
  value: string;
  /** The expanded uncertainty (k = 2), or null where none is stated. */
  uncertainty: string | null;
  unit: string;
  atMost: boolean;
  /** The whole as one text: "43.2 ± 1.1 W", "at most 0.5 W". */
  text: string;
}

/** Readable multiples of a unit: from how large a size on the next one is used. */
const LARGER: Record<string, { unit: string; factor: number; from: number }> = {
  W: { unit: 'kW', factor: 1000, from: 10_000 },
  VA: { unit: 'kVA', factor: 1000, from: 10_000 },
  Wh: { unit: 'kWh', factor: 1000, from: 1000 },
  'Wh/d': { unit: 'kWh/d', factor: 1000, from: 1000 },
  'Wh/use': { unit: 'kWh/use', factor: 1000, from: 1000 },
};

const COVERAGE_FACTOR = 2;

/** The unit that a size is best read in, and what to divide by. */
export function readableUnit(unit: string, size: number): { unit: string; factor: number } {
  const larger = LARGER[unit];
  return larger && Math.abs(size) >= larger.from ? larger : { unit, factor: 1 };
}

/**
 * How many decimals a figure is written with: its expanded uncertainty gets two significant digits where it begins with
 * a one, otherwise one, and the value the same place. Without an uncertainty three significant digits.
 *
 * Source: JCGM 100:2008 (GUM), 7.2.6: at most two significant digits.
 * @returns a negative number rounds before the decimal mark.
 * @example decimalsFor(1.1) // 1, so 43.2 ± 1.1
 */
export function decimalsFor(expanded: number): number {
  if (!(expanded > 0)) return 0;
  const exponent = Math.floor(Math.log10(expanded));
  const leading = expanded / 10 ** exponent;
  // 0.96 would round to 1.0: a digit more than it has.
  const digits = leading < 1.95 || leading >= 9.5 ? 2 : 1;
  return digits - 1 - (leading >= 9.5 ? exponent + 1 : exponent);
}

/**
 * A figure with its unit and its uncertainty.
 *
 * @param standardUncertainty k = 1; written expanded, k = 2.
 * @param atMost the value is an upper limit: no uncertainty is written.
 * @example formatFigure({ value: 43.21, standardUncertainty: 0.55, unit: 'W' }).text // '43.2 ± 1.1 W'
 */
export function formatFigure(figure: {
  value: number;
  standardUncertainty?: number | null;
  unit: string;
  atMost?: boolean;
}): FormattedFigure {
  const { unit, factor } = readableUnit(figure.unit, figure.value);
  const value = figure.value / factor;
  const expanded = figure.atMost ? 0 : (COVERAGE_FACTOR * (figure.standardUncertainty ?? 0)) / factor;
  const decimals = expanded > 0 ? decimalsFor(expanded) : significantDecimals(value, 3);
  // A limit is stated as it is given: no zeros are added to it.
  const written = figure.atMost ? withDecimals(value, plainDecimals(value)) : withDecimals(value, decimals);
  const uncertainty = expanded > 0 ? withDecimals(expanded, decimals) : null;
  const text = `${figure.atMost ? 'at most ' : ''}${written}${uncertainty === null ? '' : ` ± ${uncertainty}`} ${unit}`;
  return { value: written, uncertainty, unit, atMost: figure.atMost ?? false, text };
}

/**
 * A range with its unit once, an en dash between, both ends in one unit and to the same place.
 *
 * @param beside the value whose unit the range takes, so that a sheet doesn't mix Wh and kWh; the larger end by default.
 * @example formatRange(710, 968, 'Wh') // '710–968 Wh'
 */
export function formatRange(low: number, high: number, unit: string, beside = high): string {
  const readable = readableUnit(unit, Math.abs(beside));
  const [from, to] = [low / readable.factor, high / readable.factor];
  const spread = to - from;
  const decimals = Math.max(significantDecimals(to, 2), spread > 0 ? significantDecimals(spread, 2) : 0);
  const most = Math.min(decimals, significantDecimals(to, 4));
  const [a, b] = [withDecimals(from, most), withDecimals(to, most)];
  return a === b ? `${b} ${readable.unit}` : `${a}–${b} ${readable.unit}`;
}

/**
 * A duration in the two largest of its parts.
 *
 * @example formatDuration(527_000) // '6 d 02 h'
 */
export function formatDuration(seconds: number): string {
  const whole = Math.round(seconds);
  if (whole < 60) return `${whole} s`;
  const two = (value: number) => String(value).padStart(2, '0');
  const minutes = Math.round(whole / 60);
  if (whole < 3600)
    return whole % 60 === 0 || whole >= 600 ? `${minutes} min` : `${Math.floor(whole / 60)} min ${two(whole % 60)} s`;
  if (minutes < 2880)
    return minutes % 60 === 0 ? `${minutes / 60} h` : `${Math.floor(minutes / 60)} h ${two(minutes % 60)} min`;
  const hours = Math.round(minutes / 60);
  return `${Math.floor(hours / 24)} d ${two(hours % 24)} h`;
}

/** The decimals of a number of three significant digits, without zeros at its end. */
function plainDecimals(value: number): number {
  return String(Number(value.toPrecision(3))).split('.')[1]?.length ?? 0;
}

function significantDecimals(value: number, digits: number): number {
  if (value === 0 || !Number.isFinite(value)) return 0;
  return digits - 1 - Math.floor(Math.log10(Math.abs(value)));
}

/** Rounded to a place, which may lie before the decimal mark; a true minus sign. */
function withDecimals(value: number, decimals: number): string {
  const places = Math.max(0, Math.min(12, decimals));
  const rounded = decimals < 0 ? Math.round(value / 10 ** -decimals) * 10 ** -decimals : value;
  return rounded
    .toFixed(places)
    .replace(/^-0(\.0*)?$/, (zero) => zero.slice(1))
    .replace('-', '−');
}
