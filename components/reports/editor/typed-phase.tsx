'use client';

import { useFormContext } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Select, TextInput } from '@/components/ui/inputs';
import type { EditorValues } from './editor-values';
import { QuantityField } from './quantity-field';
import type { EditorCategory } from './use-editor-data';

interface TypedPhaseProps {
  index: number;
  category: EditorCategory | undefined;
  errorOf: (field: string) => string | undefined;
  onRemove: () => void;
}

/** One stretch whose figures were read off a display. */
export function TypedPhase({ index, category, errorOf, onRemove }: TypedPhaseProps) {
  const form = useFormContext<EditorValues>();
  const at = `typed.${index}` as const;
  return (
    <fieldset className="my-5 max-w-prose border-l-3 border-rule pl-5">
      <legend className="text-subheading">Reading {index + 1}</legend>
      <Select
        label="Operating mode"
        placeholder="Choose a mode"
        options={(category?.modes ?? []).map((mode) => ({ value: mode.code, label: `${mode.name}: ${mode.note}` }))}
        id={`${at}.modeCode`}
        error={errorOf(`${at}.modeCode`)}
        {...form.register(`${at}.modeCode`)}
      />
      <QuantityField
        name={`${at}.duration`}
        label="How long?"
        unit="s"
        unitWords="h, min or s"
        hint="For example: 26 h, or 90 min."
        error={errorOf(`${at}.duration`)}
      />
      <QuantityField name={`${at}.energy`} label="Energy" unit="Wh" optional error={errorOf(`${at}.energy`)} />
      <QuantityField name={`${at}.mean`} label="Mean power" unit="W" optional error={errorOf(`${at}.mean`)} />
      <QuantityField name={`${at}.minimum`} label="Lowest" unit="W" optional error={errorOf(`${at}.minimum`)} />
      <QuantityField name={`${at}.maximum`} label="Highest" unit="W" optional error={errorOf(`${at}.maximum`)} />
      {category?.duty === 'per-use' && (
        <TextInput
          label="How many uses?"
          inputMode="numeric"
          className="max-w-40"
          id={`${at}.uses`}
          error={errorOf(`${at}.uses`)}
          {...form.register(`${at}.uses`)}
        />
      )}
      <Button look="quiet" onClick={onRemove}>
        Remove reading {index + 1}
      </Button>
    </fieldset>
  );
}
