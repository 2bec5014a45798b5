import type { Metadata } from 'next';
import { Suspense } from 'react';
import { SignInForm } from '@/components/account/sign-in-form';
import { PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';

export const metadata: Metadata = { title: 'Sign in', referrer: 'no-referrer' };

export default function SignInPage() {
  return (
    <Sheet head={<PageTitle>Sign in</PageTitle>}>
      <Suspense>
        <SignInForm />
      </Suspense>
    </Sheet>
  );
}
