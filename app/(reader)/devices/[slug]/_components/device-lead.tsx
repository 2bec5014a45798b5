import { countWords, medianOf, plainUnit, rangeOf } from '@/components/figures/figure-words';
import type { Category } from '@/lib/catalogue/schema';
import type { Figure } from '@/lib/figures/schema';

const OPENINGS: Partial<Record<Figure['quantity'], string>> = {
  'day-energy': 'Over a day it takes',
  'use-energy': 'One use takes',
};

/** The opening sentence: the finding on the category's basis, and how far the contributors agree. */
export function DeviceLead({ category, figures }: { category: Category; figures: Figure[] }) {
  const headline = figures.find((figure) => figure.isHeadline);
  if (!headline) return <>No one has measured its {category.basis.label} yet.</>;
  const median = medianOf(headline);
  const opening = OPENINGS[headline.quantity] ?? `When ${headline.mode?.name.toLowerCase() ?? 'on'} it draws`;
  const running = figures.find(
    (figure) => figure.isMain && figure.mode?.code === 'running' && figure.quantity === 'mean-power',
  );
  const day = figures.find((figure) => figure.isMain && figure.quantity === 'day-energy');
  return (
    <>
      {opening} {median.atMost && 'at most '}
      <strong className="font-semibold">
        {median.value} {plainUnit(median.unit)}
      </strong>
      {headline.n === 1
        ? ', measured on one unit.'
        : `: ${countWords(headline.n, 'contributor')} found ${rangeOf(headline)}.`}
      {running && headline.quantity === 'day-energy' && (
        <> While the compressor runs it draws {medianOf(running).value} W.</>
      )}
      {day && headline.quantity === 'mean-power' && (
        <>
          {' '}
          A whole day of ordinary use was {medianOf(day).value} {plainUnit(medianOf(day).unit)}.
        </>
      )}
    </>
  );
}
