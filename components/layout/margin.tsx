import type { ReactNode } from 'react';

interface MarginProps {
  label?: string;
  /** `Fact`s. */
  children: ReactNode;
}

/** The facts beside a sheet; on a phone two columns between its head and its body. */
export function Margin({ label = 'Facts', children }: MarginProps) {
  return (
    <aside
      aria-label={label}
      className="mt-6 border-y border-rule py-5 lg:col-start-1 lg:row-span-2 lg:row-start-1 lg:mt-0 lg:border-0 lg:pt-5 lg:pl-2 print:hidden"
    >
      <dl className="grid grid-cols-2 gap-x-6 gap-y-5 lg:block">{children}</dl>
    </aside>
  );
}

interface FactProps {
  label: string;
  /** With its unit: "0.80 kWh". */
  figure?: ReactNode;
  /** `slate` is the maker's claim and nothing else. */
  tone?: 'ink' | 'slate';
  /** A fact of words takes both columns of a phone. */
  wide?: boolean;
  /** One line of explanation. */
  children?: ReactNode;
}

export function Fact({ label, figure, tone = 'ink', wide = !figure, children }: FactProps) {
  return (
    <div
      className={`lg:border-b lg:border-rule lg:py-4 lg:first:pt-2 lg:last:border-b-0 ${wide ? 'col-span-2' : 'max-[340px]:col-span-2'}`}
    >
      <dt className="text-caption font-semibold text-muted">{label}</dt>
      {figure && (
        <dd className={`font-mono text-fact font-medium ${tone === 'slate' ? 'text-slate' : 'text-ink'}`}>{figure}</dd>
      )}
      {children && <dd className={figure ? 'text-caption text-muted' : 'mt-1 text-note'}>{children}</dd>}
    </div>
  );
}
