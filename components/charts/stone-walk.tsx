'use client';

import { type KeyboardEvent, type ReactNode, useRef, useState } from 'react';
import { useScripted } from './use-scripted';

const steps: Record<string, (index: number, last: number) => number> = {
  ArrowRight: (index) => index + 1,
  ArrowUp: (index) => index + 1,
  ArrowLeft: (index) => index - 1,
  ArrowDown: (index) => index - 1,
  Home: () => 0,
  End: (_, last) => last,
};

/**
 * One tab stop for a pile: arrow keys go from stone to stone in the order of their values, a pointer shows the one it is
 * on, Escape lets go. What is said is read from the rows of the figure's table, so that both can't differ.
 */
export function StoneWalk({ label, children }: { label: string; children: ReactNode }) {
  const box = useRef<HTMLDivElement>(null);
  const keys = useRef<HTMLDivElement>(null);
  const tag = useRef<HTMLDivElement>(null);
  const scripted = useScripted();
  const [here, setHere] = useState<{ index: number; count: number; words: string } | null>(null);

  const rows = () =>
    Array.from(box.current?.closest('figure')?.querySelectorAll<HTMLTableRowElement>('tr[data-stone]') ?? []);

  function show(index: number | null) {
    const all = rows();
    const row = index === null ? undefined : all[index];
    box.current?.querySelectorAll('[data-here]').forEach((mark) => mark.removeAttribute('data-here'));
    if (index === null || !row) {
      setHere(null);
      return;
    }
    const words = Array.from(row.cells).map((cell) => cell.textContent?.trim());
    setHere({ index, count: all.length, words: words.filter(Boolean).join(', ') });
    marksOf(row.dataset.stone).forEach((mark) => mark.setAttribute('data-here', ''));
    place(marksOf(row.dataset.stone).find((mark) => mark.getBoundingClientRect().width > 0));
  }

  const marksOf = (stone: string | undefined) =>
    Array.from(box.current?.querySelectorAll<SVGElement>('[data-stone]') ?? []).filter(
      (mark) => mark.dataset.stone === stone,
    );

  /** Above the stone and inside the picture: its share of the width is also how much of the tag lies left of it. */
  function place(mark: Element | undefined) {
    if (!box.current || !tag.current || !mark) return;
    const frame = box.current.getBoundingClientRect();
    const stone = mark.getBoundingClientRect();
    const along = ((stone.left + stone.width / 2 - frame.left) / frame.width) * 100;
    tag.current.style.left = `${along}%`;
    tag.current.style.transform = `translate(-${along}%, -100%)`;
    tag.current.style.top = `${stone.top - frame.top - 5}px`;
  }

  function press(event: KeyboardEvent) {
    if (event.key === 'Escape') show(null);
    const step = steps[event.key];
    const last = rows().length - 1;
    if (!step || last < 0) return;
    event.preventDefault();
    const from = here?.index ?? (event.key === 'ArrowLeft' || event.key === 'ArrowDown' ? last + 1 : -1);
    show(Math.min(last, Math.max(0, step(from, last))));
  }

  function point(target: EventTarget) {
    const id = target instanceof Element ? target.closest<SVGElement>('[data-stone]')?.dataset.stone : undefined;
    const index = rows().findIndex((row) => row.dataset.stone === id);
    if (id !== undefined && index >= 0) show(index);
  }

  return (
    <div
      ref={box}
      className="stone-walk relative"
      onPointerOver={(event) => event.pointerType === 'mouse' && point(event.target)}
      onPointerDown={(event) => point(event.target)}
      onPointerLeave={() => document.activeElement !== keys.current && show(null)}
    >
      {children}
      {scripted && (
        // Beside the pictures, not around them: what a slider contains is not read out.
        <div
          ref={keys}
          tabIndex={0}
          role="slider"
          aria-label={`Stones: ${label}`}
          aria-valuemin={1}
          aria-valuemax={Math.max(1, here?.count ?? 1)}
          aria-valuenow={(here?.index ?? 0) + 1}
          aria-valuetext={
            here ? `${here.words}; ${here.index + 1} of ${here.count}` : 'Arrow keys go from stone to stone'
          }
          onKeyDown={press}
          onBlur={() => show(null)}
          className="pointer-events-none absolute inset-0"
        />
      )}
      <div
        ref={tag}
        aria-hidden="true"
        hidden={!here}
        className="pointer-events-none absolute z-10 w-max max-w-full rounded bg-ink px-2 py-0.5 font-mono text-axis text-paper"
      >
        {here?.words}
      </div>
    </div>
  );
}
