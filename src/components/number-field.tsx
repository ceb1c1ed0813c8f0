import { useState } from 'react';
import { Field, controlLook, type FieldFrame } from '#src/components/field.tsx';

type NumberFieldProps = FieldFrame & {
  value: number | null;
  /** null while the field is empty or holds no whole number in range. */
  onChange: (value: number | null) => void;
  onBlur?: () => void;
  min?: number;
  max?: number;
  /** Written after the figure: `%`, `lb`. */
  unit?: string;
  disabled?: boolean;
};

/** Reads a whole number; thin gaps and commas between thousands are allowed. */
function readWhole(text: string, min: number, max: number): { value: number } | { error: string } {
  const digits = text.trim().replace(/(?<=\d)[\s,\u2009\u202f](?=\d{3}\b)/g, '');
  if (!/^-?\d{1,15}$/.test(digits))
    return { error: `“${text.trim()}” is not a whole number. Type digits only.` };
  const value = Number(digits);
  if (value < min || value > max) return { error: `${digits} is out of range: ${min} to ${max}.` };
  return { value };
}

/** A whole number, typed as text so that nothing changes by the mouse wheel. */
export function NumberField({
  label,
  hideLabel,
  hint,
  error,
  required,
  className,
  value,
  onChange,
  onBlur,
  min = 0,
  max = 1_000_000_000,
  unit,
  disabled,
}: NumberFieldProps) {
  const [text, setText] = useState(value === null ? '' : String(value));
  const [sent, setSent] = useState(value);
  if (value !== sent) {
    setSent(value);
    if (value !== null) setText(String(value));
    else if (sent !== null) setText('');
  }
  const read = text.trim() === '' ? null : readWhole(text, min, max);
  const ownError = read && 'error' in read ? read.error : undefined;
  return (
    <Field {...{ label, hideLabel, hint, required, className }} error={ownError ?? error}>
      {(ids) => (
        <div className="flex items-baseline gap-2">
          <input
            {...ids}
            type="text"
            inputMode="numeric"
            value={text}
            disabled={disabled}
            onBlur={onBlur}
            onChange={(event) => {
              const typed = event.target.value;
              setText(typed);
              const next = typed.trim() === '' ? null : readWhole(typed, min, max);
              const number = next && 'value' in next ? next.value : null;
              setSent(number);
              onChange(number);
            }}
            className={controlLook('box', true, Boolean(ownError ?? error))}
          />
          {unit && <span className="font-mono text-muted">{unit}</span>}
        </div>
      )}
    </Field>
  );
}
