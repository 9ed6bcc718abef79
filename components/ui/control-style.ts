/** The look of every box one types or chooses in. */
export const controlClass =
  'block w-full min-w-0 min-h-target rounded border-2 border-edge bg-raised px-3 py-2 text-ink ' +
  'hover:border-ink disabled:cursor-not-allowed disabled:border-dashed disabled:bg-paper disabled:text-ink-soft ' +
  'aria-invalid:border-danger';

/** The same for boxes one types in, which may be locked; a list cannot be. */
export const textControlClass = `${controlClass} read-only:border-dashed read-only:bg-paper`;
