import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound, permanentRedirect } from 'next/navigation';
import { DotPlot } from '@/components/charts/dot-plot';
import { CategoryTable } from '@/components/catalogue/category-table';
import { FigureRow } from '@/components/figures/figure-row';
import { countWords, figureName, medianOf, plainUnit, rangeOf } from '@/components/figures/figure-words';
import { Crumbs, PageTitle, Section } from '@/components/layout/headings';
import { Fact, Margin } from '@/components/layout/margin';
import { Empty } from '@/components/layout/notices';
import { Sheet } from '@/components/layout/sheet';
import { Caution } from '@/components/ui/caution';
import { loadCategoryBySlug } from '@/lib/catalogue/loaders';
import { loadDevicesOfCategoryWithFigures, loadFiguresOfCategory } from '@/lib/figures/loaders';

export const dynamic = 'force-static';
export const generateStaticParams = () => [];

interface CategoryPageProps {
  params: Promise<{ slug: string }>;
}

export async function generateMetadata({ params }: CategoryPageProps): Promise<Metadata> {
  const { slug } = await params;
  const found = await loadCategoryBySlug(slug);
  if (found.kind !== 'found') return {};
  return {
    title: `${found.value.name}: what such a device draws`,
    description: found.value.summary,
    alternates: { canonical: `/categories/${slug}` },
  };
}

export default async function CategoryPage({ params }: CategoryPageProps) {
  const { slug } = await params;
  const found = await loadCategoryBySlug(slug);
  if (found.kind === 'missing') notFound();
  if (found.kind === 'moved') permanentRedirect(`/categories/${found.slug}`);
  const category = found.value;
  const [figures, devices] = await Promise.all([
    loadFiguresOfCategory(category.id),
    loadDevicesOfCategoryWithFigures(category.id),
  ]);
  const headline = figures.find((figure) => figure.isHeadline);
  const others = figures.filter((figure) => figure.isMain && figure !== headline && figure.quantity === 'mean-power');
  return (
    <Sheet
      head={
        <>
          <Crumbs trail={[{ name: 'Categories', href: '/categories' }]} />
          <PageTitle lead={category.summary}>{category.name}</PageTitle>
        </>
      }
      margin={
        <Margin>
          {headline && (
            <Fact
              label={figureName(headline)}
              figure={`${medianOf(headline).value} ${plainUnit(medianOf(headline).unit)}`}
            >
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
      }
    >
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
    </Sheet>
  );
}
