'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Notice } from '@/components/layout/notices';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { problemsOf, problemsOfAnswer } from '@/components/ui/form-problems';
import { TextInput } from '@/components/ui/inputs';
import { passwordProblem } from '@/lib/auth/rules';
import { signUpInput } from '@/lib/members/schema';
import { callApi } from '@/lib/platform/http/call-api';
import { PasswordInput } from './password-input';

/** The handler's schema, and the password's rules, which need name and address. */
const schema = signUpInput.superRefine((input, context) => {
  const problem = passwordProblem(input.password, input);
  if (problem) context.addIssue({ code: 'custom', path: ['password'], message: problem });
});

export function SignUpForm() {
  const [told, setTold] = useState<string | null>(null);
  const [attempt, setAttempt] = useState(0);
  const form = useForm({
    resolver: zodResolver(schema),
    defaultValues: { name: '', email: '', password: '' },
    shouldFocusError: false,
  });
  const { errors, isSubmitting } = form.formState;
  const again = () => setAttempt((count) => count + 1);
  const submit = form.handleSubmit(async (input) => {
    try {
      const answer = await callApi('/api/v1/members', {
        method: 'POST',
        body: input,
        answer: z.object({ message: z.string() }),
      });
      setTold(answer.message);
    } catch (error) {
      for (const { field, message } of problemsOfAnswer(error)) {
        form.setError((field ?? 'root') as 'email', { message });
      }
      again();
    }
  }, again);
  if (told) {
    return (
      <Notice role="status" title="Look into your mailbox">
        {told} The link holds for a day.
      </Notice>
    );
  }
  const problems = [...problemsOf(errors), ...(errors.root?.message ? [{ message: errors.root.message }] : [])];
  return (
    <form noValidate onSubmit={submit} className="max-w-md">
      <ErrorSummary errors={problems} attempt={attempt} />
      <TextInput
        label="Name"
        hint="Stands beside your reports; it need not be your full one."
        autoComplete="name"
        error={errors.name?.message}
        {...form.register('name')}
      />
      <TextInput
        label="E-mail address"
        hint="Never shown. A letter with a link confirms it."
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <PasswordInput
        label="Password"
        hint="15 characters or more, any you like. Four unrelated words make a good one."
        autoComplete="new-password"
        error={errors.password?.message}
        {...form.register('password')}
      />
      <Button type="submit" look="main" busy={isSubmitting} className="mt-2">
        {isSubmitting ? 'Making the account …' : 'Make the account'}
      </Button>
    </form>
  );
}
