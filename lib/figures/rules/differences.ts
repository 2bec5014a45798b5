import { poolKey } from '@/lib/measurement/aggregation/pooling';
import type { FigureColumns, InputColumns, ScopedFigure } from './columns';

/** A figure that is stored and a figure that the verified reports yield, where they differ; null where one is missing. */
export interface Difference<Stored extends ScopedFigure> {
  stored: Stored | null;
  expected: ScopedFigure | null;
  /** Each thing that differs, as a person reads it: "median: 43.1 is stored, 43.2 follows from the reports". */
  details: string[];
}

/** What differs between two sets of published figures, to the last digit of every column and input. */
export function findDifferences<Stored extends ScopedFigure>(
  stored: readonly Stored[],
  expected: readonly ScopedFigure[],
): Difference<Stored>[] {
  const known = new Map(stored.map((figure) => [figureKey(figure), figure]));
  const differences: Difference<Stored>[] = [];
  for (const figure of expected) {
    const key = figureKey(figure);
    const other = known.get(key) ?? null;
    known.delete(key);
    const details = other ? compare(other, figure) : ['it is not stored'];
    if (details.length > 0) differences.push({ stored: other, expected: figure, details });
  }
  for (const figure of known.values()) {
    differences.push({ stored: figure, expected: null, details: ['nothing verified is behind it'] });
  }
  return differences;
}

/** Names a figure among all: its scope and its pool. */
export function figureKey({ scope, columns }: ScopedFigure): string {
  return `${scope.kind} ${scope.id}: ${poolKey(columns)}`;
}

function compare(stored: ScopedFigure, expected: ScopedFigure): string[] {
  const names = Object.keys(expected.columns) as (keyof FigureColumns)[];
  const columns = names
    .filter((name) => stored.columns[name] !== expected.columns[name])
    .map((name) => `${name}: ${stored.columns[name]} is stored, ${expected.columns[name]} follows from the reports`);
  const had = new Set(stored.inputs.map(inputText));
  const wanted = new Set(expected.inputs.map(inputText));
  return [
    ...columns,
    ...[...wanted].filter((text) => !had.has(text)).map((text) => `an input is missing: ${text}`),
    ...[...had].filter((text) => !wanted.has(text)).map((text) => `an input does not belong: ${text}`),
    ...(stored.inputs.length > had.size ? ['an input is stored twice'] : []),
  ];
}

function inputText(input: InputColumns): string {
  const { reportFigureId, reportRevisionId, deviceId, voice, value, counted, flagged, reason } = input;
  return JSON.stringify([reportFigureId, reportRevisionId, deviceId, voice, value, counted, flagged, reason]);
}
