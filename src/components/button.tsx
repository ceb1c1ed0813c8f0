import type { ComponentProps, ReactNode } from 'react';
import { Link, type LinkProps } from 'react-router-dom';
import { classNames } from '#src/components/class-names.ts';

/** `act` is red oxide and stands once on a screen: the one action that matters there. */
type ButtonVariant = 'plain' | 'act' | 'quiet' | 'danger';
/** `bench` is for gloves: 64 px. */
type ButtonSize = 'small' | 'normal' | 'big' | 'bench';

const VARIANTS: Readonly<Record<ButtonVariant, string>> = {
  plain: 'border-ink text-ink hover:bg-soap',
  act: 'border-oxide bg-oxide text-white hover:border-oxide-deep hover:bg-oxide-deep',
  quiet: 'border-transparent text-layout underline-offset-4 hover:underline',
  danger: 'border-oxide text-oxide hover:bg-oxide hover:text-white',
};
const SIZES: Readonly<Record<ButtonSize, string>> = {
  small: 'min-h-9 px-3 py-1 text-base max-sm:min-h-11',
  normal: 'min-h-11 px-4.5 py-2 text-[1.0625rem]',
  big: 'min-h-14 px-6 py-3 text-[1.375rem]',
  bench: 'min-h-16 px-6 py-4 text-[1.75rem]',
};

function look(variant: ButtonVariant, size: ButtonSize, className: string | undefined): string {
  return classNames(
    'inline-flex items-center justify-center gap-2 border-[1.5px] text-center font-head leading-tight font-semibold disabled:opacity-55',
    VARIANTS[variant],
    SIZES[size],
    className,
  );
}

type ButtonProps = Omit<ComponentProps<'button'>, 'children'> & {
  variant?: ButtonVariant;
  size?: ButtonSize;
  /** Work is on its way: the button waits and says so. */
  busy?: boolean;
  busyLabel?: string;
  icon?: ReactNode;
  children: ReactNode;
};

export function Button({
  variant = 'plain',
  size = 'normal',
  busy = false,
  busyLabel,
  icon,
  className,
  children,
  type = 'button',
  disabled,
  onKeyDown,
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      disabled={disabled || busy}
      aria-busy={busy || undefined}
      onKeyDown={(event) => {
        // A key held down is one press: nothing is cut, saved or deleted twice by a heavy thumb.
        if (event.repeat && event.key === 'Enter') event.preventDefault();
        onKeyDown?.(event);
      }}
      className={look(variant, size, className)}
    >
      {icon}
      {busy ? (busyLabel ?? children) : children}
    </button>
  );
}

type LinkButtonProps = Omit<LinkProps, 'children'> & {
  variant?: ButtonVariant;
  size?: ButtonSize;
  icon?: ReactNode;
  children: ReactNode;
};

/** Looks like a button, goes somewhere: a link to the browser and to a screen reader. */
export function LinkButton({
  variant = 'plain',
  size = 'normal',
  icon,
  className,
  children,
  ...rest
}: LinkButtonProps) {
  return (
    <Link {...rest} className={look(variant, size, className)}>
      {icon}
      {children}
    </Link>
  );
}
