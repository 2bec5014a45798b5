'use client';

import 'uplot/dist/uPlot.min.css';
import { useEffect, useRef } from 'react';
import uPlot from 'uplot';
import type { TraceLevel } from '@/lib/measurement/traces/levels';
import { plainNumber } from './axis';
import { type TraceClock, tickLabel, timeTicks } from './trace-time';
import type { Stretch } from './trace-window';

/** Where the drawing lies inside the box, in pixels; the layer of phases lies exactly over it. */
export const FRAME = { left: 50, right: 10, top: 10, bottom: 28 };

export interface TraceCanvasProps {
  level: TraceLevel;
  window: Stretch;
  clock: TraceClock;
  gaps: readonly Stretch[];
}

/** Minimum to maximum as a band and the mean as a line, on a canvas: a trace has too many points for elements. */
export default function TraceCanvas({ level, window: shown, clock, gaps }: TraceCanvasProps) {
  const box = useRef<HTMLDivElement>(null);
  const plot = useRef<uPlot | null>(null);
  const latest = useRef({ level, shown, clock, gaps });
  useEffect(() => {
    latest.current = { level, shown, clock, gaps };
  });

  useEffect(() => {
    const element = box.current;
    if (!element) return;
    const make = () => {
      plot.current?.destroy();
      const { level: now, gaps: missing } = latest.current;
      plot.current = new uPlot(optionsFor(element, latest), columns(now, missing), element);
    };
    make();
    const sized = new ResizeObserver(() => plot.current?.setSize(sizeOf(element)));
    sized.observe(element);
    // A canvas knows no CSS variables: it is drawn again when the theme turns.
    const themed = new MutationObserver(make);
    themed.observe(document.documentElement, { attributeFilter: ['data-theme'] });
    const media = ['(prefers-color-scheme: dark)', '(forced-colors: active)', 'print'].map((query) =>
      matchMedia(query),
    );
    media.forEach((query) => query.addEventListener('change', make));
    return () => {
      sized.disconnect();
      themed.disconnect();
      media.forEach((query) => query.removeEventListener('change', make));
      plot.current?.destroy();
      plot.current = null;
    };
  }, []);

  useEffect(() => plot.current?.setData(columns(level, gaps), false), [level, gaps]);
  useEffect(() => plot.current?.setScale('x', { min: shown.from, max: shown.to }), [shown, level]);

  return <div ref={box} aria-hidden="true" className="h-full w-full font-mono" />;
}

interface Latest {
  current: { shown: Stretch; clock: TraceClock };
}

const sizeOf = (element: HTMLElement) => ({ width: element.clientWidth, height: element.clientHeight });

/** uPlot's columns: time, maximum, minimum, mean; nothing is drawn across a gap. */
function columns(level: TraceLevel, gaps: readonly Stretch[]): uPlot.AlignedData {
  const empty = (index: number) => {
    const from = level.from[index];
    const next = level.from[index + 1];
    return from !== undefined && next !== undefined && gaps.some((gap) => gap.from < next && gap.to > from);
  };
  const holed = (column: readonly number[]) => column.map((value, index) => (empty(index) ? null : value));
  return [level.from, holed(level.maximum), holed(level.minimum), holed(level.mean)];
}

function optionsFor(element: HTMLElement, latest: Latest): uPlot.Options {
  const styles = getComputedStyle(element);
  const colour = (token: string) => styles.getPropertyValue(`--${token}`).trim();
  const axis: uPlot.Axis = {
    stroke: colour('muted'),
    font: `12px ${styles.fontFamily}`,
    grid: { stroke: colour('rule'), width: 1 },
    ticks: { stroke: colour('muted'), width: 1, size: 4 },
  };
  return {
    ...sizeOf(element),
    padding: [FRAME.top, FRAME.right, 0, 0],
    legend: { show: false },
    cursor: { show: false },
    scales: {
      x: { time: false, range: () => [latest.current.shown.from, latest.current.shown.to] },
      y: { range: (_, low, high) => [Math.min(0, low ?? 0), (high ?? 1) * 1.06 || 1] },
    },
    series: [
      {},
      { stroke: colour('stone-1'), width: 0.5, points: { show: false } },
      { stroke: colour('stone-1'), width: 0.5, points: { show: false } },
      { stroke: colour('ink'), width: 1.25, points: { show: false } },
    ],
    bands: [{ series: [1, 2], fill: colour('stone-1') }],
    axes: [
      {
        ...axis,
        size: FRAME.bottom,
        splits: (u) => ticksOf(u, latest.current.clock).at,
        values: (u, at) =>
          at.map((tick) => tickLabel(tick, ticksOf(u, latest.current.clock).step, latest.current.clock)),
      },
      { ...axis, size: FRAME.left, values: (_, at) => at.map((value) => plainNumber(value, placesOf(at))) },
    ],
  };
}

const ticksOf = (u: uPlot, clock: TraceClock) =>
  timeTicks(u.scales.x?.min ?? 0, u.scales.x?.max ?? 1, Math.max(2, Math.floor(u.width / 90)), clock);

function placesOf(at: readonly number[]): number {
  const step = (at[1] ?? 1) - (at[0] ?? 0) || 1;
  return Math.max(0, Math.ceil(-Math.log10(step) - 1e-9));
}
