import type { ReactNode } from 'react';

export type Description = { term: ReactNode; detail: ReactNode; key?: string };

/** Terms and what they are: side by side where there is room, one below the other on a phone. */
export function DescriptionList({ items }: { items: Description[] }) {
  return (
    <dl className="grid content-start border-t border-hairline">
      {items.map((item, index) => (
        <div
          key={item.key ?? index}
          className="grid gap-x-6 border-b border-hairline py-2 sm:grid-cols-[11rem_1fr]"
        >
          <dt className="text-ink-soft">{item.term}</dt>
          <dd className="min-w-0 font-medium break-words">{item.detail}</dd>
        </div>
      ))}
    </dl>
  );
}
