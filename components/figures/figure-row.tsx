import type { ReactNode } from 'react';
import { DotPlot } from '@/components/charts/dot-plot';
import { Figure as Number } from '@/components/ui/figure';
import type { Figure } from '@/lib/figures/schema';
import { formatRange } from '@/lib/measurement/units/format-figure';
import { figureName, medianOf, plainUnit, voicesOf } from './figure-words';

export interface PlottedClaim {
  lower: number | null;
  upper: number | null;
  label: string;
}

interface FigureRowProps {
  figure: Figure;
  note?: ReactNode;
  claim?: PlottedClaim;
  scale?: readonly [number, number];
}

/** One figure of a sheet: what it is, its median, range and contributors, and its pile. */
export function FigureRow({ figure, note, claim, scale }: FigureRowProps) {
  const median = medianOf(figure);
  const name = figureName(figure);
  const more = [
    ...(figure.flagged > 0 ? [`${figure.flagged} flagged`] : []),
    ...(figure.setAside > 0 ? [`${figure.setAside} set aside`] : []),
  ].join(', ');
  return (
    <div className="grid grid-cols-[1fr_auto] gap-x-6 gap-y-2 border-b border-rule py-4 sm:grid-cols-[11rem_8rem_1fr] xl:grid-cols-[10rem_8rem_8rem_minmax(22rem,1fr)]">
      <div>
        <h3 className="text-body font-semibold">{name}</h3>
        {note && <p className="text-caption text-muted">{note}</p>}
      </div>
      <p className="max-sm:text-right">
        <Number
          size="row"
          value={median.value}
          unit={plainUnit(median.unit)}
          note={median.atMost ? 'at most' : median.uncertainty === null ? undefined : `± ${median.uncertainty}`}
        />
      </p>
      <dl className="col-span-2 flex flex-wrap gap-x-5 text-caption sm:col-span-1 sm:block">
        <div className="max-sm:flex max-sm:gap-2">
          <dt className="text-muted">range</dt>
          <dd className="font-mono text-cell">{formatRange(figure.minimum, figure.maximum, plainUnit(figure.unit))}</dd>
        </div>
        <div className="max-sm:flex max-sm:gap-2">
          <dt className="text-muted">contributors</dt>
          <dd className="font-mono text-cell">{figure.n === 1 ? '1, one unit' : figure.n}</dd>
        </div>
        {more && (
          <div>
            <dt className="sr-only">left to look at</dt>
            <dd className="text-rust">{more}</dd>
          </div>
        )}
      </dl>
      <div className="col-span-2 min-w-0 sm:col-span-3 xl:col-span-1">
        <DotPlot
          title={`${name}: ${voicesOf(figure)}`}
          size="page"
          scale={scale}
          stones={figure.stones}
          median={figure.median}
          q1={figure.lowerQuartile ?? undefined}
          q3={figure.upperQuartile ?? undefined}
          claim={claim}
          unit={plainUnit(figure.unit)}
        />
      </div>
    </div>
  );
}
