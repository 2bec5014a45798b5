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

export function MyReports({ reports }: { reports: ReportListItem[] }) {
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
    <Table caption="My reports, the latest first">
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
              <Link href={`/reports/${report.publicId}/mine`} className="text-lichen underline underline-offset-4">
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
