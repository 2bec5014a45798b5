import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { Markdown } from '@/components/articles/markdown';
import { Crumbs, PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';
import { GUIDES } from '../_content/guides';

export const dynamic = 'force-static';
export const dynamicParams = false;
export const generateStaticParams = () => GUIDES.map(({ slug }) => ({ slug }));

interface GuidePageProps {
  params: Promise<{ slug: string }>;
}

const guideOf = (slug: string) => GUIDES.find((guide) => guide.slug === slug);

export async function generateMetadata({ params }: GuidePageProps): Promise<Metadata> {
  const { slug } = await params;
  const guide = guideOf(slug);
  return guide ? { title: guide.title, description: guide.lead, alternates: { canonical: `/guides/${slug}` } } : {};
}

export default async function GuidePage({ params }: GuidePageProps) {
  const guide = guideOf((await params).slug);
  if (!guide) notFound();
  return (
    <Sheet
      head={
        <>
          <Crumbs trail={[{ name: 'Guides', href: '/guides' }]} />
          <PageTitle lead={guide.lead}>{guide.title}</PageTitle>
        </>
      }
    >
      <div className="mt-6">
        <Markdown>{guide.body}</Markdown>
      </div>
    </Sheet>
  );
}
