'use client';

import { useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import { z } from 'zod';
import { Notice } from '@/components/layout/notices';
import { Section } from '@/components/layout/headings';
import { LinkButton } from '@/components/ui/button';
import { Skeleton } from '@/components/ui/skeleton';
import { account } from '@/lib/members/schema';
import { callApi } from '@/lib/platform/http/call-api';
import { reportListItem } from '@/lib/reports/schema';
import { MyReports } from './my-reports';
import { OpenSessions } from './open-sessions';
import { ProfileForm } from './profile-form';

const drafts = z.object({
  drafts: z.array(
    z.object({ publicId: z.string(), updatedAt: z.string(), content: z.record(z.string(), z.unknown()) }),
  ),
});

/** Everything that belongs to the member: reports, drafts, profile, sessions. */
export function AccountOverview() {
  const mine = useQuery({ queryKey: ['account'], queryFn: () => callApi('/api/v1/account', { answer: account }) });
  const reports = useQuery({
    queryKey: ['my-reports'],
    queryFn: () => callApi('/api/v1/reports', { answer: z.object({ reports: z.array(reportListItem) }) }),
  });
  const open = useQuery({ queryKey: ['my-drafts'], queryFn: () => callApi('/api/v1/drafts', { answer: drafts }) });
  if (mine.isPending) return <Skeleton label="Loading your account" lines={6} />;
  if (mine.isError) {
    return (
      <Notice tone="warning" role="alert" title="Your account could not be loaded">
        {mine.error.message}
      </Notice>
    );
  }
  return (
    <>
      <Section
        title="My measurements"
        aside={
          <Link href="/reports/new" className="text-lichen underline underline-offset-4">
            Add a measurement
          </Link>
        }
      >
        {reports.data ? <MyReports reports={reports.data.reports} /> : <Skeleton label="Loading your reports" />}
      </Section>
      {open.data && open.data.drafts.length > 0 && (
        <Section title="Drafts">
          <ul>
            {open.data.drafts.map((draft) => (
              <li
                key={draft.publicId}
                className="flex flex-wrap items-center justify-between gap-4 border-b border-rule py-3"
              >
                <span>
                  {typeof draft.content.deviceName === 'string' && draft.content.deviceName
                    ? draft.content.deviceName
                    : 'A device not chosen yet'}
                  <span className="block text-caption text-muted">
                    saved {new Date(draft.updatedAt).toLocaleString()}
                  </span>
                </span>
                <LinkButton href={`/reports/new?draft=${draft.publicId}`}>Go on</LinkButton>
              </li>
            ))}
          </ul>
        </Section>
      )}
      <Section title="Profile">
        <ProfileForm account={mine.data} />
      </Section>
      <Section title="Where I am signed in">
        <OpenSessions account={mine.data} />
      </Section>
    </>
  );
}
