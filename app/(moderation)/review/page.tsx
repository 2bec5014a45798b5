import type { Metadata } from 'next';
import { PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';
import { ModeratorsOnly } from '@/components/review/moderators-only';
import { ReviewQueue } from '@/components/review/review-queue';

export const metadata: Metadata = { title: 'Review', robots: 'noindex' };

export default function ReviewPage() {
  return (
    <Sheet head={<PageTitle>Review</PageTitle>}>
      <div className="mt-5">
        <ModeratorsOnly>
          <ReviewQueue />
        </ModeratorsOnly>
      </div>
    </Sheet>
  );
}
