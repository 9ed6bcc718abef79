import { cx } from './cx';

export type ButtonKind = 'primary' | 'secondary' | 'quiet' | 'danger';
export type ButtonSize = 'normal' | 'large';

const kinds: Record<ButtonKind, string> = {
  primary: 'border-act bg-act text-act-ink hover:border-act-over hover:bg-act-over',
  secondary: 'border-edge bg-raised text-ink hover:border-ink hover:bg-shoal',
  quiet: 'border-transparent bg-transparent text-line underline underline-offset-4 hover:bg-shoal',
  danger: 'border-danger-act bg-danger-act text-danger-ink hover:border-ink',
};

const sizes: Record<ButtonSize, string> = {
  normal: 'min-h-target min-w-target px-4 py-2',
  large: 'min-h-dock min-w-dock px-6 py-3 text-lg',
};

/** The look shared by buttons and links that act like one. `large` is the 56 px target. */
export function buttonClass(kind: ButtonKind, size: ButtonSize, wide: boolean): string {
  return cx(
    'inline-flex items-center justify-center gap-2 rounded-hull border-2 text-center font-semibold no-underline',
    'transition-colors disabled:cursor-not-allowed disabled:border-edge disabled:bg-paper disabled:text-ink-soft disabled:border-dashed',
    'aria-busy:cursor-progress',
    kinds[kind],
    sizes[size],
    wide && 'w-full',
  );
}
