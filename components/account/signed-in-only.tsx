'use client';

import { usePathname } from 'next/navigation';
import type { ReactNode } from 'react';
import { Notice } from '@/components/layout/notices';
import { LinkButton } from '@/components/ui/button';
import { Skeleton } from '@/components/ui/skeleton';
import { useSession } from './session';

/** Shows a page's content to whoever is signed in; permission is not an error, so others get a page that says how. */
export function SignedInOnly({ children }: { children: ReactNode }) {
  const { data, isPending, isError } = useSession();
  const path = usePathname();
  if (isPending) return <Skeleton label="Loading" lines={5} />;
  if (isError) {
    return (
      <Notice tone="warning" role="alert" title="The site does not answer">
        Check your connection and load the page again. Nothing was lost.
      </Notice>
    );
  }
  if (!data.member) {
    return (
      <>
        <p className="max-w-prose">This page is for members. Sign in, and you come back here.</p>
        <LinkButton look="main" href={`/sign-in?next=${encodeURIComponent(path)}`} className="mt-4">
          Sign in
        </LinkButton>
      </>
    );
  }
  return children;
}
