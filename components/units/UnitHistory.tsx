import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { SectionNav } from '@/components/ui/SectionNav';
import type { UnitPage } from '@/lib/schemas/fleet';
import { HISTORY_KINDS } from '@/lib/schemas/history';
import { HistoryItem } from './HistoryItem';
import { HISTORY_WORDS } from './unit-words';

/** What happened to the unit, the latest first: one list, narrowed by kind, a page at a time. */
export function UnitHistory({ page }: { page: UnitPage }) {
  const { unit, history, timeZone, may } = page;
  const address = (query: string) => `/units/${unit.id}${query && `?${query}`}#history`;
  const ofKind = history.kind ? `kind=${history.kind}` : '';
  return (
    <section id="history" className="grid scroll-mt-4 gap-4">
      <h2 className="text-2xl">History</h2>
      <SectionNav
        label="Kinds of history"
        sections={[
          { href: address(''), label: 'Everything', current: history.kind === null },
          ...HISTORY_KINDS.map((kind) => ({
            href: address(`kind=${kind}`),
            label: HISTORY_WORDS[kind],
            current: history.kind === kind,
          })),
        ]}
      />
      {history.items.length === 0 ? (
        <EmptyState title="Nothing here">
          {history.kind ? 'Nothing of this kind has happened to the unit yet.' : 'Nothing is recorded yet.'}
        </EmptyState>
      ) : (
        <ol className="grid border-l-4 border-line">
          {history.items.map((entry) => (
            <HistoryItem key={entry.id} entry={entry} timeZone={timeZone} mayVoid={may.voidReading} />
          ))}
        </ol>
      )}
      <div className="flex flex-wrap gap-2">
        {history.paged ? <LinkButton href={address(ofKind)}>Latest</LinkButton> : null}
        {history.nextCursor ? (
          <LinkButton href={address([ofKind, `cursor=${history.nextCursor}`].filter(Boolean).join('&'))}>
            Earlier
          </LinkButton>
        ) : null}
      </div>
    </section>
  );
}
