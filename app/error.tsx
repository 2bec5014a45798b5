'use client';

import { ErrorPage } from '@/components/layout/error-page';
import { Button } from '@/components/ui/button';

export default function PageError({ reset }: { reset: () => void }) {
  return (
    <ErrorPage title="This page could not be made" safe="Nothing was lost; drafts that were saved stay saved.">
      <Button look="main" onClick={reset}>
        Try again
      </Button>
    </ErrorPage>
  );
}
