import type { ReactNode } from 'react';
import clsx from 'clsx';

interface FigureProps {
  /** Already rounded to its uncertainty: "43.2". */
  value: string;
  unit: string;
  /** "± 1.1", "at most". */
  note?: ReactNode;
  /** `row` leads a mode's row, `fact` stands in the margin, `inline` in text and tables. */
  size?: 'row' | 'fact' | 'inline';
  tone?: 'ink' | 'slate';
}

/** A number with its unit, never without. */
export function Figure({ value, unit, note, size = 'inline', tone = 'ink' }: FigureProps) {
  return (
    <span className={clsx('font-mono font-medium', tone === 'slate' && 'text-slate')}>
      <span className="whitespace-nowrap">
        <span className={clsx(size === 'row' && 'text-figure font-[560]', size === 'fact' && 'text-fact')}>
          {value}
        </span>
        <span className={clsx(size === 'row' && 'ml-1 text-body tracking-normal', size !== 'row' && 'ml-[0.4em]')}>
          {unit}
        </span>
      </span>
      {note && (
        <span className={size === 'inline' ? 'ml-[0.4em]' : 'block text-cell font-normal text-muted'}>{note}</span>
      )}
    </span>
  );
}
