'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Notice } from '@/components/layout/notices';
import { Button } from '@/components/ui/button';
import { signOut } from './session';

export function SignOutButton() {
  const client = useQueryClient();
  const [state, setState] = useState<'here' | 'leaving' | 'gone' | 'failed'>('here');
  const leave = async () => {
    setState('leaving');
    try {
      await signOut(client);
      setState('gone');
    } catch {
      setState('failed');
    }
  };
  if (state === 'gone') {
    return (
      <Notice role="status" title="You are signed out">
        The session has ended on the server too.
      </Notice>
    );
  }
  return (
    <>
      {state === 'failed' && (
        <Notice tone="warning" role="alert" title="You are still signed in">
          There is no connection to the site. Try again.
        </Notice>
      )}
      <Button look="main" busy={state === 'leaving'} onClick={() => void leave()}>
        Sign out
      </Button>
    </>
  );
}
