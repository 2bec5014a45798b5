'use client';

import { useFormContext } from 'react-hook-form';
import { Textarea } from '@/components/ui/inputs';
import type { EditorValues } from './editor-values';
import type { StepProps } from './step-props';

export function StepNotes({ errorOf }: StepProps) {
  const { register } = useFormContext<EditorValues>();
  return (
    <Textarea
      label="Notes"
      optional
      rows={10}
      hint="Anything that explains the figures: what was odd, what changed, which variant it is. Markdown is understood."
      error={errorOf('notes')}
      {...register('notes')}
    />
  );
}
