import { TraceProblem } from './types';

/** A row of a logger is some tens of characters; a longer line is no row, and reading it would only cost. */
const LONGEST_LINE = 20_000;
/** As many bytes as the longest byte-order mark has. */
const MARK_BYTES = 3;
const NOTHING: Uint8Array = new Uint8Array(0);

export interface TextLine {
  text: string;
  /** From 1. */
  number: number;
}

/**
 * The lines of a file, as it streams in: UTF-8, UTF-16 by its byte-order mark, or Latin-1 where the bytes are no UTF-8.
 * Memory holds one chunk and one line.
 *
 * @throws {TraceProblem} not-text at a NUL byte, line-too-long, too-large.
 */
export async function* readLines(
  source: AsyncIterable<Uint8Array>,
  onEncoding: (name: string) => void,
  mostBytes: number,
): AsyncGenerator<TextLine[]> {
  let decoder: TextDecoder | null = null;
  // A stream may begin with less than a byte-order mark.
  let held = NOTHING;
  let rest = '';
  let number = 0;
  let bytes = 0;
  for await (const chunk of source) {
    bytes += chunk.byteLength;
    if (bytes > mostBytes) throw new TraceProblem('too-large', tooLarge(mostBytes), number);
    const fresh: Uint8Array = held.byteLength > 0 ? joined(held, chunk) : chunk;
    if (decoder === null && fresh.byteLength < MARK_BYTES) {
      held = fresh;
      continue;
    }
    held = NOTHING;
    decoder ??= decoderOf(fresh, onEncoding);
    const text = rest + decoder.decode(fresh, { stream: true });
    const parts = text.split(/\r\n|\n|\r(?!$)/);
    rest = parts.pop() ?? '';
    if (rest.length > LONGEST_LINE) throw tooLong(number + parts.length + 1);
    const lines = parts.map((part) => check({ text: part, number: (number += 1) }));
    if (lines.length > 0) yield lines;
  }
  if (held.byteLength > 0) rest += decoderOf(held, onEncoding).decode(held);
  rest += decoder?.decode() ?? '';
  if (rest.replace(/\r$/, '') !== '') yield [check({ text: rest.replace(/\r$/, ''), number: number + 1 })];
}

function check(line: TextLine): TextLine {
  if (line.text.length > LONGEST_LINE) throw tooLong(line.number);
  if (line.text.includes('\u0000')) {
    throw new TraceProblem(
      'not-text',
      `Line ${line.number} holds bytes that no text has. Export the log as CSV, not as the logger’s own file.`,
      line.number,
    );
  }
  return line;
}

function decoderOf(start: Uint8Array, onEncoding: (name: string) => void): TextDecoder {
  const encoding = detectEncoding(start);
  onEncoding(encoding);
  return new TextDecoder(encoding);
}

function joined(a: Uint8Array, b: Uint8Array): Uint8Array {
  const both = new Uint8Array(a.byteLength + b.byteLength);
  both.set(a);
  both.set(b, a.byteLength);
  return both;
}

/** By its mark; without one UTF-8 where the first chunk is, otherwise Latin-1 with the marks of Windows. */
function detectEncoding(chunk: Uint8Array): string {
  if (chunk[0] === 0xff && chunk[1] === 0xfe) return 'utf-16le';
  if (chunk[0] === 0xfe && chunk[1] === 0xff) return 'utf-16be';
  try {
    // The chunk may end inside a character, so what follows its last whole one is left out.
    new TextDecoder('utf-8', { fatal: true }).decode(chunk, { stream: true });
    return 'utf-8';
  } catch {
    return 'windows-1252';
  }
}

function tooLong(line: number): TraceProblem {
  return new TraceProblem(
    'line-too-long',
    `Line ${line} is longer than ${LONGEST_LINE} characters, so it is no row of readings. Export the log as CSV, one reading a line.`,
    line,
  );
}

function tooLarge(mostBytes: number): string {
  return `The file is larger than ${Math.round(mostBytes / 1e6)} MB. Cut it to the days you need, or log at longer steps.`;
}
