import type { ReactNode } from 'react';

interface RuleProps {
  title: string;
  children: ReactNode;
  /** A worked example, its numbers computed. */
  example: string;
}

export function Rule({ title, children, example }: RuleProps) {
  return (
    <div className="border-b border-rule py-5">
      <h3 className="text-subheading">{title}</h3>
      <p className="mt-2 max-w-prose">{children}</p>
      <p className="mt-2 max-w-prose border-l-3 border-lichen-fill pl-4 text-note">{example}</p>
    </div>
  );
}
