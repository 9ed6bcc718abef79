const NATURAL = new Intl.Collator('en', { numeric: true, sensitivity: 'base' });

/** Orders fleet numbers as people count, in any case: 'J-9' before 'j-10'. */
export function compareFleetNumbers(a: string, b: string): number {
  return NATURAL.compare(a, b);
}
