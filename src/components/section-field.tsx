import { useId, useMemo, useState } from 'react';
import { catalogueNames } from '#shared/domain/section/catalogue.ts';
import { readSection } from '#shared/domain/section/read-section.ts';
import type { SectionReading } from '#shared/domain/section/types.ts';
import { afterPointer } from '#src/components/after-pointer.ts';
import { Field, controlLook, type FieldFrame, type FieldLook } from '#src/components/field.tsx';

type SectionFieldProps = FieldFrame & {
  /** Canonical spelling. */
  value: string | null;
  /** null while the field is empty or its text is not read as one section. */
  onChange: (section: string | null) => void;
  onBlur?: (() => void) | undefined;
  units: 'imperial' | 'metric';
  look?: FieldLook;
  autoFocus?: boolean;
};

const MOST_SUGGESTIONS = 30;

const squeeze = (text: string) => text.toLowerCase().replace(/[\s×*]/g, (sign) => (sign.trim() ? 'x' : ''));

/** Catalogue names that contain what was typed, those that begin with it first. */
export function suggestSections(typed: string, names: readonly string[]): string[] {
  const wanted = squeeze(typed);
  if (wanted === '') return [];
  const begins: string[] = [];
  const contains: string[] = [];
  for (const name of names) {
    const at = squeeze(name).indexOf(wanted);
    if (at === 0) begins.push(name);
    else if (at > 0) contains.push(name);
    if (begins.length >= MOST_SUGGESTIONS) break;
  }
  return [...begins, ...contains].slice(0, MOST_SUGGESTIONS);
}

/** A form has a field of its own for the count, so a leading number is part of the size. */
function read(typed: string, units: 'imperial' | 'metric'): SectionReading | null {
  if (typed.trim() === '') return null;
  return readSection(typed, { hasQuantityColumn: true, unitHint: units === 'imperial' ? 'in' : 'mm' });
}

/** A section in any spelling of the trade; the form gets the canonical one and the person sees how it was read. */
export function SectionField({
  label,
  hideLabel,
  hint,
  error,
  required,
  className,
  value,
  onChange,
  onBlur,
  units,
  look = 'box',
  autoFocus,
}: SectionFieldProps) {
  const listId = useId();
  const [text, setText] = useState(value ?? '');
  const [sent, setSent] = useState(value);
  const [left, setLeft] = useState(value !== null);
  const [typed, setTyped] = useState(false);
  if (value !== sent) {
    setSent(value);
    setText(value ?? '');
  }
  const reading = useMemo(() => read(text, units), [text, units]);
  const suggestions = useMemo(() => suggestSections(text, catalogueNames()), [text]);
  const asked = reading?.outcome === 'asked' ? reading : null;
  const name = reading?.outcome === 'read' ? reading.section.name : null;
  const shown = asked ? (left ? asked.message : undefined) : error;

  const type = (written: string) => {
    setText(written);
    setTyped(true);
    const next = read(written, units);
    const canonical = next?.outcome === 'read' ? next.section.name : null;
    setSent(canonical);
    onChange(canonical);
  };

  return (
    <Field
      {...{ label, hideLabel, required, className }}
      error={shown}
      hint={typed && name !== null ? <span className="font-mono">= {name}</span> : hint}
    >
      {(ids) => (
        <>
          <input
            {...ids}
            type="text"
            list={listId}
            autoComplete="off"
            autoCapitalize="characters"
            spellCheck={false}
            autoFocus={autoFocus}
            value={text}
            onChange={(event) => type(event.target.value)}
            onBlur={() => {
              afterPointer(() => setLeft(true));
              if (name !== null) setText(name);
              onBlur?.();
            }}
            className={controlLook(look, true, Boolean(shown))}
          />
          <datalist id={listId}>
            {suggestions.map((suggestion) => (
              <option key={suggestion} value={suggestion} />
            ))}
          </datalist>
          {asked && left && asked.choices.length > 0 && (
            <div className="mt-2 flex flex-wrap gap-2">
              {asked.choices.map((choice) => (
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
