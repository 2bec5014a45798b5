import type { Metadata } from 'next';
import { notFound, permanentRedirect } from 'next/navigation';
import { OutcomeLine } from '@/components/claims/outcome-line';
import { Crumbs, PageTitle, Section } from '@/components/layout/headings';
import { Empty } from '@/components/layout/notices';
import { Sheet } from '@/components/layout/sheet';
import { LinkButton } from '@/components/ui/button';
import { figureName, medianOf, plainUnit, voicesOf } from '@/components/figures/figure-words';
import { ReportTable } from '@/components/reports/reading/report-table';
import { loadDeviceSheet } from './_components/load-device-sheet';
import { DeviceFacts } from './_components/device-facts';
import { DeviceFigures } from './_components/device-figures';
import { DeviceLead } from './_components/device-lead';
import { InYourHome } from './_components/in-your-home';

export const dynamic = 'force-static';
export const generateStaticParams = () => [];

interface DevicePageProps {
  params: Promise<{ slug: string }>;
}

export async function generateMetadata({ params }: DevicePageProps): Promise<Metadata> {
  const { slug } = await params;
  const sheet = await loadDeviceSheet(slug);
  if (sheet.kind !== 'found') return {};
  const { device, figures } = sheet;
  const headline = figures.find((figure) => figure.isHeadline);
  const finding = headline
    ? `${figureName(headline)}: ${medianOf(headline).value} ${plainUnit(medianOf(headline).unit)}, median of ${voicesOf(headline)}.`
    : 'Not measured yet.';
  return {
    title: `${device.name}: what it really draws`,
    description: `${finding} ${device.category.name} by ${device.maker}.`,
    alternates: { canonical: `/devices/${slug}` },
  };
}

export default async function DevicePage({ params }: DevicePageProps) {
  const { slug } = await params;
  const sheet = await loadDeviceSheet(slug);
  if (sheet.kind === 'missing') notFound();
  if (sheet.kind === 'moved') permanentRedirect(`/devices/${sheet.slug}`);
  const { device, category, figures, besides, reports } = sheet;
  const measure = `/reports/new?device=${device.publicId}`;
  return (
    <Sheet
      head={
        <>
          <Crumbs
            trail={[
              ...(category.parent ? [{ name: category.parent.name }] : []),
              { name: category.name, href: `/categories/${category.slug}` },
              { name: device.maker },
            ]}
          />
          <PageTitle lead={<DeviceLead category={category} figures={figures} />}>{device.name}</PageTitle>
          {besides.map((beside) => (
            <OutcomeLine key={beside.claim.publicId} beside={beside} />
          ))}
        </>
      }
      margin={<DeviceFacts devicePublicId={device.publicId} {...{ category, figures, besides }} />}
    >
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
      <LinkButton look="main" href={measure} className="mt-6">
        Add your measurement
      </LinkButton>
    </Sheet>
  );
}
