'use client';

import { useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import { useState } from 'react';
import { Empty, Notice } from '@/components/layout/notices';
import { Badge } from '@/components/ui/badge';
import { Select } from '@/components/ui/inputs';
import { Skeleton } from '@/components/ui/skeleton';
import { Table, Td, Th, Tr } from '@/components/ui/table';
import { callApi } from '@/lib/platform/http/call-api';
import { queue, type QueueItem } from '@/lib/review/schema';

const DAY_MS = 86_400_000;

/** "today", "3 days": how long a report has waited. */
export function waitWords(since: string, now = Date.now()): string {
  const days = Math.floor((now - Date.parse(since)) / DAY_MS);
  return days < 1 ? 'since today' : days === 1 ? '1 day' : `${days} days`;
}

/** What a moderator wants to know of a report before opening it. */
function marksOf(item: QueueItem): string[] {
  return [
    ...(item.isFirstOfMember ? ['first report of a new member'] : []),
    ...(item.isFirstOfDevice ? ['would be the first figure'] : []),
    ...(item.isResubmitted ? ['sent again'] : []),
    ...(item.device.isNew ? ['new device'] : []),
    ...(item.isOwn ? ['your own: another moderator decides'] : []),
  ];
}

/** The reports that wait, the longest first; their number and the age of the oldest always in view. */
export function ReviewQueue() {
  const [category, setCategory] = useState('');
  const { data, error } = useQuery({
    queryKey: ['review-queue', category],
    queryFn: () => callApi(`/api/v1/review/queue${category ? `?category=${category}` : ''}`, { answer: queue }),
    refetchInterval: 60_000,
    placeholderData: (before) => before,
  });
  if (error) {
    return (
      <Notice tone="warning" role="alert" title="The queue could not be loaded">
        {error.message}
      </Notice>
    );
  }
  if (!data) return <Skeleton label="Loading the queue" lines={6} />;
  return (
    <>
      <p role="status" className="text-note">
        <span className="font-mono text-fact">{data.count}</span> waiting
        {data.oldestSubmittedAt && `, the oldest for ${waitWords(data.oldestSubmittedAt)}`}
      </p>
      {data.categories.length > 1 && (
        <Select
          label="Category"
          name="category"
          className="max-w-64"
          value={category}
          onChange={(event) => setCategory(event.target.value)}
          options={[
            { value: '', label: 'all categories' },
            ...data.categories.map((known) => ({ value: known.slug, label: `${known.name} (${known.count})` })),
          ]}
        />
      )}
      {data.items.length === 0 ? (
        <Empty title="Nothing waits.">Every report that was sent has its verdict.</Empty>
      ) : (
        <Table caption="Reports that wait for a verdict, the longest first" className="mt-4">
          <thead>
            <tr>
              <Th>device</Th>
              <Th wide>member</Th>
              <Th wide>instrument</Th>
              <Th>waits</Th>
            </tr>
          </thead>
          <tbody>
            {data.items.map((item) => (
              <Tr key={item.publicId}>
                <Td>
                  <Link
                    href={`/review/${item.publicId}`}
                    className="font-semibold text-lichen underline underline-offset-4"
                  >
                    {item.device.name}
                  </Link>
                  <span className="block text-caption text-muted">{item.category.name}</span>
                  {marksOf(item).map((mark) => (
                    <span key={mark} className="block text-caption">
                      {mark}
                    </span>
                  ))}
                </Td>
                <Td wide className="max-w-52 wrap-anywhere">
                  {item.member.name}
                </Td>
                <Td wide>{item.instrument}</Td>
                <Td>
                  <Badge>{waitWords(item.submittedAt)}</Badge>
                </Td>
              </Tr>
            ))}
          </tbody>
        </Table>
      )}
    </>
  );
}
