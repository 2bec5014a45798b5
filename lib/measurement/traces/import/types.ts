import type { Trace, TraceKind } from '../trace';

/** How a file writes its times. */
export type TimeFormat =
  | 'iso'
  | 'year-first'
  | 'day-first'
  | 'month-first'
  | 'epoch-seconds'
  | 'epoch-milliseconds'
  | 'serial-day'
  | 'clock'
  | 'elapsed-seconds'
  | 'none';

export type ValueUnit = 'mW' | 'W' | 'kW' | 'VA' | 'kVA' | 'Wh' | 'kWh' | 'A';

export type ColumnRole = 'time' | 'date' | 'power' | 'apparent-power' | 'energy' | 'current' | 'other';

/** What a member may set right; the import is run again with it. Everything left out is found by the importer. */
export interface TraceCorrections {
  delimiter?: string;
  decimalMark?: '.' | ',';
  timeFormat?: TimeFormat;
  timeColumn?: number;
  dateColumn?: number | null;
  valueColumn?: number;
  unit?: ValueUnit;
  kind?: TraceKind;
  stamp?: 'start' | 'end';
  averagingSeconds?: number;
  /** For current: the voltage to multiply by. */
  volts?: number;
  /** For values without times: seconds from one to the next. */
  stepSeconds?: number;
  /** For clock times alone, elapsed seconds and values without times: when the first row was written. */
  startsAt?: string;
  /** A reversed clamp or shunt: every sign is turned. */
  turnSign?: boolean;
  /** Whether codes for "missing" are left out; a first reading proposes to. */
  leaveOutMissing?: boolean;
  /** Which part of a file that steps back in time, from 0. */
  segment?: number;
}

/** A choice that the file leaves open: until it is made, nothing counts. */
export interface TraceQuestion {
  key: keyof TraceCorrections;
  message: string;
  choices: { value: string | number; label: string }[];
}

/** Everything that the importer understood of a file, as the member is shown it. */
export interface TraceDescription {
  encoding: string;
  delimiter: string;
  decimalMark: '.' | ',';
  /** Line number of the header, or null where there is none. */
  headerLine: number | null;
  columns: { index: number; name: string; role: ColumnRole; unit: ValueUnit | null }[];
  time: { format: TimeFormat; zone: string; timeColumn: number | null; dateColumn: number | null };
  value: { column: number; name: string; unit: ValueUnit; unitStated: boolean };
  kind: TraceKind;
  kindReason: string;
  averagingSeconds: number | null;
  stamp: 'start' | 'end';
  /** The first rows of data, cell by cell, with what was read of them. */
  firstRows: { line: number; cells: string[]; time: string | null; value: number | null }[];
  rows: number;
  readings: number;
  unreadable: { count: number; lines: { line: number; reason: string }[] };
  missing: { count: number; codes: string[] };
  averagedDuplicates: number;
  sortedRows: number;
  newestFirst: boolean;
  resets: number;
  shareNegative: number;
  segments: { from: string; to: string; readings: number }[];
  step: number;
  warnings: { line: number | null; message: string }[];
  questions: TraceQuestion[];
}

export type TraceProblemCode =
  | 'empty'
  | 'not-text'
  | 'line-too-long'
  | 'too-many-columns'
  | 'too-large'
  | 'no-time'
  | 'no-value'
  | 'unreadable-rows'
  | 'too-few-readings'
  | 'correction';

export type TraceImport =
  | { ok: true; description: TraceDescription; trace: Trace }
  /** Something must be chosen first. */
  | { ok: false; description: TraceDescription; problem: null }
  | {
      ok: false;
      description: TraceDescription | null;
      problem: { code: TraceProblemCode; message: string; line: number | null };
    };

/** An end of the import with a sentence that says what to do. */
export class TraceProblem extends Error {
  constructor(
    readonly code: TraceProblemCode,
    message: string,
    readonly line: number | null = null,
  ) {
    super(message);
  }
}

export const IMPORTER_VERSION = '1';
