import type { ComponentProps } from 'react';
import { Field, controlLook, type FieldFrame } from '#src/components/field.tsx';

type Choice = { value: string; label: string; disabled?: boolean };

type SelectFieldProps = FieldFrame &
  Omit<ComponentProps<'select'>, 'className' | 'id' | 'children'> & {
    choices: readonly Choice[];
    /** Shown while nothing is chosen; cannot be chosen again. */
    placeholder?: string;
    mono?: boolean;
  };

/** One of a few, by the browser's own list. Takes what `register` of a form gives. */
export function SelectField({
  label,
  hideLabel,
  hint,
  error,
  required,
  className,
  choices,
  placeholder,
  mono = false,
  ...select
}: SelectFieldProps) {
  return (
    <Field {...{ label, hideLabel, hint, error, required, className }}>
      {(ids) => (
        <select {...select} {...ids} className={controlLook('box', mono, Boolean(error))}>
          {placeholder !== undefined && (
            <option value="" disabled>
              {placeholder}
            </option>
          )}
          {choices.map((choice) => (
            <option key={choice.value} value={choice.value} disabled={choice.disabled}>
              {choice.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}
