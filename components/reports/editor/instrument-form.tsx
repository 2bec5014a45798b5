'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Fieldset } from '@/components/ui/choices';
import { ErrorSummary } from '@/components/ui/error-summary';
import { problemsOfAnswer, type FormProblem } from '@/components/ui/form-problems';
import { NumberField, Select, TextInput } from '@/components/ui/inputs';
import { Checkbox } from '@/components/ui/choices';
import { readQuantity, type TypedUnit } from '@/lib/measurement/units/read-quantity';
import { callApi } from '@/lib/platform/http/call-api';
import { INSTRUMENT_KINDS, instrumentInput, SUPPLY_CLASSES, type InstrumentInput } from '@/lib/reports/schema';

/** Kinds of stated accuracy to start from; they are kinds, and bear no brand. */
const KINDS = {
  ordinary: {
    label: 'Ordinary plug-in meter',
    percentOfReading: '2',
    counts: '1',
    resolutionWatts: '0.1',
    lowerLimitWatts: '1',
    kind: 'plug-in-meter',
  },
  good: {
    label: 'Good plug-in meter',
    percentOfReading: '1',
    counts: '1',
    resolutionWatts: '0.1',
    lowerLimitWatts: '0.5',
    kind: 'plug-in-meter',
  },
  breaker: {
    label: 'Metering breaker',
    percentOfReading: '1.5',
    counts: '0',
    resolutionWatts: '0.1',
    lowerLimitWatts: '2',
    kind: 'metering-breaker',
  },
  shunt: {
    label: 'DC shunt',
    percentOfReading: '0.5',
    counts: '1',
    resolutionWatts: '0.1',
    lowerLimitWatts: '0.5',
    kind: 'dc-shunt',
  },
} as const;

const EMPTY = {
  name: '',
  kind: 'plug-in-meter' as InstrumentInput['kind'],
  modelName: '',
  percentOfReading: '',
  percentOfRange: '0',
  rangeWatts: '',
  counts: '0',
  resolutionWatts: '',
  resolutionWattHours: '',
  lowerLimitWatts: '',
  readsTruePower: true,
  supplies: ['ac-230'] as InstrumentInput['supplies'],
};
type Values = typeof EMPTY;

/** An instrument as its manual states it: ±(a % of reading + b % of range + c counts). */
export function InstrumentForm({ onAdded }: { onAdded: (publicId: string) => void }) {
  const client = useQueryClient();
  const [values, setValues] = useState<Values>(EMPTY);
  const [problems, setProblems] = useState<FormProblem[]>([]);
  const set = (changed: Partial<Values>) => setValues((before) => ({ ...before, ...changed }));
  const add = useMutation({
    mutationFn: (body: InstrumentInput) =>
      callApi('/api/v1/instruments', { method: 'POST', body, answer: z.object({ publicId: z.string() }) }),
    onSuccess: async ({ publicId }) => {
      await client.invalidateQueries({ queryKey: ['instruments'] });
      onAdded(publicId);
    },
    onError: (error) =>
      setProblems(problemsOfAnswer(error).map((problem) => ({ ...problem, field: `new-${problem.field}` }))),
  });
  const submit = () => {
    const read = instrumentInput.safeParse(toInput(values));
    if (read.success) {
      setProblems([]);
      return add.mutate(read.data);
    }
    setProblems(read.error.issues.map((issue) => ({ field: `new-${String(issue.path[0])}`, message: issue.message })));
  };
  const errorOf = (field: string) => problems.find((problem) => problem.field === `new-${field}`)?.message;
  const number = (
    field: keyof Values & string,
    label: string,
    unit: string,
    more: { hint?: string; optional?: boolean } = {},
  ) => (
    <NumberField
      label={label}
      unit={unit}
      id={`new-${field}`}
      name={`new-${field}`}
      value={String(values[field])}
      onChange={(event) => set({ [field]: event.target.value })}
      error={errorOf(field)}
      {...more}
    />
  );
  return (
    <section aria-label="New instrument" className="my-5 max-w-prose border-l-3 border-rule pl-5">
      <h3 className="text-subheading">A new instrument</h3>
      <ErrorSummary errors={problems} title="The instrument needs more" />
      <p className="mt-3 text-note">Begin with a kind, then set right what your manual states:</p>
      <p className="mt-1 flex flex-wrap gap-x-5">
        {Object.entries(KINDS).map(([key, { label, ...stated }]) => (
          <Button key={key} look="quiet" onClick={() => set({ ...stated, modelName: values.modelName || label })}>
            {label}
          </Button>
        ))}
      </p>
      <TextInput
        label="Your name for it"
        id="new-name"
        name="new-name"
        value={values.name}
        onChange={(event) => set({ name: event.target.value })}
        error={errorOf('name')}
      />
      <Select
        label="Kind"
        id="new-kind"
        name="new-kind"
        value={values.kind}
        onChange={(event) => set({ kind: event.target.value as Values['kind'] })}
        options={Object.entries(INSTRUMENT_KINDS).map(([value, label]) => ({ value, label }))}
        error={errorOf('kind')}
      />
      <TextInput
        label="Model"
        hint="Or a description: instruments of one model share their error."
        id="new-modelName"
        name="new-modelName"
        value={values.modelName}
        onChange={(event) => set({ modelName: event.target.value })}
        error={errorOf('modelName')}
      />
      {number('percentOfReading', 'Of the reading', '%')}
      {number('percentOfRange', 'Of the range', '%')}
      {number('rangeWatts', 'Full scale', 'W', {
        optional: true,
        hint: 'Needed where a share of the range is stated.',
      })}
      {number('counts', 'Counts of the last digit', 'counts')}
      {number('resolutionWatts', 'Smallest step of the display', 'W')}
      {number('resolutionWattHours', 'Step of its energy counter', 'Wh', { optional: true })}
      {number('lowerLimitWatts', 'Lower limit', 'W', { optional: true, hint: 'Below it, it shows nothing.' })}
      <Checkbox
        name="new-readsTruePower"
        label="It reads true power"
        hint="Volts and amperes at the same moment. A clamp without a voltage lead does not."
        checked={values.readsTruePower}
        onChange={(event) => set({ readsTruePower: event.target.checked })}
      />
      <Fieldset id="new-supplies" label="It measures" error={errorOf('supplies')}>
        {Object.entries(SUPPLY_CLASSES).map(([value, label]) => (
          <Checkbox
            key={value}
            name={`new-supply-${value}`}
            label={label}
            checked={values.supplies.includes(value as 'dc')}
            onChange={(event) =>
              set({
                supplies: event.target.checked
                  ? [...values.supplies, value as 'dc']
                  : values.supplies.filter((supply) => supply !== value),
              })
            }
          />
        ))}
      </Fieldset>
      <Button busy={add.isPending} onClick={submit}>
        Add this instrument
      </Button>
    </section>
  );
}

function toInput(values: Values): Record<string, unknown> {
  const number = (text: string, unit: TypedUnit = 'W') => {
    const reading = readQuantity(text, unit);
    return reading.status === 'understood' ? reading.value : reading.status === 'empty' ? null : Number.NaN;
  };
  return {
    ...values,
    percentOfReading: number(values.percentOfReading),
    percentOfRange: number(values.percentOfRange) ?? 0,
    rangeWatts: number(values.rangeWatts),
    counts: number(values.counts) ?? 0,
    resolutionWatts: number(values.resolutionWatts),
    resolutionWattHours: number(values.resolutionWattHours, 'Wh'),
    lowerLimitWatts: number(values.lowerLimitWatts),
    averagingSeconds: null,
    calibratedOn: null,
  };
}
