/** What loggers write where there was no reading. */
const MISSING = new Set([
  '',
  '-',
  '--',
  '---',
  '—',
  '–',
  'nan',
  'n/a',
  'na',
  '#n/a',
  'null',
  'none',
  'err',
  'error',
  '?',
]);

export function isMissing(cell: string): boolean {
  return MISSING.has(cell.trim().toLowerCase());
}

const PLAIN = /^[+-]?\d+(\.\d+)?$/;

/**
 * A number as a cell writes it, with either decimal mark and thousands separators; a unit behind it is left aside.
 *
 * @returns null where the cell is no number.
 * @example readNumber('1.234,5', ',') // 1234.5
 */
export function readNumber(cell: string, decimalMark: '.' | ','): number | null {
  if (decimalMark === '.' && PLAIN.test(cell)) return Number(cell);
  const text = cell
    .trim()
    .replace(/^'/, '')
    .replace(/[\s\u00a0\u202f'’]/g, '')
    .replace(/−/g, '-')
    .replace(/(mW|kW|W|kVA|VA|kWh|Wh|mA|A)$/i, '');
  const grouped = decimalMark === ',' ? /^[+-]?\d{1,3}(\.\d{3})+(,\d+)?$/ : /^[+-]?\d{1,3}(,\d{3})+(\.\d+)?$/;
  const separator = decimalMark === ',' ? /\./g : /,/g;
  const plain = grouped.test(text) ? text.replace(separator, '') : text;
  const normal = decimalMark === ',' ? plain.replace(',', '.') : plain;
  return /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(normal) ? Number(normal) : null;
}
