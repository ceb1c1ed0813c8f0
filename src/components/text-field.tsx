import type { ComponentProps } from 'react';
import { Field, controlLook, type FieldFrame, type FieldLook } from '#src/components/field.tsx';

type TextFieldProps = FieldFrame &
  Omit<ComponentProps<'input'>, 'className' | 'id'> & {
    /** Marks, heats, slots, sections: whatever is painted on steel is set in mono. */
    mono?: boolean;
    look?: FieldLook;
  };

/** One line of text. Takes what `register` of a form gives. */
export function TextField({
  label,
  hideLabel,
  hint,
  error,
  required,
  className,
  mono = false,
  look = 'box',
  ...input
}: TextFieldProps) {
  return (
    <Field {...{ label, hideLabel, hint, error, required, className }}>
      {(ids) => <input type="text" {...input} {...ids} className={controlLook(look, mono, Boolean(error))} />}
    </Field>
  );
}

type TextAreaFieldProps = FieldFrame &
  Omit<ComponentProps<'textarea'>, 'className' | 'id'> & { mono?: boolean };

/** Several lines of text. */
export function TextAreaField({
  label,
  hideLabel,
  hint,
  error,
  required,
  className,
  mono = false,
  ...area
}: TextAreaFieldProps) {
  return (
    <Field {...{ label, hideLabel, hint, error, required, className }}>
      {(ids) => <textarea rows={3} {...area} {...ids} className={controlLook('box', mono, Boolean(error))} />}
    </Field>
  );
}
