import type { ComponentProps, ReactNode } from 'react';
import clsx from 'clsx';

interface TableProps {
  /** Names the table and the region it scrolls in. */
  caption: string;
  captionShown?: boolean;
  children: ReactNode;
  className?: string;
}

/**
 * Rows divided by hairlines. Too wide for the screen it scrolls in its own region, which takes the focus so that the
 * keyboard can scroll it; better, give the less important columns `wide` and let `RowMore` open them on a phone.
 */
export function Table({ caption, captionShown = false, children, className }: TableProps) {
  return (
    <div role="region" aria-label={caption} tabIndex={0} className={clsx('overflow-x-auto', className)}>
      <table className="w-full border-collapse text-note">
        <caption className={captionShown ? 'pb-2 text-left text-caption text-muted' : 'sr-only'}>{caption}</caption>
        {children}
      </table>
    </div>
  );
}

interface CellLook {
  /** Right-aligned, in figures of one width. */
  numeric?: boolean;
  /** Left out on a phone. */
  wide?: boolean;
}

const cell = 'py-2.5 pr-5 align-baseline last:pr-0';
const look = ({ numeric, wide }: CellLook) => clsx(numeric && 'text-right', wide && 'max-sm:hidden print:table-cell');

interface ThProps extends CellLook, Omit<ComponentProps<'th'>, 'onClick'> {
  /** With `onSort` the heading is a button; `none` is a column that could be sorted by. */
  sort?: 'ascending' | 'descending' | 'none';
  onSort?: () => void;
}

export function Th({ numeric, wide, sort, onSort, scope = 'col', className, children, ...rest }: ThProps) {
  const sign = { ascending: '▲', descending: '▼', none: '' }[sort ?? 'none'];
  return (
    <th
      {...rest}
      scope={scope}
      aria-sort={sort}
      className={clsx(
        cell,
        'text-left text-caption font-semibold',
        scope === 'col' ? 'border-b border-rule text-muted' : 'text-ink',
        look({ numeric, wide }),
        className,
      )}
    >
      {onSort ? (
        <button
          type="button"
          onClick={onSort}
          className="inline-flex min-h-8 items-center gap-1 underline-offset-4 hover:underline pointer-coarse:min-h-11"
        >
          {children}
          <span aria-hidden="true" className="w-3 text-axis">
            {sign}
          </span>
        </button>
      ) : (
        children
      )}
    </th>
  );
}

export function Tr({ className, ...rest }: ComponentProps<'tr'>) {
  return <tr {...rest} className={clsx('border-b border-rule', className)} />;
}

export function Td({ numeric, wide, className, ...rest }: CellLook & ComponentProps<'td'>) {
  return <td {...rest} className={clsx(cell, numeric && 'font-mono text-cell', look({ numeric, wide }), className)} />;
}

interface RowMoreProps {
  /** How many columns the table shows on a phone. */
  columns: number;
  /** Names the row in the summary for those who hear it alone: "More about Ina Tolvers". */
  of: string;
  facts: { label: string; value: ReactNode }[];
}

/** A row's left-out columns, to open on a phone. Follows its row, which then carries `className="max-sm:border-0"`. */
export function RowMore({ columns, of, facts }: RowMoreProps) {
  return (
    <tr className="border-b border-rule sm:hidden print:hidden">
      <td colSpan={columns} className="pb-2">
        <details>
          <summary className="min-h-6 w-fit cursor-pointer text-caption text-muted">
            More<span className="sr-only"> about {of}</span>
          </summary>
          <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1 py-1 text-caption">
            {facts.map((fact) => (
              <div key={fact.label} className="contents">
                <dt className="text-muted">{fact.label}</dt>
                <dd>{fact.value}</dd>
              </div>
            ))}
          </dl>
        </details>
      </td>
    </tr>
  );
}
