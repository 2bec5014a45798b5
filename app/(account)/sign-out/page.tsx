import type { Metadata } from 'next';
import { SignOutButton } from '@/components/account/sign-out-button';
import { PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';

export const metadata: Metadata = { title: 'Sign out', robots: 'noindex' };

export default function SignOutPage() {
  return (
    <Sheet head={<PageTitle lead="Drafts that were saved stay saved.">Sign out</PageTitle>}>
      <div className="mt-6">
        <SignOutButton />
      </div>
    </Sheet>
  );
}
