import type { Step } from './procedure';

/**
 * What a version of a procedure has that the one before had not, in words, in the order of the steps: steps that are
 * new, that say something else, that are gone, and whether those that stayed stand in another order.
 */
export function describeChanges(before: readonly Step[], after: readonly Step[]): string[] {
  const earlier = new Map(before.map((step) => [step.key, step]));
  const later = new Set(after.map(({ key }) => key));
  const said = after.flatMap((step) => {
    const was = earlier.get(step.key);
    if (!was) return [`New: ${step.title}`];
    if (was.title !== step.title) return [`Changed: ${was.title} → ${step.title}`];
    return textOf(was) === textOf(step) ? [] : [`Changed: ${step.title}`];
  });
  const gone = before.filter(({ key }) => !later.has(key)).map(({ title }) => `Gone: ${title}`);
  const stayed = (steps: readonly Step[]) =>
    steps.filter(({ key }) => earlier.has(key) && later.has(key)).map(({ key }) => key);
  const moved = stayed(before).join() !== stayed(after).join() ? ['The order of the steps is another.'] : [];
  return [...said, ...gone, ...moved];
}

/** A step as text that does not depend on the order its fields were written in. */
function textOf(value: unknown): string {
  return JSON.stringify(value, (_, inner: unknown) =>
    inner !== null && typeof inner === 'object' && !Array.isArray(inner)
      ? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)))
      : inner,
  );
}
