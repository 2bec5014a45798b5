'use client';

import Link from 'next/link';
import { useState } from 'react';
import { useSession } from './session';

const item = 'target flex items-center border-t border-rule px-4 whitespace-nowrap hover:underline';

/** The signed-in corner. */
export function AccountMenu() {
  const { data } = useSession();
  const [open, setOpen] = useState(false);
  const member = data?.member;
  if (!member) {
    return (
      <Link href="/sign-in" className="flex target items-center whitespace-nowrap underline-offset-4 hover:underline">
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
        onClick={() => setOpen(false)}
        className="absolute top-full right-0 z-20 rounded border border-ink bg-sheet"
      >
        <p className="max-w-64 truncate px-4 py-2 text-caption text-muted">{member.name}</p>
        <Link className={item} href="/reports/new">
          Add a measurement
        </Link>
        {member.role !== 'member' && (
          <Link className={item} href="/review">
            Review
          </Link>
        )}
        <Link className={item} href="/account">
          My account
        </Link>
        <Link className={item} href="/sign-out" prefetch={false}>
          Sign out
        </Link>
      </div>
    </div>
  );
}
