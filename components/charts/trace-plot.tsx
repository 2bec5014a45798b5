'use client';

import { type ReactNode, Suspense, lazy, useEffect, useId, useMemo, useRef, useState } from 'react';
import { bisectRight } from 'd3-array';
import { Button } from '@/components/ui/button';
import { Disclosure } from '@/components/ui/disclosure';
import type { TraceLevel } from '@/lib/measurement/traces/levels';
import { threeDigits } from './axis';
import { PhaseBands, PhaseList } from './trace-phases';
import { summarise } from './trace-summary';
import { TraceTable } from './trace-table';
import { type TraceClock, moment } from './trace-time';
import { type Stretch, type TracePhase, pan, zoom } from './trace-window';
import { useScripted } from './use-scripted';
import { useTraceGestures } from './use-trace-gestures';

const TraceCanvas = lazy(() => import('./trace-canvas'));

export interface TracePlotProps {
  /** Says the finding: "Six days: the compressor runs 46 % of the time". */
  title: string;
  /** A level of the whole trace. */
  level: TraceLevel;
  /** A finer level of the window asked for last; drawn while what is shown lies inside it. */
  detail?: { level: TraceLevel; window: Stretch };
  /** First and last moment of the trace, in seconds. */
  whole: Stretch;
  /** "W" or "VA". */
  unit: string;
  /** The zone whose clock is shown; null counts from the start. */
  zone: string | null;
  gaps?: readonly Stretch[];
  phases?: readonly TracePhase[];
  /** Called when moving has come to rest: fetch a finer level of this window and hand it in as `detail`. */
  onWindowChange?: (window: Stretch) => void;
  /** Makes the edges of phases movable: by dragging, by the keyboard and by buttons. */
  onPhaseChange?: (id: string, stretch: Stretch) => void;
  /** Stands beside the summary of the table: downloads. */
  children?: ReactNode;
}

const none: readonly never[] = [];
const REST_MILLISECONDS = 200;
const TABLE_ROWS = 24;

/** A trace to look through. The drawing code is fetched when it is needed; words and table are there before it. */
export function TracePlot({
  title,
  whole,
  unit,
  zone,
  gaps = none,
  phases = none,
  onPhaseChange,
  ...props
}: TracePlotProps) {
  const id = useId();
  const box = useRef<HTMLDivElement>(null);
  const [shown, setShown] = useState(whole);
  // Words and table follow when moving has come to rest, so that nothing is read out at every step.
  const [rested, setRested] = useState(whole);
  const [pointed, setPointed] = useState<number | null>(null);
  const scripted = useScripted();
  const clock = useMemo<TraceClock>(() => ({ zone, start: whole.from }), [zone, whole.from]);
  const { timeAt, onKeyDown, ...pointer } = useTraceGestures({ box, window: shown, whole, onWindow: setShown });

  const tell = useRef(props.onWindowChange);
  useEffect(() => {
    tell.current = props.onWindowChange;
  });
  useEffect(() => {
    if (shown === rested) return;
    const rest = setTimeout(() => {
      setRested(shown);
      tell.current?.(shown);
    }, REST_MILLISECONDS);
    return () => clearTimeout(rest);
  }, [shown, rested]);

  const { detail } = props;
  const covered = detail && detail.window.from <= shown.from && detail.window.to >= shown.to;
  const level = covered ? detail.level : props.level;
  const end = covered ? detail.window.to : whole.to;
  const withSeconds = rested.to - rested.from < 3600;
  const span = `${moment(rested.from, clock, withSeconds)} to ${moment(rested.to, clock, withSeconds)}`;
  const [all] = useMemo(() => summarise(level, rested, 1, end), [level, rested, end]);
  const rows = useMemo(() => summarise(level, rested, TABLE_ROWS, end), [level, rested, end]);
  const figure = (value: number) => `${threeDigits(value)} ${unit}`;
  const words = all
    ? `${figure(all.mean)} on average, between ${figure(all.minimum)} and ${figure(all.maximum)}`
    : 'no readings';
  const middle = (shown.from + shown.to) / 2;
  const phaseProps = { phases, window: shown, whole, clock, onPhaseChange };

  return (
    <figure aria-labelledby={`${id}-title`}>
      <figcaption className="mb-2 max-w-prose">
        <p id={`${id}-title`} className="font-semibold">
          {title}
        </p>
        <p role="status" className="text-caption text-muted">
          {span}: {words}.
        </p>
      </figcaption>
      <div className="mb-1.5 flex justify-between gap-4 font-mono text-axis text-muted">
        <span>{unit}</span>
        <PointedBlock {...{ level, clock, unit }} index={pointed} />
      </div>
      <div
        tabIndex={0}
        role="group"
        aria-label={`Trace: ${title}. Arrow keys move, plus and minus zoom, Home shows all.`}
        onKeyDown={onKeyDown}
        className="relative h-64 select-none sm:h-80"
      >
        {scripted && (
          <Suspense fallback={null}>
            <TraceCanvas level={level} window={shown} clock={clock} gaps={gaps} />
          </Suspense>
        )}
        {/* As wide and high as the drawing inside its axes: FRAME in trace-canvas. */}
        <div
          ref={box}
          {...pointer}
          onPointerMove={(event) => {
            pointer.onPointerMove(event);
            setPointed(bisectRight(level.from, timeAt(event.clientX)) - 1);
          }}
          onPointerLeave={() => setPointed(null)}
          className="absolute top-[10px] right-[10px] bottom-[28px] left-[50px] cursor-grab touch-pan-y active:cursor-grabbing"
        >
          {scripted && <PhaseBands {...phaseProps} timeAt={timeAt} />}
        </div>
      </div>
      <div className="mt-3 flex flex-wrap items-center gap-2 print:hidden">
        <Button onClick={() => setShown(zoom(shown, 0.5, middle, whole))}>Closer</Button>
        <Button onClick={() => setShown(zoom(shown, 2, middle, whole))}>Wider</Button>
        <Button onClick={() => setShown(pan(shown, -0.5, whole))}>Earlier</Button>
        <Button onClick={() => setShown(pan(shown, 0.5, whole))}>Later</Button>
        <Button onClick={() => setShown(whole)}>Whole trace</Button>
      </div>
      {phases.length > 0 && <PhaseList {...phaseProps} />}
      <div className="mt-2 flex flex-wrap items-baseline gap-x-5">
        <Disclosure summary="Figures as a table" className="print:hidden">
          <TraceTable caption={`${title}: ${span}`} {...{ rows, unit, clock, withSeconds }} />
        </Disclosure>
        {props.children}
      </div>
    </figure>
  );
}

interface PointedBlockProps {
  level: TraceLevel;
  /** Null or outside the level: nothing is pointed at. */
  index: number | null;
  clock: TraceClock;
  unit: string;
}

/** What is drawn under the pointer. Only for the eye: the table says the same. */
function PointedBlock({ level, index, clock, unit }: PointedBlockProps) {
  const at = index === null ? undefined : level.from[index];
  const [mean, low, high] = [level.mean, level.minimum, level.maximum].map((column) => column[index ?? -1]);
  const known = at !== undefined && mean !== undefined && low !== undefined && high !== undefined;
  return (
    <span aria-hidden="true" className="min-h-4">
      {known && `${moment(at, clock, true)} · ${threeDigits(mean)} ${unit} (${threeDigits(low)}–${threeDigits(high)})`}
    </span>
  );
}
