'use client';

import { useFormContext, useWatch } from 'react-hook-form';
import { Notice } from '@/components/layout/notices';
import { Checkbox } from '@/components/ui/choices';
import { formatDuration } from '@/lib/measurement/units/format-figure';
import { MEASURING_POINTS, PHOTO_KINDS, SUPPLY_CLASSES } from '@/lib/reports/schema';
import type { EditorValues } from './editor-values';
import { FigurePreview } from './figure-preview';
import { accuracyWords } from './step-instrument';
import type { StepProps } from './step-props';

/** Everything as the moderator will see it, and what the method still wants. */
export function StepCheck({ data, category, errorOf }: StepProps) {
  const form = useFormContext<EditorValues>();
  const values = useWatch({ control: form.control }) as EditorValues;
  const method = data.methods.find((known) => known.code === values.methodCode);
  const instrument = data.instruments.find((known) => known.publicId === values.instrumentPublicId);
  const longest = Math.max(
    0,
    ...values.traces.flatMap((trace) => trace.phases.map((phase) => phase.toSeconds - phase.fromSeconds)),
  );
  const facts: [string, string][] = [
    ['Device', values.proposesDevice ? `${values.maker} ${values.model} (proposed)` : values.deviceName],
    ['Unit', values.unitLabel],
    ['Instrument', instrument ? `${instrument.name}, ${accuracyWords(instrument)}` : ''],
    ['Method', method?.name ?? ''],
    ['Began on', values.measuredOn],
    ['Supply', values.supplyClass ? SUPPLY_CLASSES[values.supplyClass] : ''],
    ['Measured', values.measuringPoint ? MEASURING_POINTS[values.measuringPoint] : ''],
    ['Room', values.ambient && `${values.ambient} °C`],
    ['Traces', values.traces.map((trace) => `${trace.fileName} (${trace.phases.length} phases)`).join('; ')],
    ['Read off a display', values.typed.length > 0 ? `${values.typed.length} readings` : ''],
    ['Photos', values.photos.map((photo) => PHOTO_KINDS[photo.kind]).join(', ')],
  ];
  return (
    <>
      <dl className="grid max-w-prose grid-cols-[8rem_1fr] gap-y-1.5">
        {facts.map(([label, text]) => (
          <div key={label} className="contents">
            <dt className="text-note text-muted">{label}</dt>
            <dd>{text || <span className="text-muted">not given</span>}</dd>
          </div>
        ))}
      </dl>
      {method && longest > 0 && longest < method.minimumSeconds && (
        <Notice tone="warning" title="Shorter than the method asks">
          {method.name} asks for {formatDuration(method.minimumSeconds)}; the longest phase is {formatDuration(longest)}
          . It can be sent, but a moderator is likely to ask for more.
        </Notice>
      )}
      {values.photos.length === 0 && (
        <Notice>A photo of the display or the rating plate makes the review quicker. It can be sent without.</Notice>
      )}
      {category && <FigurePreview category={category} />}
      <div className="mt-8">
        <Checkbox
          label="My readings, text and photos may be published under CC BY 4.0"
          hint="Anyone may use them and says where they come from. A verified report stays on the record; you can withdraw it, and it counts no more."
          error={errorOf('licenceAgreed')}
          {...form.register('licenceAgreed')}
        />
      </div>
    </>
  );
}
