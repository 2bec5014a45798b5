import type { ReactNode } from 'react';
import clsx from 'clsx';

interface DisclosureProps {
  summary: ReactNode;
  /** Open from the start. */
  open?: boolean;
  children: ReactNode;
  className?: string;
}

/** Opens without any script. Never for cautions or errors. */
export function Disclosure({ summary, open, children, className }: DisclosureProps) {
  return (
    <details open={open} className={clsx('text-note', className)}>
      <summary className="min-h-6 w-fit cursor-pointer py-0.5 text-caption text-muted underline decoration-1 underline-offset-4 hover:decoration-2 pointer-coarse:py-2.5">
        {summary}
      </summary>
      <div className="pt-2">{children}</div>
    </details>
  );
}
