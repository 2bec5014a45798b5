import Papa from 'papaparse';

/**
 * The cells of a line. Quoted ones are the library's work; a line without quotes is split as it stands, which gives
 * the same and is several times as fast.
 *
 * @example splitRow('a;"b;c"', ';') // ['a', 'b;c']
 */
export function splitRow(line: string, delimiter: string): string[] {
  if (!line.includes('"')) return line.split(delimiter);
  const [row] = Papa.parse<string[]>(line, { delimiter, header: false }).data;
  return row ?? [''];
}
