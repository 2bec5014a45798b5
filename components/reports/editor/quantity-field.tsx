'use client';

import { useController, useFormContext } from 'react-hook-form';
import { NumberField } from '@/components/ui/inputs';
import { readQuantity, type TypedUnit } from '@/lib/measurement/units/read-quantity';
import type { EditorValues } from './editor-values';

interface QuantityFieldProps {
  /** A path into the form's values, whose value is the text as it was typed. */
  name: string;
  label: string;
  unit: TypedUnit;
  /** What is shown beside the field, where it is not the unit itself. */
  unitWords?: string;
  hint?: string;
  optional?: boolean;
  error?: string;
}

/** A number with its unit, as people type it; where something else was probably meant it says so and offers it. */
export function QuantityField({ name, label, unit, unitWords, hint, optional, error }: QuantityFieldProps) {
  const { control } = useFormContext<EditorValues>();
  const {
    field: { value, onChange, onBlur, ref },
  } = useController({ control, name: name as 'ambient' });
  const reading = readQuantity(value, unit);
  return (
    <div>
      <NumberField
        label={label}
        unit={unitWords ?? unit}
        hint={hint}
        optional={optional}
        error={error}
        name={name}
        value={value}
        onChange={onChange}
        onBlur={onBlur}
        ref={ref}
      />
      {reading.status === 'ask' && (
        <div role="status" className="-mt-3 mb-4 max-w-prose border-l-3 border-muted pl-4 text-note">
          <p>{reading.reason}</p>
          <p className="mt-1 flex flex-wrap gap-x-5">
            {reading.meant
              .filter((meant) => meant.unit === unit)
              .map((meant) => (
                <button
                  key={meant.label}
                  type="button"
                  className="min-h-8 text-lichen underline underline-offset-4 pointer-coarse:min-h-11"
                  onClick={() => onChange(String(meant.value))}
                >
                  I meant {meant.label}
                </button>
              ))}
          </p>
        </div>
      )}
    </div>
  );
}
