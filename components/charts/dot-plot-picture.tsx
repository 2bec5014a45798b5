import clsx from 'clsx';
import type { DotPlotLayout, PlacedStone } from './dot-plot-layout';
import { AXIS_CHARACTER } from './axis';
import { LINE } from './bracket';
import { stonePath, veinPath } from './stone';

const TONES = ['fill-stone-0', 'fill-stone-1', 'fill-stone-2'] as const;

interface PictureProps {
  layout: DotPlotLayout;
  median: number;
  q1?: number;
  q3?: number;
  atMost?: boolean;
  unit: string;
  /** Read out in place of the picture. */
  name: string;
  className?: string;
}

/** One drawing of a dot plot, at the width that it was laid out for. */
export function DotPlotPicture({ layout, median, q1, q3, atMost, unit, name, className }: PictureProps) {
  const { width, height, ground, axis, bracket, stones, outline } = layout;
  const middle = axis.place(median);
  // The rings of flagged stones lie over their neighbours.
  const painted = [...stones].sort((one, other) => Number(one.stone.flagged ?? 0) - Number(other.stone.flagged ?? 0));
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      width={width}
      height={height}
      role="img"
      aria-label={name}
      className={className}
    >
      {outline && <path d={outline} className="fill-stone-0 stroke-stone-2" />}
      {painted.map((placed) => (
        <StoneMark key={placed.stone.id} placed={placed} width={layout.stoneWidth} />
      ))}
      <Ground layout={layout} unit={unit} />
      {q1 !== undefined && q3 !== undefined && (
        <rect
          x={axis.place(q1)}
          y={ground + 2}
          width={Math.max(2, axis.place(q3) - axis.place(q1))}
          height="4"
          className="fill-lichen-fill stroke-lichen"
          strokeWidth="0.75"
        />
      )}
      <MedianMark x={middle} y={ground + 2} atMost={atMost} />
      {bracket && (
        <g>
          <path d={bracket.path} className="fill-none stroke-slate" strokeWidth="2" />
          <text textAnchor="middle" className="fill-slate font-text text-axis font-semibold">
            {bracket.lines.map((line, index) => (
              <tspan key={line} x={bracket.textAt} y={LINE * index + 12}>
                {line}
              </tspan>
            ))}
          </text>
        </g>
      )}
    </svg>
  );
}

function StoneMark({ placed: { stone, shape, x, y }, width }: { placed: PlacedStone; width: number }) {
  const d = stonePath(shape, x, y);
  const gap = Math.min(1, width / 12);
  if (stone.setAside) {
    return (
      <path
        d={d}
        data-stone={stone.id}
        className="fill-sheet stroke-stone-0"
        strokeWidth="1.25"
        strokeDasharray={width >= 9 ? '2.5 1.5' : undefined}
      />
    );
  }
  return (
    <>
      {/* A ring with a gap inside, so that it is one without its colour too. */}
      {stone.flagged && <path d={d} className="fill-none stroke-rust" strokeWidth={gap * 5.5} />}
      <path
        d={d}
        data-stone={stone.id}
        className={clsx(TONES[shape.tone], 'stroke-sheet')}
        strokeWidth={stone.flagged ? gap * 2 : gap}
      />
      {shape.vein && width >= 15 && (
        <path
          d={veinPath(shape.vein, x, y)}
          className="pointer-events-none fill-none stroke-sheet opacity-35"
          strokeWidth="0.9"
        />
      )}
    </>
  );
}

/** The ground with its round steps; the unit stands once, after the last. */
function Ground({ layout: { axis, ground, width }, unit }: { layout: DotPlotLayout; unit: string }) {
  const last = axis.ticks.at(-1);
  return (
    <>
      <path
        d={`M${axis.range[0]} ${ground + 0.5}H${axis.range[1]}${axis.ticks.map(({ at }) => `M${at.toFixed(1)} ${ground}v4`).join('')}`}
        className="fill-none stroke-muted"
      />
      <text className="fill-muted font-mono text-axis" textAnchor="middle">
        {axis.ticks.map(({ at, label }) => (
          <tspan key={label} x={at.toFixed(1)} y={ground + 26}>
            {label}
          </tspan>
        ))}
      </text>
      {last && (
        <text
          className="fill-muted font-mono text-axis"
          x={Math.min(
            last.at + ((last.label.length + 1) * AXIS_CHARACTER) / 2 + 2,
            width - unit.length * AXIS_CHARACTER,
          )}
          y={ground + 26}
        >
          {unit}
        </text>
      )}
    </>
  );
}

/** A triangle that points up at the median; where the figure is only an upper limit, an arrow to its left. */
function MedianMark({ x, y, atMost }: { x: number; y: number; atMost?: boolean }) {
  if (atMost) {
    return (
      <path
        d={`M${x} ${y - 2}V${y + 12}M${x} ${y + 9}H${x - 14}M${x - 10.5} ${y + 5.5}L${x - 14} ${y + 9}L${x - 10.5} ${y + 12.5}`}
        className="fill-none stroke-lichen"
        strokeWidth="2"
      />
    );
  }
  return (
    <path d={`M${x} ${y}L${x + 5.5} ${y + 10}H${x - 5.5}Z`} className="fill-lichen stroke-sheet" strokeWidth="0.75" />
  );
}
