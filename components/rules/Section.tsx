import type { ReactNode } from 'react';

/** One question of a form, with its answer's fields below. */
export function Section({ title, hint, children }: { title: string; hint?: ReactNode; children: ReactNode }) {
  return (
    <section className="grid gap-4 border-t-2 border-line pt-4">
      <div>
        <h2 className="text-xl">{title}</h2>
        {hint ? <p className="mt-1 max-w-prose text-ink-soft">{hint}</p> : null}
      </div>
      {children}
    </section>
  );
}
