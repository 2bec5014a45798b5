'use client';

import { useState } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import { Notice } from '@/components/layout/notices';
import { Button } from '@/components/ui/button';
import { FieldError } from '@/components/ui/field';
import type { TraceDescription } from '@/lib/measurement/traces/import/types';
import type { TraceReadingAnswer } from '@/lib/reports/schema/trace';
import { emptyTyped, type EditorValues } from './editor-values';
import { FigurePreview } from './figure-preview';
import type { StepProps } from './step-props';
import { TraceCard } from './trace-card';
import { TraceQuestions } from './trace-questions';
import { TraceUpload } from './trace-upload';
import { TypedPhase } from './typed-phase';
import { readTraceSummary, type EditorCategory } from './use-editor-data';

interface OpenFile {
  uploadPublicId: string;
  fileName: string;
  zone: string;
  description: TraceDescription;
}

/** The mode that a whole trace most likely is, to begin with: the member decides. */
function likelyMode(category: EditorCategory | undefined): string {
  if (category?.duty === 'cyclic' && category.modes.some((mode) => mode.code === 'cycling')) return 'cycling';
  if (category?.duty === 'per-use' && category.modes.some((mode) => mode.code === 'programme')) return 'programme';
  return category?.basis.modeCode ?? '';
}

export function StepReadings({ category, errorOf }: StepProps) {
  const form = useFormContext<EditorValues>();
  const { traces, typed } = useWatch({ control: form.control }) as EditorValues;
  const [open, setOpen] = useState<OpenFile | null>(null);
  const phasesError = errorOf('phases');

  const accept = async (reading: TraceReadingAnswer, fileName: string, zone: string) => {
    if (reading.status === 'needs-answers') {
      return setOpen({ uploadPublicId: reading.uploadPublicId, fileName, zone, description: reading.description });
    }
    setOpen(null);
    const summary = await readTraceSummary(reading.tracePublicId);
    const whole = {
      id: crypto.randomUUID(),
      modeCode: likelyMode(category),
      fromSeconds: Date.parse(summary.startsAt) / 1000,
      // The last reading counts too, and its time may have a fraction that the summary leaves out.
      toSeconds: Date.parse(summary.endsAt) / 1000 + 1,
      uses: category?.duty === 'per-use' ? '1' : '',
    };
    const { uploadPublicId, tracePublicId, description } = reading;
    form.setValue('traces', [
      ...form.getValues('traces'),
      { uploadPublicId, tracePublicId, fileName, zone, description, summary, phases: [whole] },
    ]);
    if (form.getValues('measuredOn') === '') form.setValue('measuredOn', summary.startsAt.slice(0, 10));
  };

  if (!category) {
    return (
      <Notice tone="warning" title="The device first">
        Its category says which operating modes there are. Choose or propose the device, then come back.
      </Notice>
    );
  }
  return (
    <div id="phases" tabIndex={-1}>
      {phasesError && <FieldError id="phases">{phasesError}</FieldError>}
      <TraceUpload error={errorOf('traces')} onReading={(...reading) => void accept(...reading)} />
      {open && (
        <TraceQuestions
          key={JSON.stringify(open.description.questions)}
          {...open}
          onReading={(reading) => void accept(reading, open.fileName, open.zone)}
        />
      )}
      {traces.map((trace, index) => (
        <TraceCard
          key={trace.tracePublicId}
          trace={trace}
          category={category}
          onChange={(phases) => form.setValue(`traces.${index}.phases`, phases)}
          onRemove={() =>
            form.setValue(
              'traces',
              traces.filter((known) => known !== trace),
            )
          }
        />
      ))}
      <h3 className="mt-8 text-subheading">Read off a display</h3>
      {typed.map((phase, index) => (
        <TypedPhase
          key={phase.id}
          index={index}
          category={category}
          errorOf={errorOf}
          onRemove={() =>
            form.setValue(
              'typed',
              typed.filter((known) => known.id !== phase.id),
            )
          }
        />
      ))}
      <Button onClick={() => form.setValue('typed', [...typed, emptyTyped(likelyMode(category))])} className="mt-2">
        Add a reading
      </Button>
      <FigurePreview category={category} />
    </div>
  );
}
