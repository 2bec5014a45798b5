import type { Metadata } from 'next';
import { ReviewDesk } from '@/components/review/review-desk';

export const metadata: Metadata = { title: 'Review of a report', robots: 'noindex' };

interface DeskPageProps {
  params: Promise<{ id: string }>;
}

/** The same page for everybody: who may open the report is decided where it is fetched. */
export default async function DeskPage({ params }: DeskPageProps) {
  const { id } = await params;
  return <ReviewDesk publicId={id} />;
}
