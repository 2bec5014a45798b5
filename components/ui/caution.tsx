import type { ReactNode } from 'react';

interface CautionProps {
  title?: string;
  children: ReactNode;
}

/** What can hurt someone or break something. Stands before the steps it concerns; never folded, never dismissed. */
export function Caution({ title = 'Caution', children }: CautionProps) {
  return (
    <div role="note" aria-label={title} className="my-5 max-w-prose border-l-3 border-rust py-1 pl-4">
      <p className="font-semibold text-rust">{title}</p>
      <div className="space-y-2">{children}</div>
    </div>
  );
}
