'use client';

import { Moon, Sun } from 'lucide-react';

const DARK = '(prefers-color-scheme: dark)';

/** Turns light into dark and back. A choice that equals the device's setting is forgotten, so that it is followed again. */
export function ThemeSwitch({ storageKey }: { storageKey: string }) {
  function turn() {
    const root = document.documentElement;
    const device = window.matchMedia(DARK).matches ? 'dark' : 'light';
    const next = (root.dataset.theme ?? device) === 'dark' ? 'light' : 'dark';
    if (next === device) delete root.dataset.theme;
    else root.dataset.theme = next;
    try {
      if (next === device) localStorage.removeItem(storageKey);
      else localStorage.setItem(storageKey, next);
    } catch {
      // Storage may be closed to us; the choice then lasts as long as the page.
    }
  }

  return (
    <button
      type="button"
      onClick={turn}
      aria-label="Change between light and dark"
      className="flex target w-10 items-center justify-center rounded text-muted hover:text-ink"
    >
      <Moon aria-hidden="true" className="theme-light-only size-[18px]" strokeWidth={1.75} />
      <Sun aria-hidden="true" className="theme-dark-only size-[18px]" strokeWidth={1.75} />
    </button>
  );
}
