import type { Metadata } from 'next';
import Link from 'next/link';
import { PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';
import { GUIDES } from './_content/guides';

export const metadata: Metadata = {
  title: 'Guides',
  description: 'Units, safety, how to read a published figure and how the figures are made.',
  alternates: { canonical: '/guides' },
};

const FIGURES = {
  slug: 'how-the-figures-are-made',
  title: 'How the figures are made',
  lead: 'Each rule in plain words, with an example that the site’s own code works out.',
};

export default function GuidesPage() {
  return (
    <Sheet head={<PageTitle lead="What helps to measure well and to read what others measured.">Guides</PageTitle>}>
      <ul className="mt-6 border-t border-rule">
        {[...GUIDES.slice(0, 3), FIGURES, ...GUIDES.slice(3)].map((guide) => (
          <li key={guide.slug} className="border-b border-rule py-4">
            <Link href={`/guides/${guide.slug}`} className="font-semibold text-lichen underline underline-offset-4">
              {guide.title}
            </Link>
            <p className="max-w-prose text-note">{guide.lead}</p>
          </li>
        ))}
      </ul>
    </Sheet>
  );
}
