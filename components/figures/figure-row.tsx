import type { ReactNode } from 'react';
import { DotPlot } from '@/components/charts/dot-plot';
import { Figure as Number } from '@/components/ui/figure';
import type { Figure } from '@/lib/figures/schema';
import { countWords, figureName, medianOf, plainUnit, rangeOf } from './figure-words';

export interface PlottedClaim {
  lower: number | null;
  upper: number | null;
  label: string;
}

const CONTRIBUTOR = { one: 'contributor', many: 'contributors' };

interface FigureRowProps {
  figure: Figure;
  note?: ReactNode;
  claim?: PlottedClaim;
  scale?: readonly [number, number];
  /** What one stone is; a contributor by default. */
  noun?: { one: string; many: string };
}

/** One figure of a sheet: what it is, its median, range and contributors, and its pile. */
export function FigureRow({ figure, note, claim, scale, noun = CONTRIBUTOR }: FigureRowProps) {
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
          <dd className="font-mono text-cell">{rangeOf(figure)}</dd>
        </div>
        <div className="max-sm:flex max-sm:gap-2">
          <dt className="text-muted">{noun.many}</dt>
          <dd className="font-mono text-cell">{figure.n}</dd>
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
          title={`${name}: ${countWords(figure.n, noun.one, noun.many)}`}
          size="page"
          scale={scale}
          stones={figure.stones}
          median={figure.median}
          q1={figure.lowerQuartile ?? undefined}
          q3={figure.upperQuartile ?? undefined}
          claim={claim}
          unit={plainUnit(figure.unit)}
          noun={noun}
        />
      </div>
    </div>
  );
}
