import type { ComponentProps } from 'react';
import { buttonClass, type ButtonKind, type ButtonSize } from './button-style';
import { cx } from './cx';

export type ButtonProps = ComponentProps<'button'> & {
  kind?: ButtonKind;
  size?: ButtonSize;
  wide?: boolean;
  /** Shows that the press is being worked on, and takes no second one. */
  busy?: boolean;
};

/** A button; submits nothing unless `type="submit"` is given. */
export function Button({
  kind = 'secondary',
  size = 'normal',
  wide = false,
  busy = false,
  type = 'button',
  disabled,
  className,
  children,
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      disabled={disabled || busy}
      aria-busy={busy || undefined}
      className={cx(buttonClass(kind, size, wide), className)}
    >
      {children}
      {busy ? <span aria-hidden="true">…</span> : null}
    </button>
  );
}
