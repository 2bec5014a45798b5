import type { Metadata } from 'next';
import { MyReport } from '@/components/reports/my-report';

export const metadata: Metadata = { title: 'My report', robots: 'noindex' };

interface MyReportPageProps {
  params: Promise<{ id: string }>;
}

/** The same page for everybody: who may see the report is decided where it is fetched. */
export default async function MyReportPage({ params }: MyReportPageProps) {
  const { id } = await params;
  return <MyReport publicId={id} />;
}
