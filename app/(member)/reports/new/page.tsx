import type { Metadata } from 'next';
import { Suspense } from 'react';
import { SignedInOnly } from '@/components/account/signed-in-only';
import { PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';
import { EditorLoader } from '@/components/reports/editor/editor-loader';

export const metadata: Metadata = { title: 'Add a measurement', robots: 'noindex' };

export default function NewReportPage() {
  return (
    <Sheet head={<PageTitle>Add a measurement</PageTitle>}>
      <Suspense>
        <SignedInOnly>
          <EditorLoader />
        </SignedInOnly>
      </Suspense>
    </Sheet>
  );
}
