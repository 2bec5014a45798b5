import Link from 'next/link';
import { Badge } from '@/components/ui/badge';
import { RowMore, Table, Td, Th, Tr } from '@/components/ui/table';
import { dayWords, plainUnit } from '@/components/figures/figure-words';
import { formatDuration, formatFigure } from '@/lib/measurement/units/format-figure';
import { INSTRUMENT_KINDS, type ReportListItem } from '@/lib/reports/schema';

interface ReportTableProps {
  reports: ReportListItem[];
  /** Of the figure on the category's basis. */
  unit: string;
  /** "energy of a day" */
  quantityWords: string;
}

/** The reports behind a device's figures, each with its figure on the category's basis. */
export function ReportTable({ reports, unit, quantityWords }: ReportTableProps) {
  return (
    <Table caption="Reports behind these figures, the latest first">
      <thead>
        <tr>
          <Th>member</Th>
          <Th wide>measured</Th>
          <Th wide>instrument</Th>
          <Th numeric wide>
            duration
          </Th>
          <Th numeric>{quantityWords}</Th>
          <Th>state</Th>
        </tr>
      </thead>
      <tbody>
        {reports.map((report) => (
          <Row key={report.publicId} report={report} unit={unit} />
        ))}
      </tbody>
    </Table>
  );
}

function Row({ report, unit }: { report: ReportListItem; unit: string }) {
  const instrument = `${INSTRUMENT_KINDS[report.instrumentKind]} ±${report.percentOfReading} %`;
  const measured = report.measuredOn === null ? '' : dayWords(report.measuredOn);
  const duration = formatDuration(report.durationSeconds);
  const figure =
    report.value === null
      ? 'none on this basis'
      : formatFigure({
          value: report.censoredAt ?? report.value,
          standardUncertainty: report.standardUncertainty,
          unit: plainUnit(unit),
          atMost: report.censoredAt !== null,
        }).text;
  return (
    <>
      <Tr className="max-sm:border-0">
        <Td>
          <Link href={`/reports/${report.publicId}`} className="wrap-anywhere text-lichen underline underline-offset-4">
            {report.member}
          </Link>
        </Td>
        <Td wide className="whitespace-nowrap">
          {measured}
        </Td>
        <Td wide>{instrument}</Td>
        <Td numeric wide className="whitespace-nowrap">
          {duration}
        </Td>
        <Td numeric>{figure}</Td>
        <Td>
          <Badge tone={report.flagged || report.setAside ? 'warning' : 'good'}>
            verified
            {report.flagged && ', flagged'}
            {report.setAside && ', set aside'}
          </Badge>
        </Td>
      </Tr>
      <RowMore
        columns={3}
        of={report.member}
        facts={[
          { label: 'measured', value: measured },
          { label: 'instrument', value: instrument },
          { label: 'duration', value: duration },
        ]}
      />
    </>
  );
}
