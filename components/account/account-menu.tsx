'use client';

import { useState } from 'react';
import Link from 'next/link';
import { useQuery } from '@tanstack/react-query';

interface SessionAnswer {
  member: { id: string; name: string; role: 'member' | 'moderator' | 'admin' } | null;
}

async function fetchSession(): Promise<SessionAnswer> {
  const response = await fetch('/api/v1/session', { headers: { accept: 'application/json' } });
  if (!response.ok) throw new Error(`The session could not be read: ${response.status}`);
  return (await response.json()) as SessionAnswer;
}

const item = 'target flex items-center border-t border-rule px-4 whitespace-nowrap hover:underline';

/** The signed-in corner. Pages are the same for everybody, so who is reading is asked by the browser. */
export function AccountMenu() {
  const { data } = useQuery({ queryKey: ['session'], queryFn: fetchSession });
  const [open, setOpen] = useState(false);
  const member = data?.member;
  if (!member) {
    return (
      <Link href="/sign-in" className="flex target items-center underline-offset-4 hover:underline">
        Sign in
      </Link>
    );
  }
  return (
    <div
      className="relative"
      onKeyDown={(event) => event.key === 'Escape' && setOpen(false)}
      onBlur={(event) => !event.currentTarget.contains(event.relatedTarget) && setOpen(false)}
    >
      <button
        type="button"
        aria-expanded={open}
        aria-controls="account-menu"
        onClick={() => setOpen(!open)}
        className="flex target items-center underline-offset-4 hover:underline"
      >
        Account
      </button>
      <div
        id="account-menu"
        hidden={!open}
        className="absolute top-full right-0 z-20 rounded border border-ink bg-sheet"
      >
        <p className="px-4 py-2 text-caption text-muted">{member.name}</p>
        <Link className={item} href="/reports/new">
          Add a measurement
        </Link>
        {member.role !== 'member' && (
          <Link className={item} href="/review">
            Review
          </Link>
        )}
        <Link className={item} href="/account">
          Account
        </Link>
        <Link className={item} href="/sign-out" prefetch={false}>
          Sign out
        </Link>
      </div>
    </div>
  );
}
