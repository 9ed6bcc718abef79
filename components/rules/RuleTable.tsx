import Link from 'next/link';
import { StateMark } from '@/components/state/StateMark';
import { DataTable, type TableColumn } from '@/components/ui/DataTable';
import { describeRule } from '@/lib/domain/rule-words';
import type { ListedRule } from '@/lib/schemas/rule';
import { toSchedule } from '@/lib/schemas/schedule-shape';
import { KIND_WORDS } from './due-words';

const COLUMNS: TableColumn[] = [
  { id: 'name', header: 'Rule', sortable: true },
  { id: 'kind', header: 'Kind', sortable: true },
  { id: 'words', header: 'What it means' },
  { id: 'units', header: 'Units', align: 'end', sortable: true },
  { id: 'standing', header: 'Standing', sortable: true },
];
const SHOWN = ['overdue', 'due', 'upcoming'] as const;

/** The rules with what they mean and how the units under them stand. */
export function RuleTable({ rules }: { rules: ListedRule[] }) {
  return (
    <DataTable
      caption="Rules"
      columns={COLUMNS}
      initialSort={{ id: 'name' }}
      rows={rules.map((rule) => ({
        key: rule.id,
        cells: {
          name: (
            <Link
              href={`/rules/${rule.id}`}
              className="link inline-flex min-h-target items-center font-bold break-words"
            >
              {rule.name}
            </Link>
          ),
          kind: KIND_WORDS[rule.kind],
          words: <Meaning rule={rule} />,
          units: <span className="numerals">{rule.unitCount}</span>,
          standing: <Standing rule={rule} />,
        },
        sort: {
          name: rule.name,
          kind: rule.kind,
          units: rule.unitCount,
          standing: (rule.states.overdue * 1e4 + rule.states.due) * 1e4 + rule.states.upcoming,
        },
      }))}
    />
  );
}

/** The triggers in words, without window and lead: the form says it all. */
function Meaning({ rule }: { rule: ListedRule }) {
  const sentences = describeRule(toSchedule(rule), rule).slice(0, rule.triggers.length);
  return (
    <div className="grid max-w-prose gap-1">
      {sentences.map((sentence, index) => (
        <p key={index}>{sentence}</p>
      ))}
      {rule.endedAt ? (
        <p className="font-semibold">
          Ended {rule.endedBy ? `by ${rule.endedBy}` : ''}
          {rule.endReason ? `: ${rule.endReason}` : ''}
        </p>
      ) : rule.holdsUnit ? null : (
        <p className="text-ink-soft">Does not hold the unit.</p>
      )}
    </div>
  );
}

function Standing({ rule }: { rule: ListedRule }) {
  const shown = SHOWN.filter((state) => rule.states[state] > 0);
  if (rule.endedAt) return <span className="text-ink-soft">Ended</span>;
  if (shown.length === 0) return <StateMark state="clear" plain />;
  return (
    <ul className="grid gap-1">
      {shown.map((state) => (
        <li key={state} className="whitespace-nowrap">
          <StateMark state={state} detail={`· ${rule.states[state]}`} plain />
        </li>
      ))}
    </ul>
  );
}
