import type { Metadata } from 'next';
import { ErrorPage } from '@/components/layout/error-page';
import { LinkButton } from '@/components/ui/button';

export const metadata: Metadata = { title: 'Nothing is here' };

export default function NotFound() {
  return (
    <ErrorPage title="Nothing is here" safe="The address may be mistyped, or what stood here may have been removed.">
      <LinkButton href="/" look="main">
        Search the site
      </LinkButton>
      <LinkButton href="/devices">See all devices</LinkButton>
    </ErrorPage>
  );
}
