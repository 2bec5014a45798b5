import type { Metadata } from 'next';
import { notFound, permanentRedirect } from 'next/navigation';
import { OutcomeLine } from '@/components/claims/outcome-line';
import { Crumbs, PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';
import { figureName, medianOf, plainUnit, voicesOf } from '@/components/figures/figure-words';
import { CLAIM_KIND_WORDS } from '@/lib/claims/schema';
import { loadDeviceSheet } from './_components/load-device-sheet';
import { DeviceFacts } from './_components/device-facts';
import { DeviceBody } from './_components/device-body';
import { DeviceLead } from './_components/device-lead';

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
            <OutcomeLine
              key={beside.claim.publicId}
              beside={beside}
              of={beside.figure ? figureName(beside.figure) : CLAIM_KIND_WORDS[beside.claim.kind]}
            />
          ))}
        </>
      }
      margin={<DeviceFacts devicePublicId={device.publicId} {...{ category, figures, besides }} />}
    >
      <DeviceBody {...{ device, category, figures, besides, reports }} />
    </Sheet>
  );
}
