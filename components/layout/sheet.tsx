import type { ReactNode } from 'react';

interface SheetProps {
  /** Crumbs, title, opening sentence: first on a phone, the top of the sheet elsewhere. */
  head?: ReactNode;
  /** A `Margin` with the facts: beside the sheet, on a phone between head and body. Left out: the sheet stands alone. */
  margin?: ReactNode;
  children?: ReactNode;
}

/*
 * Head and body are two cells of one column, so that the margin can come between them on a phone and stand beside both
 * on a wide screen; the sheet itself is the ::before that spans the two rows.
 */
const SHEET_BEHIND =
  "lg:before:content-[''] lg:before:row-start-1 lg:before:row-span-2 lg:before:rounded-sheet lg:before:border lg:before:border-rule lg:before:bg-sheet print:before:hidden";

export function Sheet({ head, margin, children }: SheetProps) {
  const width = margin ? 'max-w-page lg:grid-cols-[244px_minmax(0,1fr)]' : 'max-w-[62rem]';
  const behind = margin ? 'lg:before:col-start-2' : 'lg:before:col-start-1';
  const column = margin ? 'lg:col-start-2' : 'lg:col-start-1';
  return (
    <div
      className={`mx-auto grid grid-cols-[minmax(0,1fr)] gap-x-9 px-[18px] pt-5 sm:px-10 lg:grid-rows-[auto_1fr] lg:pt-7 print:block print:p-0 ${width} ${SHEET_BEHIND} ${behind}`}
    >
      {head && <div className={`lg:row-start-1 lg:px-[38px] lg:pt-7 print:p-0 ${column}`}>{head}</div>}
      {margin}
      <div className={`lg:row-start-2 lg:px-[38px] lg:pb-10 print:p-0 ${column}`}>{children}</div>
    </div>
  );
}
