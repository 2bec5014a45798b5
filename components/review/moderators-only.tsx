'use client';

import type { ReactNode } from 'react';
import { SignedInOnly } from '@/components/account/signed-in-only';
import { useSession } from '@/components/account/session';

/** A page for moderators; others get a page that says so. What they may do is decided where it is done. */
export function ModeratorsOnly({ children }: { children: ReactNode }) {
  const { data } = useSession();
  return (
    <SignedInOnly>
      {data?.member?.role === 'member' ? (
        <p className="max-w-prose">
          Reports are reviewed by moderators. If you would like to be one, write to an admin: they look for members
          whose own reports were verified without a question.
        </p>
      ) : (
        children
      )}
    </SignedInOnly>
  );
}
