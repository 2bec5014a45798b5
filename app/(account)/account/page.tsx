import type { Metadata } from 'next';
import { AccountOverview } from '@/components/account/account-overview';
import { SignedInOnly } from '@/components/account/signed-in-only';
import { PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';

export const metadata: Metadata = { title: 'My account', robots: 'noindex' };

export default function AccountPage() {
  return (
    <Sheet head={<PageTitle>My account</PageTitle>}>
      <SignedInOnly>
        <AccountOverview />
      </SignedInOnly>
    </Sheet>
  );
}
