import Link from 'next/link';
import { dayWords } from '@/components/figures/figure-words';
import { Fact, Margin } from '@/components/layout/margin';
import { INSTRUMENT_KINDS, STATE_WORDS, type ReportView } from '@/lib/reports/schema';
import { reportFigureName, reportFigureText } from './report-figures';

/** The margin of a report: its headline figure, who, when, with what, and where it stands. */
export function ReportFacts({ report }: { report: ReportView }) {
  const headline = report.figures[0];
  const { instrument, method } = report;
  return (
    <Margin>
      {headline && (
        <Fact label={reportFigureName(headline)} figure={reportFigureText(headline)}>
          expanded uncertainty, k = 2
        </Fact>
      )}
      <Fact label="State">{STATE_WORDS[report.state]}</Fact>
      <Fact label="Measured by">
        {report.member.name}, from {dayWords(report.content.measuredOn)}
      </Fact>
      <Fact label="Instrument">
        {INSTRUMENT_KINDS[instrument.kind]}, {instrument.modelName}: ±{instrument.percentOfReading} % of reading
        {instrument.percentOfRange > 0 && ` + ${instrument.percentOfRange} % of range`}
        {instrument.counts > 0 && ` + ${instrument.counts} counts`}
        {instrument.lowerLimitWatts !== null && `; reads from ${instrument.lowerLimitWatts} W`}
        {!instrument.readsTruePower && '; no true power'}
      </Fact>
      <Fact label="Method">{method.name}</Fact>
      <Fact label="Device">
        <Link href={`/devices/${report.device.slug}`} className="text-lichen underline underline-offset-4">
          {report.device.name}
        </Link>
        {report.variant && `, ${report.variant}`}
      </Fact>
    </Margin>
  );
}
