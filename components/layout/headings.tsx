import type { ReactNode } from 'react';
import Link from 'next/link';

interface CrumbsProps {
  /** From the widest to the nearest; the page itself is not among them. */
  trail: { name: string; href?: string }[];
}

export function Crumbs({ trail }: CrumbsProps) {
  return (
    <nav aria-label="Breadcrumb" className="text-note text-muted print:hidden">
      <ol className="flex flex-wrap">
        {trail.map((crumb, index) => (
          <li key={crumb.href ?? crumb.name} className="py-0.5">
            {index > 0 && (
              <span aria-hidden="true" className="px-1.5">
                /
              </span>
            )}
            {crumb.href ? (
              <Link href={crumb.href} className="py-0.5 underline-offset-4 hover:underline">
                {crumb.name}
              </Link>
            ) : (
              crumb.name
            )}
          </li>
        ))}
      </ol>
    </nav>
  );
}

interface PageTitleProps {
  children: ReactNode;
  /** The opening sentence, which states the finding. */
  lead?: ReactNode;
}

export function PageTitle({ children, lead }: PageTitleProps) {
  return (
    <>
      <h1 className="mt-1 text-name-phone sm:text-name">{children}</h1>
      {lead && <p className="mt-4 max-w-prose text-[1.1875rem] leading-normal sm:text-lead">{lead}</p>}
    </>
  );
}

interface SectionProps {
  title: string;
  /** For links to this place. */
  id?: string;
  /** Right of the title: a link or a small control. */
  aside?: ReactNode;
  /** A hairline below the title: where rows follow. */
  ruled?: boolean;
  children: ReactNode;
}

export function Section({ title, id, aside, ruled = true, children }: SectionProps) {
  return (
    <section className="mt-12" id={id}>
      <div
        className={`flex flex-wrap items-baseline justify-between gap-x-6 pb-2 ${ruled ? 'border-b border-rule' : ''}`}
      >
        <h2 className="text-heading">{title}</h2>
        {aside && <div className="text-note">{aside}</div>}
      </div>
      {children}
    </section>
  );
}
