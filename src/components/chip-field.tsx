import { useId } from 'react';
import { classNames } from '#src/components/class-names.ts';

type ChipFieldProps<Value extends string> = {
  label: string;
  hideLabel?: boolean;
  value: Value | null;
  onChange: (value: Value) => void;
  choices: readonly { value: Value; label: string }[];
  mono?: boolean;
  size?: 'normal' | 'bench';
  disabled?: boolean;
};

/** One of a few, as large chips: a radio group for a thumb. The chosen one is filled and says so to a screen reader. */
export function ChipField<Value extends string>({
  label,
  hideLabel = false,
  value,
  onChange,
  choices,
  mono = false,
  size = 'normal',
  disabled = false,
}: ChipFieldProps<Value>) {
  const name = useId();
  return (
    <fieldset className="m-0 min-w-0 border-0 p-0" disabled={disabled}>
      <legend
        className={classNames(
          'mb-1 p-0 font-head text-base font-semibold text-muted',
          hideLabel && 'sr-only',
        )}
      >
        {label}
      </legend>
      <div className="flex flex-wrap gap-2">
        {choices.map((choice) => {
          const chosen = choice.value === value;
          return (
            <label
              key={choice.value}
              className={classNames(
                'inline-flex items-center border-[1.5px] border-ink has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-layout',
                size === 'bench' ? 'min-h-16 px-5 text-xl' : 'min-h-11 px-3',
                mono ? 'font-mono font-medium' : 'font-head text-[1.0625rem] font-medium',
                chosen ? 'border-layout bg-layout text-white' : 'text-ink hover:bg-soap',
              )}
            >
              <input
                type="radio"
                name={name}
                value={choice.value}
                checked={chosen}
                onChange={() => onChange(choice.value)}
                className="sr-only"
              />
              {choice.label}
            </label>
          );
        })}
      </div>
    </fieldset>
  );
}
