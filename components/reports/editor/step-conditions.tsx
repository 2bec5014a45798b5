'use client';

import { useFormContext, useWatch } from 'react-hook-form';
import { Caution } from '@/components/ui/caution';
import { Checkbox, RadioGroup } from '@/components/ui/choices';
import { Select, Textarea, TextInput } from '@/components/ui/inputs';
import { formatDuration } from '@/lib/measurement/units/format-figure';
import { MEASURING_POINTS, SUPPLY_CLASSES } from '@/lib/reports/schema';
import type { EditorValues } from './editor-values';
import { QuantityField } from './quantity-field';
import type { StepProps } from './step-props';

export function StepConditions({ data, category, errorOf }: StepProps) {
  const form = useFormContext<EditorValues>();
  const values = useWatch({ control: form.control }) as EditorValues;
  const method = data.methods.find((known) => known.code === values.methodCode);
  return (
    <>
      {category?.cautions.map((caution) => (
        <Caution key={caution}>{caution}</Caution>
      ))}
      <RadioGroup
        label="How did you measure?"
        error={errorOf('methodCode')}
        name="methodCode"
        value={values.methodCode}
        onChange={(event) => form.setValue('methodCode', event.target.value)}
        options={data.methods.map((known) => ({
          value: known.code,
          label: known.name,
          hint: `${known.summary} At least ${formatDuration(known.minimumSeconds)}${
            known.minimumCycles > 0 ? `, ${known.minimumCycles} whole cycles where it cycles` : ''
          }.`,
        }))}
      />
      {method && <Caution>{method.caution}</Caution>}
      {method?.needsConfirmation && (
        <Checkbox
          label="A licensed person installed the meter, and no cover was opened for this measurement"
          error={errorOf('cautionConfirmed')}
          {...form.register('cautionConfirmed')}
        />
      )}
      <TextInput
        label="Day on which it began"
        type="date"
        className="max-w-52"
        error={errorOf('measuredOn')}
        {...form.register('measuredOn')}
      />
      <Select
        label="Supply"
        className="max-w-52"
        options={Object.entries(SUPPLY_CLASSES).map(([value, label]) => ({ value, label }))}
        error={errorOf('supplyClass')}
        {...form.register('supplyClass')}
      />
      <QuantityField
        name="supplyVolts"
        label="Voltage, if you measured it"
        unit="V"
        optional
        error={errorOf('supplyVolts')}
      />
      <QuantityField name="hertz" label="Frequency, if you measured it" unit="Hz" optional error={errorOf('hertz')} />
      <Select
        label="Where was it measured?"
        placeholder="Choose the point"
        className="max-w-md"
        options={Object.entries(MEASURING_POINTS).map(([value, label]) => ({ value, label }))}
        error={errorOf('measuringPoint')}
        {...form.register('measuringPoint')}
      />
      <RadioGroup
        label="Was this device the only load there?"
        error={errorOf('isOnlyLoad')}
        name="isOnlyLoad"
        value={values.isOnlyLoad}
        onChange={(event) => form.setValue('isOnlyLoad', event.target.value as 'yes' | 'no')}
        options={[
          { value: 'yes', label: 'Yes' },
          { value: 'no', label: 'No, something else drew power too' },
        ]}
      />
      <QuantityField name="ambient" label="Room temperature" unit="°C" optional error={errorOf('ambient')} />
      {category?.conditions.map((condition) => (
        <TextInput
          key={condition.key}
          label={condition.unit ? `${condition.label} (${condition.unit})` : condition.label}
          optional
          hint={condition.hint}
          className="max-w-md"
          error={errorOf(`conditions.${condition.key}`)}
          {...form.register(`conditions.${condition.key}`)}
        />
      ))}
      <Textarea
        label="What was held constant?"
        optional
        rows={2}
        hint="For example: the setting, the place, no door opened."
        error={errorOf('heldConstant')}
        {...form.register('heldConstant')}
      />
    </>
  );
}
