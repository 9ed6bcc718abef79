import type { SelectOption } from './Select';

/** What a list offers of things that have a name. */
export function namedOptions(things: readonly { id: string; name: string }[]): SelectOption[] {
  return things.map(({ id, name }) => ({ value: id, label: name }));
}

/** What a list offers of values that are shown in words. */
export function wordOptions(words: Record<string, string>): SelectOption[] {
  return Object.entries(words).map(([value, label]) => ({ value, label }));
}
