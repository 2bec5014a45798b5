'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useState } from 'react';
import { FormProvider, useForm, useWatch } from 'react-hook-form';
import { z } from 'zod';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { ApiProblem, callApi } from '@/lib/platform/http/call-api';
import { STEPS, type EditorValues, type StepKey } from './editor-values';
import { SaveNote } from './save-note';
import { StepCheck } from './step-check';
import { StepConditions } from './step-conditions';
import { StepDevice } from './step-device';
import { StepInstrument } from './step-instrument';
import { StepNav } from './step-nav';
import { StepNotes } from './step-notes';
import { StepPhotos } from './step-photos';
import type { StepProps } from './step-props';
import { StepReadings } from './step-readings';
import { fieldOf, stepOf, toSubmission, type EditorProblem } from './to-submission';
import { useDraft } from './use-draft';
import type { EditorData } from './use-editor-data';

const BODIES: Record<StepKey, (props: StepProps) => React.ReactNode> = {
  device: StepDevice,
  instrument: StepInstrument,
  conditions: StepConditions,
  readings: StepReadings,
  photos: StepPhotos,
  notes: StepNotes,
  check: StepCheck,
};

interface ReportEditorProps {
  data: EditorData;
  initial: { publicId: string | null; version: number; values: EditorValues };
  amendsPublicId: string | null;
}

/** The editor: steps in any order, saved as one types, nothing lost on the way. */
export function ReportEditor({ data, initial, amendsPublicId }: ReportEditorProps) {
  const router = useRouter();
  const form = useForm<EditorValues>({ defaultValues: initial.values });
  const { state, saver } = useDraft(initial);
  const [step, setStep] = useState<StepKey>('device');
  const [problems, setProblems] = useState<EditorProblem[]>([]);
  const [attempt, setAttempt] = useState(0);
  const [sending, setSending] = useState(false);
  useEffect(
    () =>
      form.subscribe({ formState: { values: true }, callback: ({ values }) => saver.save(structuredClone(values)) }),
    [form, saver],
  );

  const [devicePublicId, categoryPublicId, proposesDevice] = useWatch({
    control: form.control,
    name: ['devicePublicId', 'categoryPublicId', 'proposesDevice'],
  });
  const device = data.devices.find((known) => known.publicId === devicePublicId);
  const category = data.categories.find((known) =>
    proposesDevice ? known.publicId === categoryPublicId : known.slug === device?.category.slug,
  );

  const show = (found: EditorProblem[]) => {
    setProblems(found);
    setAttempt((count) => count + 1);
    const [first] = found;
    if (first) setStep(first.step);
  };
  const send = async () => {
    const values = form.getValues();
    const read = toSubmission(values);
    if (!read.ok) return show(read.problems);
    setProblems([]);
    setSending(true);
    try {
      const { publicId } = await callApi('/api/v1/reports', {
        method: 'POST',
        body: {
          clientKey: values.clientKey,
          draftPublicId: saver.publicId,
          amendsPublicId,
          submission: read.submission,
        },
        answer: z.object({ publicId: z.string() }),
      });
      saver.forget();
      router.push(`/reports/${publicId}/mine`);
    } catch (error) {
      setSending(false);
      show(problemsOfSending(error, values));
    }
  };

  const Body = BODIES[step];
  const at = STEPS.findIndex((known) => known.key === step);
  const next = STEPS[at + 1];
  const before = STEPS[at - 1];
  const errorOf = (field: string) => problems.find((problem) => problem.field === field)?.message;
  return (
    <FormProvider {...form}>
      <ErrorSummary errors={problems} attempt={attempt} onReveal={(field) => setStep(stepOf(field))} />
      <SaveNote
        state={state}
        mine={() => form.getValues()}
        onSettle={(version, values) => {
          form.reset(values);
          saver.settle(version, values);
        }}
      />
      <div className="lg:grid lg:grid-cols-[12rem_minmax(0,1fr)] lg:gap-10">
        <StepNav current={step} onStep={setStep} problems={problems} />
        <form
          noValidate
          onSubmit={(event) => {
            event.preventDefault();
            if (step === 'check') void send();
            else if (next) setStep(next.key);
          }}
        >
          <h2 className="text-heading" id={`step-${step}`}>
            {STEPS[at]?.title}
          </h2>
          <Body data={data} category={category} errorOf={errorOf} />
          <div className="mt-10 flex flex-wrap gap-4 border-t border-rule pt-5">
            {before && <Button onClick={() => setStep(before.key)}>Back to {before.title.toLowerCase()}</Button>}
            {next ? (
              <Button type="submit" look="main">
                Go on to {next.title.toLowerCase()}
              </Button>
            ) : (
              <Button type="submit" look="main" busy={sending}>
                {sending ? 'Sending …' : 'Send for review'}
              </Button>
            )}
          </div>
        </form>
      </div>
    </FormProvider>
  );
}

/** What the API refused, at the controls concerned. */
function problemsOfSending(error: unknown, values: EditorValues): EditorProblem[] {
  if (!(error instanceof ApiProblem)) {
    return [
      { field: 'check', step: 'check', message: 'Something went wrong in this page. The draft is safe; try again.' },
    ];
  }
  if (error.fields.length === 0) return [{ field: 'licenceAgreed', step: 'check', message: error.message }];
  return error.fields.map(({ pointer, message }) => {
    const path = pointer.split('/').slice(1);
    const field = fieldOf(path[0] === 'submission' ? path.slice(1) : path, values);
    return { field, step: stepOf(field), message };
  });
}
