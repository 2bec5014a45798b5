import type { ReactNode } from 'react';
import { PageTitle } from './headings';
import { Sheet } from './sheet';

interface ErrorPageProps {
  /** What happened, as a sentence. */
  title: string;
  /** What is safe: whether anything was lost. */
  safe?: string;
  /** What next: links or buttons. */
  children?: ReactNode;
}

export function ErrorPage({ title, safe, children }: ErrorPageProps) {
  return (
    <Sheet head={<PageTitle lead={safe}>{title}</PageTitle>}>
      {children && <div className="mt-6 flex flex-wrap items-center gap-4">{children}</div>}
    </Sheet>
  );
}
