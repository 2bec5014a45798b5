import { countWords, figureName, medianOf, plainUnit, rangeOf } from '@/components/figures/figure-words';
import { Fact, Margin } from '@/components/layout/margin';
import type { Category } from '@/lib/catalogue/schema';
import type { Figure } from '@/lib/figures/schema';

interface CategoryFactsProps {
  category: Category;
  headline: Figure | undefined;
}

/** The margin of a category: its median, what stands behind it, and how its devices are compared. */
export function CategoryFacts({ category, headline }: CategoryFactsProps) {
  return (
    <Margin>
      {headline && (
        <Fact label={figureName(headline)} figure={`${medianOf(headline).value} ${plainUnit(medianOf(headline).unit)}`}>
          median of {countWords(headline.n, 'device')}, range {rangeOf(headline)}
        </Fact>
      )}
      {headline && (
        <Fact label="Evidence" figure={`${headline.counts.contributors} · ${headline.counts.reports}`}>
          contributors · reports, with {countWords(headline.counts.instruments, 'kind')} of instrument
        </Fact>
      )}
      <Fact label="Compared by">{category.basis.label}</Fact>
      <Fact label="Operating modes">{category.modes.map((mode) => mode.name).join(', ')}</Fact>
    </Margin>
  );
}
