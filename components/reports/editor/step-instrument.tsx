'use client';

import { useState } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import { Caution } from '@/components/ui/caution';
import { Button } from '@/components/ui/button';
import { RadioGroup } from '@/components/ui/choices';
import { FieldError } from '@/components/ui/field';
import { INSTRUMENT_KINDS, type Instrument } from '@/lib/reports/schema';
import type { EditorValues } from './editor-values';
import { InstrumentForm } from './instrument-form';
import type { StepProps } from './step-props';

const CAUTIONS: Partial<Record<Instrument['kind'], string>> = {
  'plug-in-meter':
    'The weakest of socket, lead and meter sets the limit, and it is lower for hours-long loads. Uncoil reels, build no chains, keep it dry. Warmth, smell or browning: switch off upstream if that is safe, and stop.',
  'metering-breaker':
    'Never wired loose on a bench: live parts, no enclosure, uncertain protection. Enclosed and installed by a licensed person under your local code, or not at all.',
  clamp:
    'Round a whole cord it reads almost nothing. Don’t part the cord: use a rated, enclosed line splitter. In a panel it is licensed work, with instrument and leads rated for that measurement category.',
  'dc-shunt':
    'A spanner across a battery can carry thousands of amperes. Main conductors and shunts are for a competent or licensed person: isolated, fused near the source, terminals covered, rings off.',
};

/** ± what, in words. */
export function accuracyWords(instrument: Pick<Instrument, 'percentOfReading' | 'percentOfRange' | 'counts'>): string {
  const parts = [
    `${instrument.percentOfReading} % of reading`,
    ...(instrument.percentOfRange > 0 ? [`${instrument.percentOfRange} % of range`] : []),
    ...(instrument.counts > 0 ? [`${instrument.counts} ${instrument.counts === 1 ? 'count' : 'counts'}`] : []),
  ];
  return `±(${parts.join(' + ')})`;
}

export function StepInstrument({ data, errorOf }: StepProps) {
  const form = useFormContext<EditorValues>();
  const chosen = useWatch({ control: form.control, name: 'instrumentPublicId' });
  const instrument = data.instruments.find((known) => known.publicId === chosen);
  const [adding, setAdding] = useState(data.instruments.length === 0);
  const caution = instrument && CAUTIONS[instrument.kind];
  const error = errorOf('instrumentPublicId');
  return (
    <>
      {data.instruments.length > 0 ? (
        <RadioGroup
          label="What did you measure with?"
          error={error}
          name="instrumentPublicId"
          value={chosen}
          onChange={(event) => form.setValue('instrumentPublicId', event.target.value)}
          options={data.instruments.map((known) => ({
            value: known.publicId,
            label: known.name,
            hint: `${INSTRUMENT_KINDS[known.kind]}, ${accuracyWords(known)}`,
          }))}
        />
      ) : (
        <div id="instrumentPublicId" tabIndex={-1}>
          {error && <FieldError id="instrumentPublicId">{error}</FieldError>}
          <p className="max-w-prose">You have not described an instrument yet. It is kept for your next reports.</p>
        </div>
      )}
      {caution && <Caution>{caution}</Caution>}
      {adding ? (
        <InstrumentForm
          onAdded={(publicId) => {
            form.setValue('instrumentPublicId', publicId);
            setAdding(false);
          }}
        />
      ) : (
        <Button look="quiet" onClick={() => setAdding(true)}>
          Another instrument
        </Button>
      )}
    </>
  );
}
