import { useState } from 'react';
import { formatLength, formatLengthExact, parseLength, type LengthStyle } from '#shared/domain/length.ts';
import { afterPointer } from '#src/components/after-pointer.ts';
import { Field, controlLook, type FieldFrame, type FieldLook } from '#src/components/field.tsx';

type LengthFieldProps = FieldFrame & {
  /** Whole nanometres. */
  value: number | null;
  /** null while the field is empty or its text is not read as one length. */
  onChange: (nm: number | null) => void;
  onBlur?: (() => void) | undefined;
  /** The shop's units: what a bare number means and how the reading is written back. */
  lengthStyle: LengthStyle;
  /** Kerfs and crops may be nothing; pieces and stock may not. */
  allowZero?: boolean;
  look?: FieldLook;
  disabled?: boolean;
  placeholder?: string;
  autoFocus?: boolean;
};

type Read = { nm: number } | { message: string; choices: readonly string[] };

const ZERO = /^0+(?:[.,]0+)?\s*(?:mm|cm|m|in|"|''|″)?$/i;

function readLength(text: string, style: LengthStyle, allowZero: boolean): Read {
  if (allowZero && ZERO.test(text.trim())) return { nm: 0 };
  const read = parseLength(text, { unit: style.units === 'imperial' ? 'in' : 'mm' });
  return read.ok ? { nm: read.nm } : { message: read.message, choices: read.choices };
}

/** The shop's own writing where it says the length exactly, the exact one otherwise; always reads back to the same nanometre. */
function writeLength(nm: number | null, style: LengthStyle): string {
  if (nm === null) return '';
  if (nm === 0) return style.units === 'imperial' ? '0"' : '0 mm';
  const usual = formatLength(nm, style);
  const read = parseLength(usual, { unit: style.units === 'imperial' ? 'in' : 'mm' });
  return read.ok && read.nm === nm ? usual : formatLengthExact(nm);
}

/** A length in any notation of the trade; the form gets exact nanometres and the person sees how it was read. */
export function LengthField({
  label,
  hideLabel,
  hint,
  error,
  required,
  className,
  value,
  onChange,
  onBlur,
  lengthStyle,
  allowZero = false,
  look = 'box',
  disabled,
  placeholder,
  autoFocus,
}: LengthFieldProps) {
  const [text, setText] = useState(() => writeLength(value, lengthStyle));
  const [sent, setSent] = useState(value);
  const [left, setLeft] = useState(value !== null);
  const [typed, setTyped] = useState(false);
  if (value !== sent) {
    setSent(value);
    setText(writeLength(value, lengthStyle));
  }

  const read = text.trim() === '' ? null : readLength(text, lengthStyle, allowZero);
  const fault = read && 'message' in read ? read : null;
  const shown = fault && left ? fault.message : fault ? undefined : error;
  const writtenBack = read && 'nm' in read ? writeLength(read.nm, lengthStyle) : null;

  const type = (written: string) => {
    setText(written);
    setTyped(true);
    const next = written.trim() === '' ? null : readLength(written, lengthStyle, allowZero);
    const nm = next && 'nm' in next ? next.nm : null;
    setSent(nm);
    onChange(nm);
  };

  return (
    <Field
      {...{ label, hideLabel, required, className }}
      error={shown}
      hint={typed && writtenBack !== null ? <span className="font-mono">= {writtenBack}</span> : hint}
    >
      {(ids) => (
        <>
          <input
            {...ids}
            type="text"
            autoComplete="off"
            autoCapitalize="off"
            spellCheck={false}
            // A caller moves the focus here where the length is the very next thing to type.
            autoFocus={autoFocus}
            value={text}
            disabled={disabled}
            placeholder={
              placeholder ??
              (look === 'box' ? undefined : lengthStyle.units === 'imperial' ? `3'-9 1/4"` : '1150 mm')
            }
            onChange={(event) => type(event.target.value)}
            onBlur={() => {
              afterPointer(() => setLeft(true));
              if (writtenBack !== null) setText(writtenBack);
              onBlur?.();
            }}
            className={controlLook(look, true, Boolean(shown))}
          />
          {fault && left && fault.choices.length > 0 && (
            <div className="mt-2 flex flex-wrap gap-2">
              {fault.choices.map((choice) => (
                <button
                  key={choice}
                  type="button"
                  onClick={() => type(choice)}
                  className="min-h-11 border-[1.5px] border-ink px-3 font-mono hover:bg-soap"
                >
                  {choice}
                </button>
              ))}
            </div>
          )}
        </>
      )}
    </Field>
  );
}
