import type { ReactNode } from 'react';

interface EmptyProps {
  /** What is not there: "No one has measured this." */
  title: string;
  /** What to do: "Here is how.", with a link. */
  children?: ReactNode;
}

/** Bare ground and a hollow stone: a place where a pile could stand. */
export function Empty({ title, children }: EmptyProps) {
  return (
    <div className="py-8">
      <svg viewBox="0 0 180 34" width="180" height="34" aria-hidden="true" className="max-w-full">
        <path
          className="fill-none stroke-stone-1"
          strokeWidth="1.5"
          d="M79.5 22.6c.2-3.9 5-6.3 11.3-6.4 5.9-.1 10.3 2.3 10.1 6.2-.2 3.7-4.9 6-11 6-6 0-10.6-2-10.4-5.8Z"
        />
        <path className="stroke-muted" strokeWidth="1" d="M0 29.5H180" />
      </svg>
      <p className="mt-4 font-semibold">{title}</p>
      {children && <div className="mt-1 max-w-prose text-muted">{children}</div>}
    </div>
  );
}

interface NoticeProps {
  /** `warning` for what may go wrong or has; `quiet` for what is good to know. */
  tone?: 'quiet' | 'warning';
  title?: string;
  /** `status` is read out when it appears, without moving the focus. */
  role?: 'status' | 'alert' | 'note';
  children?: ReactNode;
}

export function Notice({ tone = 'quiet', title, role = 'note', children }: NoticeProps) {
  return (
    <div
      role={role}
      className={`my-5 max-w-prose border-l-3 py-1 pl-4 ${tone === 'warning' ? 'border-rust' : 'border-muted'}`}
    >
      {title && <p className={`font-semibold ${tone === 'warning' ? 'text-rust' : ''}`}>{title}</p>}
      {children && <div className="text-note">{children}</div>}
    </div>
  );
}
