import clsx from 'clsx';
import { threeDigits } from './axis';
import { type RangeScale, placeOnScale, rangeTicks } from './range-scale';

interface RangeBarProps {
  scale: RangeScale;
  low: number;
  high: number;
  median: number;
  q1?: number;
  q3?: number;
  /** The maker's claim as a thin slate line below the bar. */
  claim?: { lower: number | null; upper: number | null };
  unit: string;
  /** What is drawn: "Vennholm KX-140". */
  name: string;
  className?: string;
}

const percent = (share: number) => `${share.toFixed(2)}%`;

/** Range, middle half and median of one hit, on the axis that all hits share. Stretches with its column. */
export function RangeBar({ scale, low, high, median, q1, q3, claim, unit, name, className }: RangeBarProps) {
  const at = (value: number) => placeOnScale(scale, value);
  const middle = at(median);
  const label = `${name}: ${threeDigits(low)} to ${threeDigits(high)} ${unit}, median ${threeDigits(median)} ${unit}`;
  return (
    <svg role="img" aria-label={label} width="100%" height="20" className={clsx('block overflow-visible', className)}>
      {rangeTicks(scale).map((tick) => (
        <line key={tick.label} x1={percent(tick.at)} x2={percent(tick.at)} y1="0" y2="20" className="stroke-rule" />
      ))}
      <line
        x1={percent(at(low))}
        x2={percent(at(high))}
        y1="9"
        y2="9"
        className="stroke-stone-0"
        strokeWidth="2"
        strokeLinecap="round"
      />
      {q1 !== undefined && q3 !== undefined && (
        <rect
          x={percent(at(q1))}
          width={percent(Math.max(0.4, at(q3) - at(q1)))}
          y="6"
          height="6"
          className="fill-lichen-fill stroke-lichen"
          strokeWidth="0.75"
        />
      )}
      {claim && (
        <line
          x1={percent(claim.lower === null ? 0 : at(claim.lower))}
          x2={percent(claim.upper === null ? 100 : at(claim.upper))}
          y1="17.5"
          y2="17.5"
          className="stroke-slate"
          strokeWidth="2"
          strokeLinecap="square"
        />
      )}
      <ellipse cx={percent(middle)} cy="9" rx="5.5" ry="3.9" className="fill-stone-2 stroke-sheet" strokeWidth="1" />
    </svg>
  );
}

/** The shared axis above or below a list of bars, in a column of the same width. The unit stands once, at its name. */
export function RangeAxis({ scale, unit, className }: { scale: RangeScale; unit: string; className?: string }) {
  const ticks = rangeTicks(scale);
  return (
    <svg aria-hidden="true" width="100%" height="20" className={clsx('block overflow-visible', className)}>
      {ticks.map((tick, index) => (
        <text
          key={tick.label}
          x={percent(tick.at)}
          y="13"
          textAnchor={tick.at < 3 ? 'start' : tick.at > 97 ? 'end' : 'middle'}
          className="fill-muted font-mono text-axis"
        >
          {tick.label}
          {index === ticks.length - 1 && ` ${unit}`}
        </text>
      ))}
    </svg>
  );
}
