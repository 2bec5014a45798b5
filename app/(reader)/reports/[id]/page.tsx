import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { ErrorPage } from '@/components/layout/error-page';
import { Crumbs, PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';
import { ReportBody } from '@/components/reports/reading/report-body';
import { ReportFacts } from '@/components/reports/reading/report-facts';
import { reportFigureName, reportFigureText } from '@/components/reports/reading/report-figures';
import { loadPublishedReport } from '@/lib/reports/loaders';

export const dynamic = 'force-static';
export const generateStaticParams = () => [];

interface ReportPageProps {
  params: Promise<{ id: string }>;
}

export async function generateMetadata({ params }: ReportPageProps): Promise<Metadata> {
  const { id } = await params;
  const loaded = await loadPublishedReport(id);
  if (loaded.kind !== 'found') return { title: 'Report', robots: 'noindex' };
  const { device, member } = loaded.report;
  return {
    title: `${device.name}, measured by ${member.name}`,
    description: `A verified measurement report of ${device.name}, with its trace, conditions and review record.`,
    alternates: { canonical: `/reports/${id}` },
  };
}

export default async function ReportPage({ params }: ReportPageProps) {
  const { id } = await params;
  const loaded = await loadPublishedReport(id);
  if (loaded.kind === 'missing') notFound();
  if (loaded.kind === 'withdrawn') {
    return (
      <ErrorPage title="This report was withdrawn" safe="Its member took it back; it counts nowhere any more.">
        <Link href="/devices" className="text-lichen underline underline-offset-4">
          See the devices
        </Link>
      </ErrorPage>
    );
  }
  const { report } = loaded;
  const headline = report.figures[0];
  return (
    <Sheet
      head={
        <>
          <Crumbs
            trail={[
              { name: report.device.category, href: `/categories/${report.device.categorySlug}` },
              { name: report.device.name, href: `/devices/${report.device.slug}` },
            ]}
          />
          <PageTitle
            lead={
              headline && (
                <>
                  {reportFigureName(headline)}: <strong className="font-semibold">{reportFigureText(headline)}</strong>.
                </>
              )
            }
          >
            {report.device.name}, measured by {report.member.name}
          </PageTitle>
        </>
      }
      margin={<ReportFacts report={report} />}
    >
      <ReportBody report={report} />
    </Sheet>
  );
}
