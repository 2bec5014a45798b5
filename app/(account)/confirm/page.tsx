import type { Metadata } from 'next';
import { ConfirmAddress } from '@/components/account/confirm-address';
import { PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';

export const metadata: Metadata = { title: 'Confirm your address', referrer: 'no-referrer', robots: 'noindex' };

export default function ConfirmPage() {
  return (
    <Sheet head={<PageTitle lead="One press, and your account is open.">Confirm your address</PageTitle>}>
      <div className="mt-6">
        <ConfirmAddress />
      </div>
    </Sheet>
  );
}
