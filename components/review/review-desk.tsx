'use client';

import { useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import { useState } from 'react';
import { Crumbs, PageTitle, Section } from '@/components/layout/headings';
import { Notice } from '@/components/layout/notices';
import { Sheet } from '@/components/layout/sheet';
import { MyReports } from '@/components/account/my-reports';
import { ReportBody } from '@/components/reports/reading/report-body';
import { ReportFacts } from '@/components/reports/reading/report-facts';
import { Skeleton } from '@/components/ui/skeleton';
import { callApi } from '@/lib/platform/http/call-api';
import { STATE_WORDS } from '@/lib/reports/schema';
import { desk, type VerdictResult } from '@/lib/review/schema';
import { FigureEffect } from './figure-effect';
import { VerdictForm } from './verdict-form';

/** A report under review: what to look at first, the report itself, the checklist, and what a verdict changed. */
export function ReviewDesk({ publicId }: { publicId: string }) {
  const [decided, setDecided] = useState<VerdictResult | null>(null);
  const { data, error } = useQuery({
    queryKey: ['review-desk', publicId],
    queryFn: () => callApi(`/api/v1/review/reports/${publicId}`, { answer: desk }),
    // A desk must not change under the moderator's eyes; a verdict on an older revision is refused anyway.
    refetchOnWindowFocus: false,
  });
  const crumbs = <Crumbs trail={[{ name: 'Review', href: '/review' }]} />;
  if (error) {
    return (
      <Sheet
        head={
          <>
            {crumbs}
            <PageTitle>Review</PageTitle>
          </>
        }
      >
        <Notice tone="warning" role="alert" title="This report can’t be opened">
          {error.message}
        </Notice>
      </Sheet>
    );
  }
  if (!data) {
    return (
      <Sheet head={<PageTitle>Review</PageTitle>}>
        <Skeleton label="Loading the report" lines={8} />
      </Sheet>
    );
  }
  const { report, warnings } = data;
  return (
    <Sheet
      head={
        <>
          {crumbs}
          <PageTitle lead={`Measured by ${report.member.name}, revision ${report.revision}.`}>
            {report.device.name}
          </PageTitle>
        </>
      }
      margin={<ReportFacts report={report} />}
    >
      {decided && <FigureEffect result={decided} deviceName={report.device.name} deviceSlug={report.device.slug} />}
      {!data.isWaiting && !decided && (
        <Notice title="It waits for no verdict">It is {STATE_WORDS[report.state]}.</Notice>
      )}
      <Section title="Look at this first" ruled={false}>
        {warnings.length === 0 ? (
          <p className="mt-1 text-muted">Nothing stands out.</p>
        ) : (
          <ul className="mt-2 space-y-2">
            {warnings.map((warning) => (
              <li key={`${warning.kind} ${warning.message}`} className="max-w-prose border-l-3 border-rust pl-4">
                {warning.message}
              </li>
            ))}
          </ul>
        )}
      </Section>
      <ReportBody report={report} />
      {data.otherReports.length > 0 && (
        <Section title={`Other reports of ${report.member.name}`}>
          <MyReports reports={data.otherReports} hrefOf={(other) => `/review/${other.publicId}`} />
        </Section>
      )}
      {data.isOwn && (
        <Notice tone="warning" title="Your own report">
          Another moderator decides it; nobody verifies their own.
        </Notice>
      )}
      {data.isWaiting && !data.isOwn && !decided && (
        <Section title="Verdict">
          <VerdictForm report={report} warnings={warnings} onDecided={setDecided} />
        </Section>
      )}
      <p className="mt-8">
        <Link href="/review" className="text-lichen underline underline-offset-4">
          Back to the queue
        </Link>
      </p>
    </Sheet>
  );
}
