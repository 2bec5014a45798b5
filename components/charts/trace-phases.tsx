'use client';

import type { KeyboardEvent, PointerEvent } from 'react';
import clsx from 'clsx';
import { Button } from '@/components/ui/button';
import { type TraceClock, moment, roundStep, stepWords } from './trace-time';
import { type Stretch, type TracePhase, moveEdge } from './trace-window';

interface PhaseProps {
  phases: readonly TracePhase[];
  window: Stretch;
  whole: Stretch;
  clock: TraceClock;
  /** Left out: phases are shown and can't be changed. */
  onPhaseChange?: (id: string, stretch: Stretch) => void;
}

type Edge = 'from' | 'to';
const edges: { edge: Edge; word: string }[] = [
  { edge: 'from', word: 'Start' },
  { edge: 'to', word: 'End' },
];

/** Phases as bands over the drawing, with edges to drag where they may be changed. */
export function PhaseBands({ timeAt, ...props }: PhaseProps & { timeAt: (x: number) => number }) {
  const { phases, window: shown, onPhaseChange } = props;
  const length = shown.to - shown.from;
  const share = (time: number) => Math.min(100, Math.max(0, ((time - shown.from) / length) * 100));
  return phases
    .filter((phase) => phase.to > shown.from && phase.from < shown.to)
    .map((phase, index) => (
      <div key={phase.id}>
        <div
          className={clsx(
            'pointer-events-none absolute inset-y-0 overflow-hidden border-x border-lichen px-1 text-axis',
            index % 2 === 0 ? 'bg-lichen-fill/25' : 'bg-lichen-fill/10',
          )}
          style={{ left: `${share(phase.from)}%`, width: `${share(phase.to) - share(phase.from)}%` }}
        >
          <span className="whitespace-nowrap">{phase.name}</span>
        </div>
        {onPhaseChange &&
          edges
            .filter(({ edge }) => phase[edge] >= shown.from && phase[edge] <= shown.to)
            .map(({ edge, word }) => (
              <EdgeHandle
                key={edge}
                {...props}
                phase={phase}
                edge={edge}
                word={word}
                at={share(phase[edge])}
                timeAt={timeAt}
              />
            ))}
      </div>
    ));
}

interface EdgeProps extends PhaseProps {
  phase: TracePhase;
  edge: Edge;
  word: string;
  at: number;
  timeAt: (x: number) => number;
}

function EdgeHandle({ phases, phase, edge, word, at, timeAt, window: shown, whole, clock, onPhaseChange }: EdgeProps) {
  const step = roundStep(shown.to - shown.from, 200);
  const move = (to: number) => {
    const stretch = moveEdge(phases, phase.id, edge, to, whole);
    if (stretch) onPhaseChange?.(phase.id, stretch);
  };

  function press(event: KeyboardEvent) {
    const by = {
      ArrowLeft: -step,
      ArrowDown: -step,
      ArrowRight: step,
      ArrowUp: step,
      PageUp: 10 * step,
      PageDown: -10 * step,
    }[event.key];
    if (by === undefined) return;
    event.preventDefault();
    move(phase[edge] + by);
  }

  function drag(event: PointerEvent<HTMLElement>) {
    event.stopPropagation();
    if (event.type === 'pointerdown') event.currentTarget.setPointerCapture(event.pointerId);
    else if (event.currentTarget.hasPointerCapture(event.pointerId)) move(timeAt(event.clientX));
  }

  return (
    <div
      role="slider"
      tabIndex={0}
      aria-label={`${word} of ${phase.name}`}
      aria-valuemin={whole.from}
      aria-valuemax={whole.to}
      aria-valuenow={phase[edge]}
      aria-valuetext={moment(phase[edge], clock, true)}
      onKeyDown={press}
      onPointerDown={drag}
      onPointerMove={drag}
      className="absolute inset-y-0 w-6 -translate-x-1/2 cursor-ew-resize touch-none"
      style={{ left: `${at}%` }}
    >
      <span className="absolute inset-y-0 left-1/2 w-0.5 -translate-x-1/2 bg-lichen" />
      <span className="absolute bottom-1 left-1/2 h-4 w-5 -translate-x-1/2 rounded-full border border-sheet bg-lichen" />
    </div>
  );
}

/** Start and end of each phase, with buttons that move them by a round step of what is shown: dragging is never needed. */
export function PhaseList({ phases, window: shown, whole, clock, onPhaseChange }: PhaseProps) {
  const step = roundStep(shown.to - shown.from, 60);
  return (
    <ul className="mt-3 border-t border-rule text-note" aria-label="Phases">
      {phases.map((phase) => (
        <li key={phase.id} className="flex flex-wrap items-center gap-x-6 gap-y-1 border-b border-rule py-2">
          <span className="min-w-36 font-semibold">{phase.name}</span>
          {edges.map(({ edge, word }) => (
            <span key={edge} className="flex items-center gap-1">
              <span className="text-muted">{word}</span>
              <span className="px-1 font-mono text-cell">{moment(phase[edge], clock, true)}</span>
              {onPhaseChange &&
                [-step, step].map((by) => (
                  <Button
                    key={by}
                    look="quiet"
                    aria-label={`${word} of ${phase.name} ${stepWords(step)} ${by < 0 ? 'earlier' : 'later'}`}
                    onClick={() => {
                      const stretch = moveEdge(phases, phase.id, edge, phase[edge] + by, whole);
                      if (stretch) onPhaseChange(phase.id, stretch);
                    }}
                  >
                    {by < 0 ? '−' : '+'}
                    {stepWords(step)}
                  </Button>
                ))}
            </span>
          ))}
        </li>
      ))}
    </ul>
  );
}
