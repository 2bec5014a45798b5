import { Markdown } from '@/components/articles/markdown';
import { countWords, dayWords } from '@/components/figures/figure-words';
import { Section } from '@/components/layout/headings';
import { MEASURING_POINTS, PHOTO_KINDS, SUPPLY_CLASSES, type ReportView } from '@/lib/reports/schema';
import { ReportFigures } from './report-figures';
import { ReportReviews } from './report-reviews';
import { ReportTrace } from './report-trace';

/** A report in full: figures, trace, photos, conditions, review record. */
export function ReportBody({ report }: { report: ReportView }) {
  const { content } = report;
  const conditions: [string, string][] = [
    [
      'Supply',
      `${SUPPLY_CLASSES[content.supplyClass]}${content.supplyVolts === null ? '' : `, ${content.supplyVolts} V measured`}`,
    ],
    ...(content.hertz === null ? [] : [['Frequency', `${content.hertz} Hz`] as [string, string]]),
    [
      'Measured',
      `${MEASURING_POINTS[content.measuringPoint]}, ${content.isOnlyLoad ? 'the only load there' : 'not the only load there'}`,
    ],
    ...(content.ambientCelsius === null ? [] : [['Room', `${content.ambientCelsius} °C`] as [string, string]]),
    ...(content.unitLabel === null ? [] : [['This unit', content.unitLabel] as [string, string]]),
    ...Object.entries(content.conditions).map(([key, text]): [string, string] => [key.replaceAll('-', ' '), text]),
    ...(content.heldConstant === '' ? [] : [['Held constant', content.heldConstant] as [string, string]]),
  ];
  return (
    <>
      <Section title="Figures">
        <ReportFigures figures={report.figures} />
      </Section>
      {report.traces.map((trace) => (
        <Section key={trace.publicId} title="The trace" ruled={false}>
          <ReportTrace trace={trace} phases={content.phases} figures={report.figures} />
        </Section>
      ))}
      {report.photos.length > 0 && (
        <Section title="Photos">
          <ul className="mt-4 flex flex-wrap gap-6">
            {report.photos.map((photo) => (
              <li key={photo.publicId} className="max-w-72">
                <a href={`/api/v1/photos/${photo.publicId}/large`}>
                  {/* eslint-disable-next-line @next/next/no-img-element -- the image optimiser is off: photos come in two sizes of our own */}
                  <img
                    src={`/api/v1/photos/${photo.publicId}/small`}
                    width={photo.smallWidth}
                    height={photo.smallHeight}
                    alt={`${PHOTO_KINDS[photo.kind]}: ${photo.caption || 'no caption'}`}
                    loading="lazy"
                    className="rounded border border-rule"
                  />
                </a>
                <p className="mt-1 text-caption text-muted">
                  {PHOTO_KINDS[photo.kind]}
                  {photo.caption && `: ${photo.caption}`} ({photo.licence})
                </p>
              </li>
            ))}
          </ul>
        </Section>
      )}
      <Section title="Conditions">
        <dl className="mt-3 grid max-w-prose grid-cols-[9rem_1fr] gap-y-1.5 text-note">
          {conditions.map(([label, text]) => (
            <div key={label} className="contents">
              <dt className="text-muted first-letter:uppercase">{label}</dt>
              <dd className="wrap-anywhere">{text}</dd>
            </div>
          ))}
        </dl>
      </Section>
      {content.notes !== '' && (
        <Section title="Notes">
          <div className="mt-3">
            <Markdown>{content.notes}</Markdown>
          </div>
        </Section>
      )}
      <Section title="Review">
        <ReportReviews report={report} />
      </Section>
      <Section title="On the record" ruled={false}>
        <p className="mt-1 max-w-prose text-note">
          Revision {report.revision}, sent {dayWords(report.sentAt)}, {report.licence}. To cite it: {report.member.name}
          , “{report.device.name}”, Wattcairn report {report.publicId}, revision {report.revision},{' '}
          {dayWords(report.sentAt)}. It has {countWords(report.traces.length, 'trace')} and{' '}
          {countWords(report.photos.length, 'photo')}.
        </p>
        <p className="mt-2 font-mono text-cell wrap-anywhere text-muted">sha-256 {report.hash}</p>
      </Section>
    </>
  );
}
