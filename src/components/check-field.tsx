import { useId, type ComponentProps, type ReactNode } from 'react';
import { classNames } from '#src/components/class-names.ts';

type CheckFieldProps = Omit<ComponentProps<'input'>, 'type' | 'className' | 'id'> & {
  label: ReactNode;
  hideLabel?: boolean;
  hint?: ReactNode;
  className?: string;
};

/** A tick box whose whole line is the target. Takes what `register` of a form gives. */
export function CheckField({ label, hideLabel = false, hint, className, ...input }: CheckFieldProps) {
  const id = useId();
  return (
    <div className={className}>
      <label htmlFor={id} className="flex min-h-11 items-center gap-2.5">
        <input
          {...input}
          type="checkbox"
          id={id}
          aria-describedby={hint ? `${id}-hint` : undefined}
          className="size-5 shrink-0"
        />
        <span className={classNames(hideLabel && 'sr-only')}>{label}</span>
      </label>
      {hint && (
        <div id={`${id}-hint`} className="-mt-1.5 ml-7.5 text-[0.9375rem] text-muted">
          {hint}
        </div>
      )}
    </div>
  );
}
