import { ReportTable } from '@/components/reports/reading/report-table';
import { Section } from '@/components/layout/headings';
import { Empty } from '@/components/layout/notices';
import { LinkButton } from '@/components/ui/button';
import { DeviceFigures } from './device-figures';
import { InYourHome } from './in-your-home';
import type { DeviceSheet } from './load-device-sheet';

type DeviceBodyProps = Omit<Extract<DeviceSheet, { kind: 'found' }>, 'kind'>;

/** Below the head: the figures, what they come to at home, and the reports behind them. */
export function DeviceBody({ device, category, figures, besides, reports }: DeviceBodyProps) {
  return (
    <>
      <Section title="What it draws">
        {figures.length > 0 ? (
          <DeviceFigures {...{ category, figures, besides }} />
        ) : (
          <Empty title="No one has measured this.">
            Plug a meter in between, note what it shows, and post it here.
          </Empty>
        )}
      </Section>
      <InYourHome category={category} figures={figures} />
      <Section title="Reports behind these figures">
        {reports.length > 0 ? (
          <ReportTable reports={reports} unit={category.basis.unit} quantityWords={category.basis.label} />
        ) : (
          <p className="mt-4 text-muted">None yet.</p>
        )}
      </Section>
      <LinkButton look="main" href={`/reports/new?device=${device.publicId}`} className="mt-6">
        Add your measurement
      </LinkButton>
    </>
  );
}
