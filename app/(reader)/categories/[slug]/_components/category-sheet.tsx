import Link from 'next/link';
import { DotPlot } from '@/components/charts/dot-plot';
import { CategoryTable } from '@/components/catalogue/category-table';
import { FigureRow } from '@/components/figures/figure-row';
import { medianOf, plainUnit, rangeOf } from '@/components/figures/figure-words';
import { Section } from '@/components/layout/headings';
import { Empty } from '@/components/layout/notices';
import { Caution } from '@/components/ui/caution';
import type { Category } from '@/lib/catalogue/schema';
import type { DeviceWithFigure, Figure } from '@/lib/figures/schema';

interface CategorySheetProps {
  category: Category;
  figures: Figure[];
  devices: DeviceWithFigure[];
}

/** A category's devices on one plot and in one table, its figures by mode, and its cautions. */
export function CategorySheet({ category, figures, devices }: CategorySheetProps) {
  const headline = figures.find((figure) => figure.isHeadline);
  const others = figures.filter((figure) => figure.isMain && figure !== headline && figure.quantity === 'mean-power');
  return (
    <>
      <Section title={`All of them by ${category.basis.label}`} ruled={false}>
        {headline ? (
          <DotPlot
            size="full"
            title={`Median ${medianOf(headline).value} ${plainUnit(medianOf(headline).unit)}, from ${rangeOf(headline)}`}
            stones={headline.stones}
            median={headline.median}
            q1={headline.lowerQuartile ?? undefined}
            q3={headline.upperQuartile ?? undefined}
            unit={plainUnit(headline.unit)}
            noun={{ one: 'device', many: 'devices' }}
          />
        ) : (
          <Empty title="No one has measured one of these.">
            <Link href="/reports/new" className="text-lichen underline underline-offset-4">
              Be the first
            </Link>
          </Empty>
        )}
      </Section>
      <Section title="Devices">
        <CategoryTable devices={devices} quantityWords={category.basis.label} />
      </Section>
      {others.length > 0 && (
        <Section title="By operating mode">
          {others.map((figure) => (
            <FigureRow
              key={figure.mode?.code}
              figure={figure}
              noun={{ one: 'device', many: 'devices' }}
              note={category.modes.find((mode) => mode.code === figure.mode?.code)?.note}
            />
          ))}
        </Section>
      )}
      <Section title="Before you measure one" ruled={false}>
        {category.cautions.map((caution) => (
          <Caution key={caution}>{caution}</Caution>
        ))}
      </Section>
    </>
  );
}
