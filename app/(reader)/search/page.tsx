import type { Metadata } from 'next';
import Link from 'next/link';
import { connection } from 'next/server';
import { DrawList } from '@/components/catalogue/draw-list';
import { countWords } from '@/components/figures/figure-words';
import { PageTitle, Section } from '@/components/layout/headings';
import { Empty } from '@/components/layout/notices';
import { Sheet } from '@/components/layout/sheet';
import { findDevices } from '@/lib/catalogue/loaders';
import { loadTypicalDraws } from '@/lib/figures/loaders';

export const metadata: Metadata = { title: 'Search', robots: 'noindex' };

interface SearchPageProps {
  searchParams: Promise<{ q?: string | string[] }>;
}

const MOST_HITS = 20;

/** What a search most likely means, each hit with its typical draw, those of one basis on one axis. */
export default async function SearchPage({ searchParams }: SearchPageProps) {
  await connection();
  const { q } = await searchParams;
  const query = (Array.isArray(q) ? (q[0] ?? '') : (q ?? '')).trim().slice(0, 100);
  const devices = await findDevices(query, MOST_HITS);
  const draws = await loadTypicalDraws(devices.map((device) => device.id));
  const hits = devices.map((device) => ({ device, figure: draws.get(device.id) ?? null }));
  const categories = [...new Set(devices.map((device) => device.category.name))];
  const title = query === '' ? 'Search' : `“${query}”`;
  return (
    <Sheet
      head={
        <PageTitle
          lead={
            query === ''
              ? 'Type a device, a maker, a model or a category above.'
              : `${countWords(hits.length, 'device')} found.`
          }
        >
          {title}
        </PageTitle>
      }
    >
      {query !== '' && hits.length === 0 && (
        <Empty title="Nothing is called that here.">
          Try fewer words, or the maker’s name alone. Not there? <Link href="/reports/new">Measure it and add it.</Link>
        </Empty>
      )}
      {categories.map((category) => (
        <Section key={category} title={category}>
          <DrawList hits={hits.filter((hit) => hit.device.category.name === category)} />
        </Section>
      ))}
    </Sheet>
  );
}
