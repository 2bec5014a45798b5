import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { CategoryList } from '../_components/category-list';
import { DeviceList } from '../_components/device-list';
import { Home } from '../_components/home';

// Pages without a parameter of their own are reached by a rewrite onto this one: a fixed static path would be rendered
// at build time, and a build has no database.
export const dynamic = 'force-static';
export const generateStaticParams = () => [];

const PAGES: Record<
  string,
  { path: string; title: Metadata['title']; description: string; Body: () => Promise<React.ReactNode> }
> = {
  home: {
    path: '/',
    title: { absolute: 'Wattcairn: what devices really draw' },
    description: 'What electrical devices really draw, measured by many households and set beside the maker’s claim.',
    Body: Home,
  },
  devices: {
    path: '/devices',
    title: 'Devices',
    description: 'Every device with its typical draw: median, range and how many contributors stand behind it.',
    Body: DeviceList,
  },
  categories: {
    path: '/categories',
    title: 'Categories',
    description: 'Kinds of device with what one of them draws, and how such a device is measured.',
    Body: CategoryList,
  },
};

interface FrontPageProps {
  params: Promise<{ page: string }>;
}

export async function generateMetadata({ params }: FrontPageProps): Promise<Metadata> {
  const page = PAGES[(await params).page];
  if (!page) return {};
  const { title, description, path } = page;
  return { title, description, alternates: { canonical: path } };
}

export default async function FrontPage({ params }: FrontPageProps) {
  const page = PAGES[(await params).page];
  if (!page) notFound();
  return <page.Body />;
}
