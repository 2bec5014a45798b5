import { type ReactNode, useId } from 'react';
import clsx from 'clsx';
import { Disclosure } from '@/components/ui/disclosure';
import { layDotPlot } from './dot-plot-layout';
import { DotPlotKey } from './dot-plot-key';
import { DotPlotPicture } from './dot-plot-picture';
import { DotPlotTable } from './dot-plot-table';
import { type DotPlotNumbers, describeDotPlot } from './dot-plot-words';
import { StoneWalk } from './stone-walk';

export interface DotPlotProps extends DotPlotNumbers {
  /** Says the finding: "Nine households agree within 15 W". */
  title: string;
  /** `cell`: 120 × 28, stones and median. `page`: a mode's row. `full`: the plot a page is about. */
  size?: 'cell' | 'page' | 'full';
  /** One scale for several plots; without it the plot chooses its own. */
  scale?: readonly [low: number, high: number];
  /** In place of the sentence made from the numbers. */
  summary?: string;
  /** Where a row around the plot already says it, title and summary are only spoken. */
  caption?: 'shown' | 'spoken';
  /** Downloads, for example; stands beside the table's summary. */
  children?: ReactNode;
}

/*
 * Text keeps its size when an SVG is not stretched, so there is one drawing for each class of widths and the container
 * decides which one shows. Hidden ones are display: none: neither seen nor read.
 */
const drawings = {
  page: [
    { width: 284, pileHeight: 130, show: 'w-full max-w-[22rem] @min-[350px]:hidden' },
    { width: 350, pileHeight: 130, show: 'hidden w-full max-w-[24rem] @min-[350px]:block' },
  ],
  full: [
    { width: 284, pileHeight: 180, show: 'w-full max-w-[24rem] @min-[450px]:hidden' },
    { width: 450, pileHeight: 200, show: 'hidden w-full @min-[450px]:block @min-[640px]:hidden' },
    { width: 640, pileHeight: 220, show: 'hidden w-full max-w-[46rem] @min-[640px]:block' },
  ],
};

/** The pile of stones behind a published figure: one stone a contributor or device. Numbers in; picture, words and table out. */
export function DotPlot({ size = 'page', title, summary, scale, caption, children, ...numbers }: DotPlotProps) {
  const id = useId();
  const { stones, claim, unit } = numbers;
  if (stones.length === 0) return null;
  const words = summary ?? describeDotPlot(numbers);
  if (size === 'cell') {
    const layout = layDotPlot({ stones, scale, unit, width: 120, pileHeight: 20, bare: true });
    return <DotPlotPicture layout={layout} {...numbers} q1={undefined} q3={undefined} name={`${title}. ${words}`} />;
  }
  const shown = (caption ?? (size === 'full' ? 'shown' : 'spoken')) === 'shown';
  return (
    <figure aria-labelledby={`${id}-title`} className="@container">
      <figcaption className={clsx(!shown && 'sr-only', 'mb-3 max-w-prose')}>
        <p id={`${id}-title`} className="font-semibold">
          {title}
        </p>
        <p className="text-caption text-muted">{words}</p>
      </figcaption>
      <StoneWalk label={title}>
        {drawings[size].map(({ width, pileHeight, show }) => (
          <DotPlotPicture
            key={width}
            layout={layDotPlot({ stones, claim, scale, unit, width, pileHeight })}
            {...numbers}
            name={`${title}. ${words}`}
            className={clsx('h-auto', show)}
          />
        ))}
      </StoneWalk>
      {size === 'full' && <DotPlotKey {...numbers} />}
      <div className="flex flex-wrap items-baseline gap-x-5">
        <Disclosure summary="Figures as a table" className="print:hidden">
          {size === 'page' && <DotPlotKey {...numbers} />}
          <DotPlotTable title={title} {...numbers} />
        </Disclosure>
        {children}
      </div>
    </figure>
  );
}
