import type { ReactNode } from 'react';

/** A part of the form that most entries do not need, opened and closed by one large tap. */
export function Disclosure({
  label,
  open,
  onToggle,
  children,
}: {
  label: string;
  open: boolean;
  onToggle: (open: boolean) => void;
  children: ReactNode;
}) {
  return (
    <section className={open ? 'border-l-4 border-line pl-4' : undefined}>
      <button
        type="button"
        aria-expanded={open}
        onClick={() => onToggle(!open)}
        className="flex min-h-dock w-full items-center gap-3 text-left text-lg font-semibold hover:bg-shoal"
      >
        <svg viewBox="0 0 20 20" className="size-5 shrink-0 text-line" aria-hidden="true">
          <path d={open ? 'M2 9h16v2H2z' : 'M9 2h2v7h7v2h-7v7H9v-7H2V9h7z'} fill="currentColor" />
        </svg>
        {label}
      </button>
      {open ? <div className="grid gap-4 pb-3">{children}</div> : null}
    </section>
  );
}
