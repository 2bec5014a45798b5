'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { Notice } from '@/components/layout/notices';
import { Button, LinkButton } from '@/components/ui/button';
import { account, type Account } from '@/lib/members/schema';
import { callApi } from '@/lib/platform/http/call-api';

export function OpenSessions({ account: mine }: { account: Account }) {
  const client = useQueryClient();
  const end = useMutation({
    mutationFn: (id: number) => callApi(`/api/v1/account/sessions/${id}`, { method: 'DELETE', answer: account }),
    onSuccess: (now) => client.setQueryData(['account'], now),
  });
  return (
    <>
      {end.isError && (
        <Notice tone="warning" role="alert">
          {end.error.message}
        </Notice>
      )}
      <ul>
        {mine.sessions.map((session) => {
          const opened = new Date(session.openedAt).toLocaleString();
          return (
            <li
              key={session.id}
              className="flex flex-wrap items-center justify-between gap-4 border-b border-rule py-3"
            >
              <span>
                {session.isThisOne ? 'This browser' : 'Another browser'}
                <span className="block text-caption text-muted">signed in {opened}</span>
              </span>
              {session.isThisOne ? (
                <LinkButton href="/sign-out">Sign out</LinkButton>
              ) : (
                <Button
                  busy={end.isPending}
                  onClick={() => end.mutate(session.id)}
                  aria-label={`End the session of ${opened}`}
                >
                  End it
                </Button>
              )}
            </li>
          );
        })}
      </ul>
    </>
  );
}
