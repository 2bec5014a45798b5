'use client';

import { type MouseEvent, useEffect, useRef } from 'react';

interface ErrorSummaryProps {
  /** In the order of the page. `field` is the control's id; without one the line is not a link. */
  errors: { field?: string; message: string }[];
  title?: string;
  /** Raise it at each failed submission, so that the same errors take the focus again. */
  attempt?: number;
  /** Brings a control onto the page that is not on it: another step of a form. */
  onReveal?: (field: string) => void;
}

const PREFIX = 'Error: ';

/**
 * What is wrong with the whole form: stands first in main, above the h1. Takes the focus whenever it appears or changes,
 * and tells a reader of the window's title too.
 */
export function ErrorSummary({
  errors,
  title = 'There is something to put right',
  attempt = 0,
  onReveal,
}: ErrorSummaryProps) {
  const box = useRef<HTMLDivElement>(null);
  const shown = errors.length > 0;
  const words = errors.map((error) => error.message).join('\n');

  useEffect(() => {
    if (!shown) return;
    box.current?.focus();
    box.current?.scrollIntoView({ block: 'start' });
  }, [shown, words, attempt]);

  useEffect(() => {
    if (!shown) return;
    document.title = PREFIX + document.title;
    return () => {
      if (document.title.startsWith(PREFIX)) document.title = document.title.slice(PREFIX.length);
    };
  }, [shown]);

  function go(event: MouseEvent, field: string) {
    if (document.getElementById(field)) {
      event.preventDefault();
      return focusOn(field);
    }
    if (!onReveal) return;
    event.preventDefault();
    onReveal(field);
    // The control is there once React has drawn what was revealed.
    requestAnimationFrame(() => requestAnimationFrame(() => focusOn(field)));
  }

  function focusOn(field: string) {
    const target = document.getElementById(field);
    if (!target) return;
    const label = document.querySelector(`label[for="${CSS.escape(field)}"]`) ?? target;
    label.scrollIntoView({ block: 'start' });
    target.focus({ preventScroll: true });
  }

  if (!shown) return null;
  return (
    <div
      ref={box}
      tabIndex={-1}
      role="alert"
      aria-labelledby="error-summary-title"
      className="my-6 max-w-prose border-l-3 border-rust py-2 pl-5"
    >
      <h2 id="error-summary-title" className="text-subheading">
        {title}
      </h2>
      <ul className="mt-2 space-y-1">
        {errors.map(({ field, message }) => (
          <li key={`${field} ${message}`}>
            {field ? (
              <a
                href={`#${field}`}
                onClick={(event) => go(event, field)}
                className="inline-block py-0.5 font-semibold text-rust underline underline-offset-4"
              >
                {message}
              </a>
            ) : (
              <span className="font-semibold text-rust">{message}</span>
            )}
          </li>
        ))}
      </ul>
    </div>
  );
}
