import type { ReactNode } from 'react';
import ReactMarkdown from 'react-markdown';
import rehypeSanitize from 'rehype-sanitize';
import remarkGfm from 'remark-gfm';

const look = {
  a: ({ href, children }: { href?: string; children?: ReactNode }) => (
    <a href={href} rel="nofollow ugc noopener" className="text-lichen underline underline-offset-4">
      {children}
    </a>
  ),
  // Pictures of other sites would tell them who reads here; only their words stay.
  img: ({ alt }: { alt?: string }) => <span>{alt}</span>,
  h2: ({ children }: { children?: ReactNode }) => <h2 className="mt-8 text-heading">{children}</h2>,
  h3: ({ children }: { children?: ReactNode }) => <h3 className="mt-6 text-subheading">{children}</h3>,
  ul: ({ children }: { children?: ReactNode }) => <ul className="list-disc space-y-1 pl-5">{children}</ul>,
  ol: ({ children }: { children?: ReactNode }) => <ol className="list-decimal space-y-1 pl-5">{children}</ol>,
  table: ({ children }: { children?: ReactNode }) => (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Table">
      <table className="text-note [&_td]:border-b [&_td]:border-rule [&_td]:py-1.5 [&_td]:pr-5 [&_th]:pr-5 [&_th]:text-left">
        {children}
      </table>
    </div>
  ),
  // A check box of a list has no label of its own.
  input: ({ checked }: { checked?: boolean }) => <span aria-hidden="true">{checked ? '☑ ' : '☐ '}</span>,
};

/** Text that people wrote, as Markdown: no raw HTML, no foreign pictures, links that vouch for nothing. */
export function Markdown({ children }: { children: string }) {
  return (
    <div className="max-w-prose space-y-4 wrap-anywhere">
      <ReactMarkdown remarkPlugins={[remarkGfm]} rehypePlugins={[rehypeSanitize]} components={look}>
        {children}
      </ReactMarkdown>
    </div>
  );
}
