import { expect, test } from 'vitest';
import { dayText, instantText, relativeText } from '@/components/ui/time-text';

const at = (text: string) => new Date(text);

test('a day carries its weekday', () => {
  // Weekdays as in the examples of RFC 5545 section 3.8.5.3: 1997-09-02 is a Tuesday.
  expect(dayText('1997-09-02')).toBe('Tue 2 Sep 1997');
  expect(dayText('2012-02-29')).toBe('Wed 29 Feb 2012');
});

test.each(['2013-02-30', '1997-9-2', '', 'today'])('"%s" is refused as a day', (text) => {
  expect(() => dayText(text)).toThrow(RangeError);
});

test('an instant is shown in the time zone asked for, across its change to summer time', () => {
  // The European Union's summer time began on Sunday 29 March 2026 at 01:00 UTC.
  expect(instantText(at('2026-03-29T00:59:00Z'), 'Europe/Paris')).toBe('Sun 29 Mar 2026, 01:59');
  expect(instantText(at('2026-03-29T01:00:00Z'), 'Europe/Paris')).toBe('Sun 29 Mar 2026, 03:00');
  expect(instantText(at('2026-03-29T00:59:00Z'), 'America/New_York')).toBe('Sat 28 Mar 2026, 20:59');
});

test.each([
  ['2026-12-01T12:00:00Z', 'just now'],
  ['2026-12-01T11:59:01Z', 'just now'],
  ['2026-12-01T11:59:00Z', '1 minute ago'],
  ['2026-12-01T09:00:01Z', '2 hours ago'],
  ['2026-11-29T12:00:00Z', '2 days ago'],
  ['2026-12-02T12:00:00Z', 'in 1 day'],
])('from noon on 1 December, %s is "%s"', (instant, text) => {
  expect(relativeText(at(instant), at('2026-12-01T12:00:00Z'))).toBe(text);
});
