import type { Metadata } from 'next';
import { SignUpForm } from '@/components/account/sign-up-form';
import { PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';

export const metadata: Metadata = { title: 'Make an account', referrer: 'no-referrer' };

export default function SignUpPage() {
  return (
    <Sheet
      head={
        <PageTitle lead="Reading needs no account. With one you add your own measurements to the pile.">
          Make an account
        </PageTitle>
      }
    >
      <SignUpForm />
    </Sheet>
  );
}
