import { dayWords } from '@/components/figures/figure-words';
import type { ReportView } from '@/lib/reports/schema';

const VERDICTS = { verified: 'Verified', 'changes-requested': 'Changes requested', declined: 'Declined' } as const;

interface CheckedItem {
  key: string;
  result: string;
  remark?: string;
}

/** Who checked what, and what came of it. */
export function ReportReviews({ report }: { report: ReportView }) {
  if (report.reviews.length === 0) return <p className="mt-3 text-muted">No moderator has decided yet.</p>;
  const labelOf = (key: string) => report.method.checklist.find((item) => item.key === key)?.label ?? key;
  return report.reviews.map((review) => {
    const items = Array.isArray(review.checklist) ? (review.checklist as CheckedItem[]) : [];
    return (
      <div key={`${review.revision} ${review.at} ${review.slot}`} className="border-b border-rule py-4">
        <p>
          <span className="font-semibold">{VERDICTS[review.verdict]}</span> by {review.reviewer}, {dayWords(review.at)},
          revision {review.revision}
        </p>
        {review.reason && <p className="mt-1 max-w-prose">{review.reason}</p>}
        <ul className="mt-2 text-note">
          {items.map((item) => (
            <li key={item.key}>
              {labelOf(item.key)}: {item.result.replaceAll('-', ' ')}
              {item.remark && `. ${item.remark}`}
            </li>
          ))}
        </ul>
        {review.remarks.length > 0 && (
          <ul className="mt-2 list-disc pl-5 text-note">
            {review.remarks.map(({ pointer, remark }) => (
              <li key={`${pointer} ${remark}`}>
                <span className="font-mono text-cell">{pointer}</span>: {remark}
              </li>
            ))}
          </ul>
        )}
      </div>
    );
  });
}
