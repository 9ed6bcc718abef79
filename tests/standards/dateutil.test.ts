/** Generated rules against judges that share no code with ours: Debian's python3-dateutil, rrule-temporal, rrule.js. */
import { execFileSync } from 'node:child_process';
import path from 'node:path';
import fc from 'fast-check';
import * as rruleModule from 'rrule';
import { RRuleTemporal } from 'rrule-temporal';
import { Temporal } from 'temporal-polyfill';
import { describe, expect, it } from 'vitest';
import { occurrencesBetween, parseRecurrence } from '@/lib/domain/recurrence';
import { type RecurrenceCase, recurrenceCase } from '../support/recurrence-cases';

const RULES = 6_000;
const PARTS = 'COUNT UNTIL WKST BYMONTH BYWEEKNO BYYEARDAY BYMONTHDAY BYDAY BYSETPOS'.split(' ');

function expand({ rule, start, from, to }: RecurrenceCase): string[] {
  const parsed = parseRecurrence(rule);
  if (!parsed.ok) throw new Error(`${rule}: ${parsed.reason}`);
  return occurrencesBetween(parsed.recurrence, start, from, to);
}

function expandWithDateutil(cases: RecurrenceCase[]): string[][] {
  const script = path.join(import.meta.dirname, 'dateutil-oracle.py');
  const answer = execFileSync('/usr/bin/python3', [script], {
    input: JSON.stringify(cases),
    encoding: 'utf8',
    maxBuffer: 64 * 2 ** 20,
  });
  return JSON.parse(answer) as string[][];
}

function expandWithTemporal({ rule, start, from, to }: RecurrenceCase): string[] {
  const midnight = (day: string) => Temporal.PlainDate.from(day).toZonedDateTime('UTC');
  const until = (text: string) => text.replace(/UNTIL=(\d{8})/, 'UNTIL=$1T000000Z');
  const judge = new RRuleTemporal({
    rruleString: `DTSTART:${start.replaceAll('-', '')}T000000Z\nRRULE:${until(rule)}`,
  });
  return judge.between(midnight(from), midnight(to), true).map((at) => at.toPlainDate().toString());
}

/** Node shows the package as a default export, bundlers by name. */
const { rrulestr } =
  'rrulestr' in rruleModule ? rruleModule : (rruleModule as { default: typeof rruleModule }).default;

function expandWithRrule({ rule, start, from, to }: RecurrenceCase): string[] {
  const midnight = (day: string) => new Date(`${day}T00:00:00Z`);
  const found = rrulestr(rule, { dtstart: midnight(start) }).between(midnight(from), midnight(to), true);
  return found.map((at) => at.toISOString().slice(0, 10));
}

/** rrule.js 2.8.1 picks wrong BYSETPOS places, and looks to the year 9999 for a rule that fits no day. */
const isFairToRrule = (one: RecurrenceCase) => !one.rule.includes('BYSETPOS') && expand(one).length > 0;

/** rrule-temporal 2.2.8 adds up BYYEARDAY or BYMONTHDAY and BYDAY where RFC 5545 has BYDAY limit them. */
const isFairToTemporal = ({ rule }: RecurrenceCase) =>
  !(rule.includes('FREQ=YEARLY') && rule.includes('BYDAY') && /BYYEARDAY|BYMONTHDAY/.test(rule));

describe('generated rules', () => {
  it(`expand as python3-dateutil expands them, ${RULES} of them`, { timeout: 300_000 }, () => {
    const cases = fc.sample(recurrenceCase, { seed: 5545, numRuns: RULES });
    const judged = expandWithDateutil(cases);
    expect(judged).toHaveLength(RULES);
    const differing = cases
      .map((one, index) => ({ ...one, ours: expand(one).join(' '), theirs: judged[index]!.join(' ') }))
      .filter(({ ours, theirs }) => ours !== theirs);
    expect(differing).toEqual([]);
    const telling = judged.filter((days) => days.length > 0).length;
    expect(telling).toBeGreaterThan(RULES / 2);
    for (const part of PARTS) {
      const having = cases.filter(
        ({ rule }, index) => rule.includes(`${part}=`) && judged[index]!.length > 0,
      );
      expect(having.length, part).toBeGreaterThan(100);
    }
  });

  it('expand as rrule-temporal expands them, 400 of them', { timeout: 300_000 }, () => {
    const cases = fc
      .sample(recurrenceCase, { seed: 7529, numRuns: 500 })
      .filter(isFairToTemporal)
      .slice(0, 400);
    expect(cases).toHaveLength(400);
    const differing = cases
      .map((one) => ({ ...one, ours: expand(one).join(' '), theirs: expandWithTemporal(one).join(' ') }))
      .filter(({ ours, theirs }) => ours !== theirs);
    expect(differing).toEqual([]);
  });
});

describe('generated rules that rrule.js can be asked', () => {
  it('expand as it expands them, 300 of them', { timeout: 300_000 }, () => {
    const cases = fc.sample(recurrenceCase, { seed: 281, numRuns: 900 }).filter(isFairToRrule).slice(0, 300);
    expect(cases).toHaveLength(300);
    const differing = cases
      .map((one) => ({ ...one, ours: expand(one).join(' '), theirs: expandWithRrule(one).join(' ') }))
      .filter(({ ours, theirs }) => ours !== theirs);
    expect(differing).toEqual([]);
  });
});

describe('weeks of the year', () => {
  it('are those of ISO 8601, as Python counts them, also over New Year', () => {
    const script = `
import datetime, json
first = datetime.date(1995, 1, 1)
days = [first + datetime.timedelta(days=n) for n in range(18263)]
print(json.dumps([[d.isoformat(), d.isocalendar()[1]] for d in days]))`;
    const weeks = JSON.parse(
      execFileSync('/usr/bin/python3', ['-c', script], { encoding: 'utf8', maxBuffer: 64 * 2 ** 20 }),
    ) as [string, number][];
    const last = weeks.at(-1)![0];
    for (const week of [1, 2, 26, 51, 52, 53]) {
      const rule = `FREQ=YEARLY;BYWEEKNO=${week};BYDAY=MO,TU,WE,TH,FR,SA,SU`;
      const expected = weeks.filter(([, number]) => number === week).map(([day]) => day);
      expect(expected.length).toBeGreaterThan(40);
      expect(expand({ rule, start: '1995-01-01', from: '1995-01-01', to: last }), rule).toEqual(expected);
    }
  });
});
