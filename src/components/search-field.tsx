import { useEffect, useState, type ComponentProps } from 'react';
import { Field, controlLook, type FieldFrame } from '#src/components/field.tsx';

type SearchFieldProps = FieldFrame &
  Omit<ComponentProps<'input'>, 'value' | 'onChange' | 'className' | 'id' | 'type'> & {
    value: string;
    /** Called a moment after the last key, so that a filter in the address does not stutter. */
    onSearch: (text: string) => void;
    mono?: boolean;
  };

const PAUSE_MS = 250;

export function SearchField({
  label,
  hideLabel,
  hint,
  error,
  className,
  value,
  onSearch,
  mono = false,
  ...input
}: SearchFieldProps) {
  const [text, setText] = useState(value);
  const [known, setKnown] = useState(value);
  if (value !== known) {
    setKnown(value);
    setText(value);
  }
  useEffect(() => {
    if (text === known) return undefined;
    const timer = setTimeout(() => {
      setKnown(text);
      onSearch(text);
    }, PAUSE_MS);
    return () => clearTimeout(timer);
  }, [text, known, onSearch]);
  return (
    <Field {...{ label, hideLabel, hint, error, className }}>
      {(ids) => (
        <input
          autoComplete="off"
          spellCheck={false}
          {...input}
          {...ids}
          type="search"
          value={text}
          onChange={(event) => setText(event.target.value)}
          className={controlLook('box', mono, Boolean(error))}
        />
      )}
    </Field>
  );
}
