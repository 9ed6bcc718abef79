import Link from 'next/link';
import type { ComponentProps } from 'react';
import { buttonClass, type ButtonKind, type ButtonSize } from './button-style';
import { cx } from './cx';

export type LinkButtonProps = ComponentProps<typeof Link> & {
  kind?: ButtonKind;
  size?: ButtonSize;
  wide?: boolean;
};

/** A link to another screen that looks like a button. */
export function LinkButton({
  kind = 'secondary',
  size = 'normal',
  wide = false,
  className,
  ...rest
}: LinkButtonProps) {
  return <Link {...rest} className={cx(buttonClass(kind, size, wide), className)} />;
}
