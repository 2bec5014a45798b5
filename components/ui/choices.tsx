import type { ComponentProps, ReactNode } from 'react';
import clsx from 'clsx';
import { FieldError, type FieldWords, Hint, describedBy } from './field';

interface FieldsetProps extends FieldWords {
  /** Hint and error are found by it; an error summary links to `${id}` or to the first field inside. */
  id: string;
  children: ReactNode;
  className?: string;
}

/** Several controls that answer one question; the legend is the question. */
export function Fieldset({ id, label, hint, error, optional, children, className }: FieldsetProps) {
  return (
    <fieldset
      id={id}
      tabIndex={-1}
      aria-describedby={describedBy(id, { hint, error })}
      className={clsx('my-5 min-w-0', error && 'border-l-3 border-rust pl-4', className)}
    >
      <legend className="font-semibold">
        {label}
        {optional && <span className="font-normal text-muted"> (optional)</span>}
      </legend>
      {hint && <Hint id={id}>{hint}</Hint>}
      {error && <FieldError id={id}>{error}</FieldError>}
      <div className="mt-1.5">{children}</div>
    </fieldset>
  );
}

const row = 'target flex items-start gap-3 py-1.5';
const box = 'mt-0.5 size-5 shrink-0 accent-ink pointer-coarse:size-6';

interface ChoiceOption {
  value: string;
  label: ReactNode;
  hint?: ReactNode;
}

interface RadioGroupProps extends FieldWords, Omit<ComponentProps<'input'>, 'type' | 'value' | 'defaultValue'> {
  name: string;
  options: ChoiceOption[];
  value?: string;
  defaultValue?: string;
}

/** Each option's id is `${name}-${value}`; the first has `${name}`, so that an error summary finds it. */
export function RadioGroup({
  label,
  hint,
  error,
  optional,
  options,
  name,
  value,
  defaultValue,
  ...rest
}: RadioGroupProps) {
  return (
    <Fieldset id={`${name}-group`} label={label} hint={hint} error={error} optional={optional}>
      {options.map((option, index) => {
        const id = index === 0 ? name : `${name}-${option.value}`;
        return (
          <div key={option.value} className={row}>
            <input
              {...rest}
              type="radio"
              id={id}
              name={name}
              value={option.value}
              checked={value === undefined ? undefined : value === option.value}
              defaultChecked={defaultValue === undefined ? undefined : defaultValue === option.value}
              aria-describedby={option.hint ? `${id}-hint` : undefined}
              className={box}
            />
            <div>
              <label htmlFor={id} className="block">
                {option.label}
              </label>
              {option.hint && <Hint id={id}>{option.hint}</Hint>}
            </div>
          </div>
        );
      })}
    </Fieldset>
  );
}

interface CheckboxProps extends Omit<FieldWords, 'optional'>, Omit<ComponentProps<'input'>, 'type'> {
  name: string;
}

export function Checkbox({ label, hint, error, id, className, ...rest }: CheckboxProps) {
  const own = id ?? rest.name;
  return (
    <div className={clsx(error && 'border-l-3 border-rust pl-4', className)}>
      {error && <FieldError id={own}>{error}</FieldError>}
      <div className={row}>
        <input
          {...rest}
          type="checkbox"
          id={own}
          aria-describedby={describedBy(own, { hint, error })}
          aria-invalid={error ? true : undefined}
          className={box}
        />
        <div>
          <label htmlFor={own} className="block">
            {label}
          </label>
          {hint && <Hint id={own}>{hint}</Hint>}
        </div>
      </div>
    </div>
  );
}
