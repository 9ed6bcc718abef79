import Link from 'next/link';
import type { ReactNode } from 'react';
import type { Part } from '@/lib/schemas/part';
import { PER_WORDS } from './part-words';

/** What a kit holds, which kits hold a part, which rules ask for it, and for which work it is set aside. */
export function PartUses({ part }: { part: Part }) {
  const { contents, inKits, rules, reservedFor } = part;
  return (
    <>
      {part.isKit ? (
        <Uses title="What the kit holds" none="Nothing yet: change the kit to say what is in it.">
          {contents.map(({ partId, number, name, quantity }) => (
            <Use key={partId} quantity={quantity} href={`/parts/${partId}`} name={name} after={number} />
          ))}
        </Uses>
      ) : null}
      {inKits.length > 0 ? (
        <Uses title="In kits">
          {inKits.map(({ id, name, quantity }) => (
            <Use key={id} quantity={quantity} href={`/parts/${id}`} name={name} />
          ))}
        </Uses>
      ) : null}
      <Uses title="Rules that ask for it" none="No rule in force asks for it.">
        {rules.map(({ id, name, quantity, per }) => (
          <Use
            key={`${id}${per}`}
            quantity={quantity}
            href={`/rules/${id}`}
            name={name}
            after={PER_WORDS[per]}
          />
        ))}
      </Uses>
      {reservedFor.length > 0 ? (
        <Uses title="Set aside for">
          {reservedFor.map(({ taskId, title, fleetNumber, dockName, quantity }) => (
            <Use
              key={`${taskId}${dockName}`}
              quantity={quantity}
              href={`/tasks/${taskId}`}
              name={`${title} on ${fleetNumber}`}
              after={`at ${dockName}`}
            />
          ))}
        </Uses>
      ) : null}
    </>
  );
}

function Uses({ title, none, children }: { title: string; none?: string; children: ReactNode[] }) {
  return (
    <section className="grid gap-1">
      <h2 className="text-xl">{title}</h2>
      {children.length > 0 ? <ul>{children}</ul> : <p className="text-ink-soft">{none}</p>}
    </section>
  );
}

function Use({
  quantity,
  href,
  name,
  after,
}: {
  quantity: number;
  href: string;
  name: string;
  after?: string;
}) {
  return (
    <li className="flex flex-wrap items-center gap-x-3 border-b border-hairline">
      <span className="numerals min-w-8 text-right font-bold">{quantity} ×</span>
      <Link href={href} className="link inline-flex min-h-target items-center">
        {name}
      </Link>
      {after ? <span className="text-ink-soft">{after}</span> : null}
    </li>
  );
}
