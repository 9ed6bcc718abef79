import { LinkButton } from '@/components/ui/LinkButton';
import type { UnitPage } from '@/lib/schemas/fleet';
import { EndLayUp } from './EndLayUp';
import { LayUpUnit } from './LayUpUnit';
import { ReportDefect } from './ReportDefect';

/** What the person may do to the unit, as a row of buttons. */
export function UnitActions({ page, me }: { page: UnitPage; me: string }) {
  const { unit, may, layUp, today } = page;
  const named = { id: unit.id, fleetNumber: unit.fleetNumber };
  return (
    <>
      {may.reportDefect ? <ReportDefect unit={named} me={me} /> : null}
      {may.layUp && layUp ? <EndLayUp unit={named} layUpId={layUp.id} /> : null}
      {may.layUp && !layUp ? <LayUpUnit unit={named} today={today} /> : null}
      {may.openTask ? <LinkButton href={`/tasks/new?unit=${unit.id}`}>Open a task</LinkButton> : null}
      {may.change ? <LinkButton href={`/units/${unit.id}/edit`}>Change</LinkButton> : null}
    </>
  );
}
