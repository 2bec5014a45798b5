import type { ComponentProps } from 'react';
import clsx from 'clsx';
import { Field, type FieldWords, controlClass, describedBy } from './field';

/** `name` is also the id that an error summary links to, unless `id` is given. */
type Control<Tag extends 'input' | 'select' | 'textarea'> = FieldWords &
  Omit<ComponentProps<Tag>, 'children'> & { name: string; fieldClassName?: string };

/** What every control has in common: its id, its words and whether it is wrong. */
function wire<P extends FieldWords & { id?: string; name: string; fieldClassName?: string }>(props: P, more?: string) {
  const { label, hint, error, optional, fieldClassName, ...rest } = props;
  const id = props.id ?? props.name;
  return {
    field: { id, label, hint, error, optional, className: fieldClassName },
    control: {
      ...rest,
      id,
      'aria-describedby': describedBy(id, { hint, error }, more),
      'aria-invalid': error ? (true as const) : undefined,
    },
  };
}

export function TextInput({ className, ...props }: Control<'input'>) {
  const { field, control } = wire(props);
  return (
    <Field {...field}>
      <input type="text" {...control} className={clsx(controlClass, className)} />
    </Field>
  );
}

type NumberFieldProps = Control<'input'> & {
  /** Shown beside the field and read with it. */
  unit: string;
};

/** Typed as text, since commas, spaces and units are accepted and read by the form's own parser. */
export function NumberField({ unit, className, ...props }: NumberFieldProps) {
  const unitId = `${props.id ?? props.name}-unit`;
  const { field, control } = wire(props, unitId);
  return (
    <Field {...field}>
      <span className="flex items-center gap-2">
        <input
          type="text"
          inputMode="decimal"
          autoComplete="off"
          {...control}
          className={clsx(controlClass, 'max-w-40 text-right font-mono', className)}
        />
        <span id={unitId} className="font-mono text-muted">
          {unit}
        </span>
      </span>
    </Field>
  );
}

type SelectProps = Control<'select'> & {
  options: { value: string; label: string }[];
  /** The first line, chosen while nothing is: "Choose a mode". */
  placeholder?: string;
};

export function Select({ options, placeholder, className, ...props }: SelectProps) {
  const { field, control } = wire(props);
  return (
    <Field {...field}>
      <select {...control} className={clsx(controlClass, className)}>
        {placeholder !== undefined && <option value="">{placeholder}</option>}
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </Field>
  );
}

export function Textarea({ className, rows = 5, ...props }: Control<'textarea'>) {
  const { field, control } = wire(props);
  return (
    <Field {...field}>
      <textarea rows={rows} {...control} className={clsx(controlClass, 'py-2 leading-normal', className)} />
    </Field>
  );
}
