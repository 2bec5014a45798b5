import type { ReactNode } from 'react';
import clsx from 'clsx';

export interface FieldWords {
  label: ReactNode;
  /** Short, no links: what to enter, with an example. */
  hint?: ReactNode;
  /** What is wrong and what to do; the same words as in the error summary. */
  error?: string;
  /** Says "(optional)"; every other field is expected. */
  optional?: boolean;
}

interface FieldProps extends FieldWords {
  /** The control's id; hint and error are `${id}-hint` and `${id}-error`. */
  id: string;
  children: ReactNode;
  className?: string;
}

/** The ids that the control must name in `aria-describedby`: hint first, then error. */
export function describedBy(id: string, words: Pick<FieldWords, 'hint' | 'error'>, ...more: (string | undefined)[]) {
  const ids = [words.hint && `${id}-hint`, words.error && `${id}-error`, ...more].filter(Boolean);
  return ids.length > 0 ? ids.join(' ') : undefined;
}

export function Hint({ id, children }: { id: string; children: ReactNode }) {
  return (
    <p id={`${id}-hint`} className="text-caption text-muted">
      {children}
    </p>
  );
}

export function FieldError({ id, children }: { id: string; children: ReactNode }) {
  return (
    <p id={`${id}-error`} className="text-note font-semibold text-rust">
      <span className="sr-only">Error: </span>
      {children}
    </p>
  );
}

/** Label, hint, error and control in their order. The controls of this folder bring it along. */
export function Field({ id, label, hint, error, optional, children, className }: FieldProps) {
  return (
    <div className={clsx('my-5', error && 'border-l-3 border-rust pl-4', className)}>
      <label htmlFor={id} className="block font-semibold">
        {label}
        {optional && <span className="font-normal text-muted"> (optional)</span>}
      </label>
      {hint && <Hint id={id}>{hint}</Hint>}
      {error && <FieldError id={id}>{error}</FieldError>}
      <div className="mt-1.5">{children}</div>
    </div>
  );
}

/** How every control that takes typing or choosing looks. */
export const controlClass =
  'target w-full rounded border bg-sheet px-3 text-body border-ink aria-invalid:border-rust aria-invalid:border-2';
