'use client';

import { useState } from 'react';
import { z } from 'zod';
import { Notice } from '@/components/layout/notices';
import { Button, LinkButton } from '@/components/ui/button';
import { problemsOfAnswer } from '@/components/ui/form-problems';
import { callApi } from '@/lib/platform/http/call-api';

/**
 * Confirms by a press, not by opening the page: mail scanners open links. The secret stands behind the # of the address,
 * which no server and no log ever sees.
 */
export function ConfirmAddress() {
  const [state, setState] = useState<'asking' | 'sending' | 'done'>('asking');
  const [problem, setProblem] = useState<string | null>(null);
  const confirm = async () => {
    setState('sending');
    try {
      await callApi('/api/v1/confirmations', {
        method: 'POST',
        body: { secret: window.location.hash.slice(1) },
        answer: z.object({ message: z.string() }),
      });
      setState('done');
    } catch (error) {
      setProblem(problemsOfAnswer(error)[0]?.message ?? null);
      setState('asking');
    }
  };
  if (state === 'done') {
    return (
      <>
        <Notice role="status" title="Your address is confirmed">
          Your account is open.
        </Notice>
        <LinkButton href="/sign-in" look="main">
          Sign in
        </LinkButton>
      </>
    );
  }
  return (
    <>
      {problem && (
        <Notice tone="warning" role="alert" title="It is not confirmed">
          {problem}
        </Notice>
      )}
      <Button look="main" busy={state === 'sending'} onClick={() => void confirm()}>
        Confirm my address
      </Button>
    </>
  );
}
