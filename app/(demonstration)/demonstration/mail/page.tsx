import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { connection } from 'next/server';
import { PageTitle } from '@/components/layout/headings';
import { Empty } from '@/components/layout/notices';
import { Sheet } from '@/components/layout/sheet';
import { runsAsDemonstration } from '@/lib/platform/env';
import { caughtMail } from '@/lib/platform/mail/caught-mail';

export const metadata: Metadata = { title: 'Mail of the demonstration', robots: 'noindex' };

const LINK = /(https?:\/\/\S+)/;

/** Only the demonstration has this page: it stands in for everybody's mailbox. */
export default async function CaughtMailPage() {
  await connection();
  if (!runsAsDemonstration()) notFound();
  const letters = await caughtMail();
  return (
    <Sheet
      head={
        <PageTitle lead="This demonstration sends no mail. What it would have sent stands here, the latest first.">
          Mail of the demonstration
        </PageTitle>
      }
    >
      {letters.length === 0 && <Empty title="No letter yet.">Make an account, and its letter comes here.</Empty>}
      {letters.map((letter) => (
        <article key={letter.id} className="border-b border-rule py-5">
          <h2 className="text-subheading">{letter.subject}</h2>
          <p className="text-caption text-muted">
            to {letter.to}, {letter.at.slice(0, 16).replace('T', ' ')} UTC
          </p>
          <p className="mt-2 max-w-prose wrap-anywhere whitespace-pre-line">
            {letter.text.split(LINK).map((part, i) =>
              LINK.test(part) ? (
                <a key={i} href={part} className="text-lichen underline underline-offset-4">
                  {part}
                </a>
              ) : (
                part
              ),
            )}
          </p>
        </article>
      ))}
    </Sheet>
  );
}
