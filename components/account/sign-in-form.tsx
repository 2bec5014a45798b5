'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useQueryClient } from '@tanstack/react-query';
import Link from 'next/link';
import { useRouter, useSearchParams } from 'next/navigation';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { problemsOf, type FormProblem } from '@/components/ui/form-problems';
import { TextInput } from '@/components/ui/inputs';
import { credentials } from '@/lib/auth/schema';
import { PasswordInput } from './password-input';
import { SESSION_KEY } from './session';

type Refusal = 'no-match' | 'too-often' | 'offline';

const REFUSALS: Record<Refusal, string> = {
  'no-match': 'No account has this address and this password. Check both; the address must be confirmed by its letter.',
  'too-often': 'That was too often in a short time. Wait a minute and try again.',
  offline: 'There is no connection to the site. What you typed stays here; try again.',
};

/** Signs in through next-auth's own route: its token first, then address and password. */
async function signIn(email: string, password: string): Promise<Refusal | null> {
  try {
    const { csrfToken } = (await (await fetch('/api/auth/csrf')).json()) as { csrfToken: string };
    const answer = await fetch('/api/auth/callback/credentials', {
      method: 'POST',
      headers: { 'content-type': 'application/x-www-form-urlencoded' },
      body: new URLSearchParams({ csrfToken, email, password, json: 'true' }),
    });
    if (answer.ok) return null;
    const { url } = (await answer.json()) as { url?: string };
    return decodeURIComponent(url ?? '').includes('too often') ? 'too-often' : 'no-match';
  } catch {
    return 'offline';
  }
}

/** Where to go afterwards: a path of ours, or home. "//elsewhere" and "\elsewhere" lead away. */
function ownPath(wanted: string | null): string {
  return wanted !== null && /^\/(?![/\\])[^\\]*$/.test(wanted) ? wanted : '/';
}

export function SignInForm() {
  const router = useRouter();
  const client = useQueryClient();
  const next = ownPath(useSearchParams().get('next'));
  const [refusal, setRefusal] = useState<FormProblem[]>([]);
  const [attempt, setAttempt] = useState(0);
  const form = useForm({
    resolver: zodResolver(credentials),
    defaultValues: { email: '', password: '' },
    shouldFocusError: false,
  });
  const { errors, isSubmitting } = form.formState;
  const submit = form.handleSubmit(
    async ({ email, password }) => {
      const problem = await signIn(email, password);
      if (problem) {
        setRefusal([{ field: 'email', message: REFUSALS[problem] }]);
        return setAttempt((count) => count + 1);
      }
      await client.invalidateQueries({ queryKey: SESSION_KEY });
      router.push(next);
    },
    () => {
      setRefusal([]);
      setAttempt((count) => count + 1);
    },
  );
  const problems = [...problemsOf(errors), ...refusal];
  return (
    <form noValidate onSubmit={submit} className="max-w-md">
      <ErrorSummary errors={problems} attempt={attempt} />
      <TextInput
        label="E-mail address"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <PasswordInput
        label="Password"
        autoComplete="current-password"
        error={errors.password?.message}
        {...form.register('password')}
      />
      <div className="mt-6 flex flex-wrap items-center gap-5">
        <Button type="submit" look="main" busy={isSubmitting}>
          {isSubmitting ? 'Signing in …' : 'Sign in'}
        </Button>
        <Link href="/sign-up" className="text-lichen underline underline-offset-4">
          Make an account
        </Link>
      </div>
    </form>
  );
}
