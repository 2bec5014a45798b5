import Link from 'next/link';
import { Empty } from '@/components/layout/notices';
import { Badge } from '@/components/ui/badge';
import { Table, Td, Th, Tr } from '@/components/ui/table';
import { STATE_WORDS, type ReportListItem } from '@/lib/reports/schema';

const TONES: Partial<Record<ReportListItem['state'], 'good' | 'warning'>> = {
  verified: 'good',
  'changes-requested': 'warning',
  declined: 'warning',
};

interface MyReportsProps {
  reports: ReportListItem[];
  /** Where a report's line leads; to one's own view of it by default. */
  hrefOf?: (report: ReportListItem) => string;
}

export function MyReports({ reports, hrefOf = (report) => `/reports/${report.publicId}/mine` }: MyReportsProps) {
  if (reports.length === 0) {
    return (
      <Empty title="You have not sent a measurement yet.">
        <Link href="/reports/new" className="text-lichen underline underline-offset-4">
          Add the first one
        </Link>
      </Empty>
    );
  }
  return (
    <Table caption="Reports, the latest first">
      <thead>
        <tr>
          <Th>device</Th>
          <Th wide>measured</Th>
          <Th>state</Th>
        </tr>
      </thead>
      <tbody>
        {reports.map((report) => (
          <Tr key={report.publicId}>
            <Td>
              <Link href={hrefOf(report)} className="text-lichen underline underline-offset-4">
                {report.device}
              </Link>
            </Td>
            <Td wide>{report.measuredOn}</Td>
            <Td>
              <Badge tone={TONES[report.state] ?? 'quiet'}>{STATE_WORDS[report.state]}</Badge>
            </Td>
          </Tr>
        ))}
      </tbody>
    </Table>
  );
}
