import { useId, type ReactNode } from 'react';
import { TriangleAlert } from 'lucide-react';
import { classNames } from '#src/components/class-names.ts';

/** What the control inside a field must carry, so that label, hint and error belong to it. */
type FieldIds = {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
  'aria-required': true | undefined;
};

export type FieldFrame = {
  label: string;
  /** Kept for screen readers where the place on the screen says it already. */
  hideLabel?: boolean | undefined;
  hint?: ReactNode;
  error?: string | undefined;
  required?: boolean | undefined;
  className?: string | undefined;
};

type FieldProps = FieldFrame & { children: (ids: FieldIds) => ReactNode };

/** Label above, control, then what is wrong beside it: the error names itself by sign and word, not by colour alone. */
export function Field({ label, hideLabel, hint, error, required, className, children }: FieldProps) {
  const id = useId();
  const hintId = `${id}-hint`;
  const errorId = `${id}-error`;
  const describedBy = [hint ? hintId : '', error ? errorId : ''].filter(Boolean).join(' ') || undefined;
  return (
    <div className={classNames('min-w-0', className)}>
      <label
        htmlFor={id}
        className={classNames(
          'block font-head text-base leading-snug font-semibold text-muted',
          hideLabel && 'sr-only',
        )}
      >
        {label}
      </label>
      {children({
        id,
        'aria-describedby': describedBy,
        'aria-invalid': error ? true : undefined,
        'aria-required': required ? true : undefined,
      })}
      {hint && (
        <div id={hintId} className="mt-1 text-[0.9375rem] text-muted">
          {hint}
        </div>
      )}
      {error && (
        <p id={errorId} role="alert" className="mt-1 flex gap-1.5 text-[0.9375rem] font-medium text-oxide">
          <TriangleAlert aria-hidden size={17} className="mt-0.5 shrink-0" />
          <span>{error}</span>
        </p>
      )}
    </div>
  );
}

export type FieldLook = 'box' | 'line';

/** `box` for forms at a desk; `line` is the phone's: large figures on one heavy line. */
export function controlLook(look: FieldLook, mono: boolean, invalid: boolean): string {
  return classNames(
    'block w-full min-w-0 text-ink placeholder:text-muted/80 disabled:bg-soap disabled:text-muted',
    mono && 'font-mono',
    look === 'box'
      ? 'mt-1 min-h-11 border-[1.5px] bg-chalk px-3 py-2 text-base'
      : 'mt-1 border-0 border-b-2 bg-transparent py-1.5 text-[1.625rem] font-bold outline-offset-0',
    invalid ? 'border-oxide' : look === 'box' ? 'border-zinc' : 'border-ink',
  );
}
