import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';

/** What stands where units would be listed while there is none: the way to the first one, or who adds it. */
export function NoUnits({ title, mayAdd }: { title: string; mayAdd: boolean }) {
  return (
    <EmptyState
      title={title}
      action={
        mayAdd ? (
          <LinkButton kind="primary" size="large" href="/units/new">
            Add a unit
          </LinkButton>
        ) : null
      }
    >
      {mayAdd
        ? 'A unit is one craft of the fleet. Once it is here, this shows whether it may be launched.'
        : 'A unit is one craft of the fleet. A manager adds the first one.'}
    </EmptyState>
  );
}
