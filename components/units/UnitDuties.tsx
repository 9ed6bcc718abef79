import Link from 'next/link';
import { dueText, hoursText, KIND_WORDS, leftText, TRIGGER_WORDS } from '@/components/rules/due-words';
import { StateMark } from '@/components/state/StateMark';
import { CalendarDay } from '@/components/ui/CalendarDay';
import { DataTable, type TableColumn } from '@/components/ui/DataTable';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import type { UnitDuePoints, UnitDuty } from '@/lib/schemas/due-point';

const COLUMNS: TableColumn[] = [
  { id: 'rule', header: 'Rule', sortable: true },
  { id: 'state', header: 'State' },
  { id: 'due', header: 'Next due' },
  { id: 'left', header: 'To the due point' },
  { id: 'done', header: 'Last done' },
];

/** Every rule that is for the unit, worst first: where it is next due, what is left, and when it was last done. */
export function UnitDuties({ duties }: { duties: UnitDuePoints }) {
  if (duties.items.length === 0)
    return (
      <EmptyState
        title="No rule is for this unit"
        action={<LinkButton href="/rules">See the rules</LinkButton>}
      >
        Nothing comes due on it until a rule covers its model, dock and engine.
      </EmptyState>
    );
  return (
    <DataTable
      caption="What comes due on this unit"
      columns={COLUMNS}
      rows={duties.items.map((duty) => ({
        key: duty.ruleId,
        cells: {
          rule: (
            <div>
              <Link
                href={`/rules/${duty.ruleId}`}
                className="link inline-flex min-h-target items-center font-bold"
              >
                {duty.ruleName}
              </Link>
              <p className="text-sm text-ink-soft">
                {KIND_WORDS[duty.kind]}
                {duty.holdsUnit ? '' : ', does not hold the unit'}
              </p>
            </div>
          ),
          state: <StateMark state={duty.state} plain />,
          due: <Due duty={duty} />,
          left: <Left duty={duty} />,
          done: <LastDone duty={duty} />,
        },
        sort: { rule: duty.ruleName },
      }))}
    />
  );
}

function Due({ duty }: { duty: UnitDuty }) {
  return (
    <ul>
      {duty.triggers.map((trigger) => (
        <li key={trigger.index} className="numerals">
          {trigger.due ? dueText(trigger.due) : `${TRIGGER_WORDS[trigger.on]}: no more`}
        </li>
      ))}
    </ul>
  );
}

function Left({ duty }: { duty: UnitDuty }) {
  return (
    <ul>
      {duty.triggers.map((trigger) => (
        <li key={trigger.index} className="numerals">
          {trigger.left ? leftText(trigger.left) : '–'}
        </li>
      ))}
    </ul>
  );
}

function LastDone({ duty: { lastDone } }: { duty: UnitDuty }) {
  if (!lastDone) return <span className="text-ink-soft">No record</span>;
  return (
    <div>
      <CalendarDay date={lastDone.on} />
      <p className="numerals text-sm text-ink-soft">{hoursText(lastDone.engineHours)}</p>
    </div>
  );
}
