'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Notice } from '@/components/layout/notices';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { problemsOf, problemsOfAnswer, type FormProblem } from '@/components/ui/form-problems';
import { TextInput } from '@/components/ui/inputs';
import { account, profileInput, type Account } from '@/lib/members/schema';
import { callApi } from '@/lib/platform/http/call-api';
import { SESSION_KEY } from './session';

export function ProfileForm({ account: mine }: { account: Account }) {
  const client = useQueryClient();
  const [saved, setSaved] = useState(false);
  const [refused, setRefused] = useState<FormProblem[]>([]);
  const form = useForm({
    resolver: zodResolver(profileInput),
    defaultValues: { name: mine.name, region: mine.region ?? '' },
    shouldFocusError: false,
  });
  const { errors, isSubmitting } = form.formState;
  const submit = form.handleSubmit(async (input) => {
    setSaved(false);
    setRefused([]);
    try {
      client.setQueryData(
        ['account'],
        await callApi('/api/v1/account', {
          method: 'PATCH',
          body: { ...input, region: input.region ?? '' },
          answer: account,
        }),
      );
      await client.invalidateQueries({ queryKey: SESSION_KEY });
      setSaved(true);
    } catch (error) {
      setRefused(problemsOfAnswer(error));
    }
  });
  return (
    <form noValidate onSubmit={submit} className="max-w-md">
      <ErrorSummary errors={[...problemsOf(errors), ...refused]} />
      <p className="mt-4 text-note text-muted">
        {mine.email}, {mine.role} since {new Date(mine.memberSince).toLocaleDateString()}
      </p>
      <TextInput label="Name" autoComplete="name" error={errors.name?.message} {...form.register('name')} />
      <TextInput
        label="Region"
        optional
        hint="Coarse: an island, a county. Shown beside your reports."
        error={errors.region?.message}
        {...form.register('region')}
      />
      <Button type="submit" busy={isSubmitting}>
        Save the profile
      </Button>
      {saved && <Notice role="status">Saved.</Notice>}
    </form>
  );
}
