import { formatMeasured } from './measured-value';
import type { EntryValue } from './procedure';
import { countOf } from './words';

const OUTCOMES = { pass: 'pass', fail: 'fail', not_applicable: 'does not apply' };

/** What was entered, in a few words: 'fail: cracked', '25 psi, 25 psi', 'taken back'. */
export function describeValue(value: EntryValue): string {
  if (value.kind === 'check') return OUTCOMES[value.outcome] + (value.note ? `: ${value.note}` : '');
  if (value.kind === 'measurement')
    return value.runs.map((run) => formatMeasured(run.value, run.unit)).join(', ');
  if (value.kind === 'note') return `“${value.text}”`;
  if (value.kind === 'photo') return countOf(value.attachmentIds.length, 'picture');
  return 'taken back';
}
