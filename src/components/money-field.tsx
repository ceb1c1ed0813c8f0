import { useState } from 'react';
import { formatMoney, minorPerUnit, parseMoney } from '#shared/domain/money.ts';
import { afterPointer } from '#src/components/after-pointer.ts';
import { Field, controlLook, type FieldFrame } from '#src/components/field.tsx';

/** By minor units in one of the currency. */
const EXAMPLE: Readonly<Record<number, string>> = { 1: '1500', 100: '124.50', 1000: '124.500' };

type MoneyFieldProps = FieldFrame & {
  /** Whole minor units of the currency. */
  value: number | null;
  /** null while the field is empty or its text is not read as an amount. */
  onChange: (minor: number | null) => void;
  onBlur?: (() => void) | undefined;
  /** ISO 4217. */
  currency: string;
  disabled?: boolean;
};

/** An amount as people type it; the form gets exact minor units and the person sees how it was read. */
export function MoneyField({
  label,
  hideLabel,
  hint,
  error,
  required,
  className,
  value,
  onChange,
  onBlur,
  currency,
  disabled,
}: MoneyFieldProps) {
  const write = (minor: number | null) => (minor === null ? '' : formatMoney(minor, currency));
  const [text, setText] = useState(() => write(value));
  const [sent, setSent] = useState(value);
  const [left, setLeft] = useState(value !== null);
  const [typed, setTyped] = useState(false);
  if (value !== sent) {
    setSent(value);
    setText(write(value));
  }
  const read = text.trim() === '' ? null : parseMoney(text, currency);
  const fault =
    text.trim() !== '' && read === null
      ? `“${text.trim()}” is not an amount in ${currency}. Type it like ${EXAMPLE[minorPerUnit(currency)] ?? '124.50'}.`
      : undefined;
  const shown = fault ? (left ? fault : undefined) : error;
  const writtenBack = read === null ? null : write(read);

  return (
    <Field
      {...{ label, hideLabel, required, className }}
      error={shown}
      hint={typed && writtenBack !== null ? <span className="font-mono">= {writtenBack}</span> : hint}
    >
      {(ids) => (
        <input
          {...ids}
          type="text"
          inputMode="decimal"
          autoComplete="off"
          value={text}
          disabled={disabled}
          onChange={(event) => {
            setText(event.target.value);
            setTyped(true);
            const next = event.target.value.trim() === '' ? null : parseMoney(event.target.value, currency);
            setSent(next);
            onChange(next);
          }}
          onBlur={() => {
            afterPointer(() => setLeft(true));
            if (writtenBack !== null) setText(writtenBack);
            onBlur?.();
          }}
          className={controlLook('box', true, Boolean(shown))}
        />
      )}
    </Field>
  );
}
