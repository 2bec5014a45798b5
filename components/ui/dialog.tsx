'use client';

import type { ReactNode } from 'react';
import { X } from 'lucide-react';
import { Dialog as Parts } from 'radix-ui';

interface DialogProps {
  title: string;
  description?: ReactNode;
  /** The button that opens it; left out where `open` is led from outside. */
  trigger?: ReactNode;
  open?: boolean;
  onOpenChange?: (open: boolean) => void;
  /** Content and its buttons; the main one last. */
  children?: ReactNode;
}

/** Keeps the focus inside, gives it back on closing, closes with Escape. */
export function Dialog({ title, description, trigger, open, onOpenChange, children }: DialogProps) {
  return (
    <Parts.Root open={open} onOpenChange={onOpenChange}>
      {trigger && <Parts.Trigger asChild>{trigger}</Parts.Trigger>}
      <Parts.Portal>
        <Parts.Overlay className="fixed inset-0 z-40 bg-paper/80" />
        <Parts.Content
          {...(description ? {} : { 'aria-describedby': undefined })}
          className="fixed top-1/2 left-1/2 z-50 max-h-[90dvh] w-[min(34rem,calc(100vw-2rem))] -translate-x-1/2 -translate-y-1/2 overflow-y-auto rounded-sheet border border-ink bg-sheet p-6 text-ink"
        >
          <div className="flex items-start justify-between gap-4">
            <Parts.Title className="text-heading">{title}</Parts.Title>
            <Parts.Close
              aria-label="Close"
              className="-mt-2 -mr-3 flex target w-11 items-center justify-center rounded"
            >
              <X aria-hidden="true" className="size-5" strokeWidth={1.75} />
            </Parts.Close>
          </div>
          {description && <Parts.Description className="mt-2 text-muted">{description}</Parts.Description>}
          <div className="mt-4">{children}</div>
        </Parts.Content>
      </Parts.Portal>
    </Parts.Root>
  );
}

/** Wrap a button of the dialog that closes it: "Keep it". */
export const DialogClose = Parts.Close;
