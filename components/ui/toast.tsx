'use client';

import { Toaster as Parts } from 'sonner';

export { toast } from 'sonner';

/**
 * Short word of something done, with an undo where there is one; once in the layout of pages that use it. Errors never
 * go here: they stand beside what they concern and stay.
 */
export function Toaster() {
  return (
    <Parts
      position="bottom-center"
      duration={8000}
      toastOptions={{
        unstyled: true,
        classNames: {
          toast:
            'flex w-full items-center justify-between gap-4 rounded border border-ink bg-ink px-4 py-3 font-text! text-note text-paper',
          actionButton: 'target shrink-0 px-2 font-semibold whitespace-nowrap underline underline-offset-4',
          cancelButton: 'target shrink-0 px-2 whitespace-nowrap underline underline-offset-4',
        },
      }}
    />
  );
}
