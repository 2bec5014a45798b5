import type { Metadata } from 'next';
import { notFound, permanentRedirect } from 'next/navigation';
import { Crumbs, PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';
import { loadCategoryBySlug } from '@/lib/catalogue/loaders';
import { loadDevicesOfCategoryWithFigures, loadFiguresOfCategory } from '@/lib/figures/loaders';
import { CategoryFacts } from './_components/category-facts';
import { CategorySheet } from './_components/category-sheet';

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
  return (
    <Sheet
      head={
        <>
          <Crumbs trail={[{ name: 'Categories', href: '/categories' }]} />
          <PageTitle lead={category.summary}>{category.name}</PageTitle>
        </>
      }
      margin={<CategoryFacts category={category} headline={figures.find((figure) => figure.isHeadline)} />}
    >
      <CategorySheet {...{ category, figures, devices }} />
    </Sheet>
  );
}
