/**
 * The date-based examples of RFC 5545 section 3.8.5.3, all of them, in the section's order and in its own
 * notation for the expected dates ("September 2-11;October 1"). Seen: the section's text as quoted in two
 * independent public test suites, which agree. The section starts everything at 09:00 in New York; rules here
 * are date-only, so an UNTIL given as an instant becomes the last day whose 09:00 is not after it.
 */
import { describe, expect, it } from 'vitest';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import { type ParsedRecurrence, occurrencesBetween, parseRecurrence } from '@/lib/domain/recurrence';

const MONTHS = 'January February March April May June July August September October November December'.split(
  ' ',
);

const pad = (value: number) => String(value).padStart(2, '0');

/** "1997 September 2-4;October 1" as days. */
function days(...lines: string[]): CalendarDay[] {
  return lines.flatMap((line) => {
    const [year, rest] = [line.slice(0, 4), line.slice(5)];
    return rest.split(';').flatMap((group) => {
      const [month = '', list = ''] = group.split(' ');
      return list.split(',').flatMap((piece) => {
        const [first = 0, last = first] = piece.split('-').map(Number);
        return Array.from(
          { length: last - first + 1 },
          (_, index) => `${year}-${pad(MONTHS.indexOf(month) + 1)}-${pad(first + index)}`,
        );
      });
    });
  });
}

function read(text: string) {
  const parsed = parseRecurrence(text);
  if (!parsed.ok) throw new Error(parsed.reason);
  return parsed.recurrence;
}

type Example = { says: string; start: CalendarDay; rules: string[]; gives: CalendarDay[]; ends: boolean };
const ENDS = true;
const GOES_ON = false;
const example = (
  says: string,
  start: CalendarDay,
  rules: string | string[],
  ends: boolean,
  ...lines: string[]
): Example => ({ says, start, rules: [rules].flat(), gives: days(...lines), ends });

const EXAMPLES: Example[] = [
  example('daily for 10 occurrences', '1997-09-02', 'FREQ=DAILY;COUNT=10', ENDS, '1997 September 2-11'),
  example(
    'daily until December 24, 1997',
    '1997-09-02',
    'FREQ=DAILY;UNTIL=19971223',
    ENDS,
    '1997 September 2-30;October 1-31;November 1-30;December 1-23',
  ),
  example(
    'every other day',
    '1997-09-02',
    'FREQ=DAILY;INTERVAL=2',
    GOES_ON,
    '1997 September 2,4,6,8,10,12,14,16,18,20,22,24,26,28,30',
    '1997 October 2,4,6,8,10,12,14,16,18,20,22,24,26,28,30',
    '1997 November 1,3,5,7,9,11,13,15,17,19,21,23,25,27,29;December 1,3',
  ),
  example(
    'every 10 days, 5 occurrences',
    '1997-09-02',
    'FREQ=DAILY;INTERVAL=10;COUNT=5',
    ENDS,
    '1997 September 2,12,22;October 2,12',
  ),
  example(
    'every day in January, for 3 years',
    '1998-01-01',
    [
      'FREQ=YEARLY;UNTIL=20000131;BYMONTH=1;BYDAY=SU,MO,TU,WE,TH,FR,SA',
      'FREQ=DAILY;UNTIL=20000131;BYMONTH=1',
    ],
    ENDS,
    '1998 January 1-31',
    '1999 January 1-31',
    '2000 January 1-31',
  ),
  example(
    'weekly for 10 occurrences',
    '1997-09-02',
    'FREQ=WEEKLY;COUNT=10',
    ENDS,
    '1997 September 2,9,16,23,30;October 7,14,21,28;November 4',
  ),
  example(
    'weekly until December 24, 1997',
    '1997-09-02',
    'FREQ=WEEKLY;UNTIL=19971223',
    ENDS,
    '1997 September 2,9,16,23,30;October 7,14,21,28;November 4,11,18,25;December 2,9,16,23',
  ),
  example(
    'every other week',
    '1997-09-02',
    'FREQ=WEEKLY;INTERVAL=2;WKST=SU',
    GOES_ON,
    '1997 September 2,16,30;October 14,28;November 11,25;December 9,23',
    '1998 January 6,20;February 3,17',
  ),
  example(
    'weekly on Tuesday and Thursday for five weeks',
    '1997-09-02',
    ['FREQ=WEEKLY;UNTIL=19971006;WKST=SU;BYDAY=TU,TH', 'FREQ=WEEKLY;COUNT=10;WKST=SU;BYDAY=TU,TH'],
    ENDS,
    '1997 September 2,4,9,11,16,18,23,25,30;October 2',
  ),
  example(
    'every other week on Monday, Wednesday, and Friday until December 24, 1997',
    '1997-09-01',
    'FREQ=WEEKLY;INTERVAL=2;UNTIL=19971223;WKST=SU;BYDAY=MO,WE,FR',
    ENDS,
    '1997 September 1,3,5,15,17,19,29;October 1,3,13,15,17,27,29,31',
    '1997 November 10,12,14,24,26,28;December 8,10,12,22',
  ),
  example(
    'every other week on Tuesday and Thursday, for 8 occurrences',
    '1997-09-02',
    'FREQ=WEEKLY;INTERVAL=2;COUNT=8;WKST=SU;BYDAY=TU,TH',
    ENDS,
    '1997 September 2,4,16,18,30;October 2,14,16',
  ),
  example(
    'monthly on the first Friday for 10 occurrences',
    '1997-09-05',
    'FREQ=MONTHLY;COUNT=10;BYDAY=1FR',
    ENDS,
    '1997 September 5;October 3;November 7;December 5',
    '1998 January 2;February 6;March 6;April 3;May 1;June 5',
  ),
  example(
    'monthly on the first Friday until December 24, 1997',
    '1997-09-05',
    'FREQ=MONTHLY;UNTIL=19971223;BYDAY=1FR',
    ENDS,
    '1997 September 5;October 3;November 7;December 5',
  ),
  example(
    'every other month on the first and last Sunday of the month for 10 occurrences',
    '1997-09-07',
    'FREQ=MONTHLY;INTERVAL=2;COUNT=10;BYDAY=1SU,-1SU',
    ENDS,
    '1997 September 7,28;November 2,30',
    '1998 January 4,25;March 1,29;May 3,31',
  ),
  example(
    'monthly on the second-to-last Monday of the month for 6 months',
    '1997-09-22',
    'FREQ=MONTHLY;COUNT=6;BYDAY=-2MO',
    ENDS,
    '1997 September 22;October 20;November 17;December 22',
    '1998 January 19;February 16',
  ),
  example(
    'monthly on the third-to-the-last day of the month',
    '1997-09-28',
    'FREQ=MONTHLY;BYMONTHDAY=-3',
    GOES_ON,
    '1997 September 28;October 29;November 28;December 29',
    '1998 January 29;February 26',
  ),
  example(
    'monthly on the 2nd and 15th of the month for 10 occurrences',
    '1997-09-02',
    'FREQ=MONTHLY;COUNT=10;BYMONTHDAY=2,15',
    ENDS,
    '1997 September 2,15;October 2,15;November 2,15;December 2,15',
    '1998 January 2,15',
  ),
  example(
    'monthly on the first and last day of the month for 10 occurrences',
    '1997-09-30',
    'FREQ=MONTHLY;COUNT=10;BYMONTHDAY=1,-1',
    ENDS,
    '1997 September 30;October 1,31;November 1,30;December 1,31',
    '1998 January 1,31;February 1',
  ),
  example(
    'every 18 months on the 10th thru 15th of the month for 10 occurrences',
    '1997-09-10',
    'FREQ=MONTHLY;INTERVAL=18;COUNT=10;BYMONTHDAY=10,11,12,13,14,15',
    ENDS,
    '1997 September 10,11,12,13,14,15',
    '1999 March 10,11,12,13',
  ),
  example(
    'every Tuesday, every other month',
    '1997-09-02',
    'FREQ=MONTHLY;INTERVAL=2;BYDAY=TU',
    GOES_ON,
    '1997 September 2,9,16,23,30;November 4,11,18,25',
    '1998 January 6,13,20,27;March 3,10,17,24,31',
  ),
  example(
    'yearly in June and July for 10 occurrences',
    '1997-06-10',
    'FREQ=YEARLY;COUNT=10;BYMONTH=6,7',
    ENDS,
    ...[1997, 1998, 1999, 2000, 2001].map((year) => `${year} June 10;July 10`),
  ),
  example(
    'every other year on January, February, and March for 10 occurrences',
    '1997-03-10',
    'FREQ=YEARLY;INTERVAL=2;COUNT=10;BYMONTH=1,2,3',
    ENDS,
    '1997 March 10',
    ...[1999, 2001, 2003].map((year) => `${year} January 10;February 10;March 10`),
  ),
  example(
    'every third year on the 1st, 100th, and 200th day for 10 occurrences',
    '1997-01-01',
    'FREQ=YEARLY;INTERVAL=3;COUNT=10;BYYEARDAY=1,100,200',
    ENDS,
    '1997 January 1;April 10;July 19',
    '2000 January 1;April 9;July 18',
    '2003 January 1;April 10;July 19',
    '2006 January 1',
  ),
  example(
    'every 20th Monday of the year',
    '1997-05-19',
    'FREQ=YEARLY;BYDAY=20MO',
    GOES_ON,
    '1997 May 19',
    '1998 May 18',
    '1999 May 17',
  ),
  example(
    'Monday of week number 20',
    '1997-05-12',
    'FREQ=YEARLY;BYWEEKNO=20;BYDAY=MO',
    GOES_ON,
    '1997 May 12',
    '1998 May 11',
    '1999 May 17',
  ),
  example(
    'every Thursday in March',
    '1997-03-13',
    'FREQ=YEARLY;BYMONTH=3;BYDAY=TH',
    GOES_ON,
    '1997 March 13,20,27',
    '1998 March 5,12,19,26',
    '1999 March 4,11,18,25',
  ),
  example(
    'every Thursday, but only during June, July, and August',
    '1997-06-05',
    'FREQ=YEARLY;BYDAY=TH;BYMONTH=6,7,8',
    GOES_ON,
    '1997 June 5,12,19,26;July 3,10,17,24,31;August 7,14,21,28',
    '1998 June 4,11,18,25;July 2,9,16,23,30;August 6,13,20,27',
    '1999 June 3,10,17,24;July 1,8,15,22,29;August 5,12,19,26',
  ),
  example(
    'every Friday the 13th (the section leaves its start out with EXDATE; here it never fits)',
    '1997-09-02',
    'FREQ=MONTHLY;BYDAY=FR;BYMONTHDAY=13',
    GOES_ON,
    '1998 February 13;March 13;November 13',
    '1999 August 13',
    '2000 October 13',
  ),
  example(
    'the first Saturday that follows the first Sunday of the month',
    '1997-09-13',
    'FREQ=MONTHLY;BYDAY=SA;BYMONTHDAY=7,8,9,10,11,12,13',
    GOES_ON,
    '1997 September 13;October 11;November 8;December 13',
    '1998 January 10;February 7;March 7;April 11;May 9;June 13',
  ),
  example(
    'every 4 years, the first Tuesday after a Monday in November',
    '1996-11-05',
    'FREQ=YEARLY;INTERVAL=4;BYMONTH=11;BYDAY=TU;BYMONTHDAY=2,3,4,5,6,7,8',
    GOES_ON,
    '1996 November 5',
    '2000 November 7',
    '2004 November 2',
  ),
  example(
    'the third instance into the month of one of Tuesday, Wednesday, or Thursday, for 3 months',
    '1997-09-04',
    'FREQ=MONTHLY;COUNT=3;BYDAY=TU,WE,TH;BYSETPOS=3',
    ENDS,
    '1997 September 4;October 7;November 6',
  ),
  example(
    'the second-to-last weekday of the month',
    '1997-09-29',
    'FREQ=MONTHLY;BYDAY=MO,TU,WE,TH,FR;BYSETPOS=-2',
    GOES_ON,
    '1997 September 29;October 30;November 27;December 30',
    '1998 January 29;February 26;March 30',
  ),
  example(
    'days generated make a difference because of WKST: Monday',
    '1997-08-05',
    'FREQ=WEEKLY;INTERVAL=2;COUNT=4;BYDAY=TU,SU;WKST=MO',
    ENDS,
    '1997 August 5,10,19,24',
  ),
  example(
    'days generated make a difference because of WKST: Sunday',
    '1997-08-05',
    'FREQ=WEEKLY;INTERVAL=2;COUNT=4;BYDAY=TU,SU;WKST=SU',
    ENDS,
    '1997 August 5,17,19,31',
  ),
  example(
    'an invalid date, February 30, is ignored',
    '2007-01-15',
    'FREQ=MONTHLY;BYMONTHDAY=15,30;COUNT=5',
    ENDS,
    '2007 January 15,30;February 15;March 15,30',
  ),
];

describe('RFC 5545 section 3.8.5.3', () => {
  it('has 35 date-based examples here', () => {
    expect(EXAMPLES).toHaveLength(35);
  });

  for (const { says, start, rules, gives, ends } of EXAMPLES) {
    it.each(rules)(`${says}: %s`, (text) => {
      const rule = read(text);
      const last = gives.at(-1)!;
      expect(gives.length).toBeGreaterThan(2);
      expect(occurrencesBetween(rule, start, '1990-01-01', last)).toEqual(gives);
      const later = occurrencesBetween(rule, start, last, '2040-12-31').length - 1;
      expect(later > 0).toBe(!ends);
    });
  }

  it('is the same entered at any of its own occurrences, as an old rule is', () => {
    for (const { start, rules, gives } of EXAMPLES) {
      for (const [index, from] of gives.entries()) {
        const found = occurrencesBetween(read(rules[0]!), start, from, gives.at(-1)!);
        expect(found, `${rules[0]} from ${from}`).toEqual(gives.slice(index));
      }
    }
  });
});

const refusal = (text: string): Extract<ParsedRecurrence, { ok: false }> => {
  const parsed = parseRecurrence(text);
  if (parsed.ok) throw new Error(`${text} was accepted`);
  return parsed;
};

describe('what the section has and a date-only rule has not', () => {
  it.each([
    ['every 3 hours', 'FREQ=HOURLY;INTERVAL=3;UNTIL=19970902T170000Z', 'FREQ'],
    ['every 15 minutes', 'FREQ=MINUTELY;INTERVAL=15;COUNT=6', 'FREQ'],
    ['every hour and a half', 'FREQ=MINUTELY;INTERVAL=90;COUNT=4', 'FREQ'],
    ['every 20 minutes, as days', 'FREQ=DAILY;BYHOUR=9,10,11;BYMINUTE=0,20,40', 'BYHOUR'],
    ['every 20 minutes', 'FREQ=MINUTELY;INTERVAL=20;BYHOUR=9,10,11', 'FREQ'],
    ['an UNTIL with a time of day', 'FREQ=DAILY;UNTIL=19971224T000000Z', 'UNTIL'],
  ])('%s is refused, naming the part', (_, text, part) => {
    expect(refusal(text)).toMatchObject({ part, reason: expect.stringMatching(`^${part} `) });
  });
});

describe('what RFC 5545 section 3.3.10 forbids is refused, naming the part', () => {
  it.each([
    ['', 'rule'],
    ['MONTHLY', 'MONTHLY'],
    ['FREQ=', 'FREQ='],
    ['INTERVAL=2', 'FREQ'],
    ['FREQ=FORTNIGHTLY', 'FREQ'],
    ['FREQ=DAILY;FREQ=WEEKLY', 'FREQ'],
    ['FREQ=DAILY;INTERVAL=0', 'INTERVAL'],
    ['FREQ=DAILY;INTERVAL=-1', 'INTERVAL'],
    ['FREQ=DAILY;INTERVAL=1.5', 'INTERVAL'],
    ['FREQ=DAILY;COUNT=0', 'COUNT'],
    ['FREQ=DAILY;COUNT=1e3', 'COUNT'],
    ['FREQ=DAILY;COUNT=3;UNTIL=20300101', 'UNTIL'],
    ['FREQ=DAILY;UNTIL=20300230', 'UNTIL'],
    ['FREQ=WEEKLY;BYMONTHDAY=1', 'BYMONTHDAY'],
    ['FREQ=MONTHLY;BYMONTHDAY=0', 'BYMONTHDAY'],
    ['FREQ=MONTHLY;BYMONTHDAY=32', 'BYMONTHDAY'],
    ['FREQ=MONTHLY;BYMONTHDAY=1,', 'BYMONTHDAY'],
    ['FREQ=DAILY;BYYEARDAY=1', 'BYYEARDAY'],
    ['FREQ=WEEKLY;BYYEARDAY=1', 'BYYEARDAY'],
    ['FREQ=MONTHLY;BYYEARDAY=1', 'BYYEARDAY'],
    ['FREQ=YEARLY;BYYEARDAY=367', 'BYYEARDAY'],
    ['FREQ=MONTHLY;BYWEEKNO=20;BYDAY=MO', 'BYWEEKNO'],
    ['FREQ=YEARLY;BYWEEKNO=54;BYDAY=MO', 'BYWEEKNO'],
    ['FREQ=YEARLY;BYWEEKNO=20;BYDAY=1MO', 'BYDAY'],
    ['FREQ=WEEKLY;BYDAY=1MO', 'BYDAY'],
    ['FREQ=DAILY;BYDAY=-1MO', 'BYDAY'],
    ['FREQ=MONTHLY;BYDAY=XX', 'BYDAY'],
    ['FREQ=MONTHLY;BYDAY=0MO', 'BYDAY'],
    ['FREQ=YEARLY;BYMONTH=13', 'BYMONTH'],
    ['FREQ=MONTHLY;BYSETPOS=1', 'BYSETPOS'],
    ['FREQ=MONTHLY;BYDAY=MO;BYSETPOS=0', 'BYSETPOS'],
    ['FREQ=DAILY;WKST=XX', 'WKST'],
    ['FREQ=DAILY;BYSECOND=1', 'BYSECOND'],
    ['RSCALE=GREGORIAN;FREQ=MONTHLY;SKIP=FORWARD', 'RSCALE'],
    ['FREQ=MONTHLY;SKIP=BACKWARD', 'SKIP'],
    ['FREQ=DAILY;X-NAME=1', 'X-NAME'],
    ['FREQ=DAILY;BYEASTER=1', 'BYEASTER'],
    ['DTSTART:20260101\nRRULE:FREQ=DAILY', 'DTSTART:20260101\nRRULE:FREQ=DAILY'],
  ])('%s', (text, part) => {
    expect(refusal(text).part).toBe(part);
  });

  it.each([
    // Not forbidden, refused here: the week's day would have to be guessed.
    ['FREQ=YEARLY;BYWEEKNO=20', 'BYWEEKNO'],
    // Not forbidden, refused here: a sixth Monday of a month never comes.
    ['FREQ=MONTHLY;BYDAY=6MO', 'BYDAY'],
    ['FREQ=YEARLY;BYMONTH=3;BYDAY=20MO', 'BYDAY'],
    // Limits of our own.
    ['FREQ=YEARLY;INTERVAL=100', 'INTERVAL'],
    ['FREQ=DAILY;INTERVAL=10000', 'INTERVAL'],
    ['FREQ=DAILY;COUNT=10000', 'COUNT'],
  ])('%s is refused by our own limits', (text, part) => {
    expect(refusal(text).part).toBe(part);
  });
});

describe('RFC 7529, SKIP', () => {
  const yearly = read('FREQ=YEARLY');
  const monthly = read('FREQ=MONTHLY');

  it('OMIT, the default, leaves a missing day out (section 4.1)', () => {
    expect(occurrencesBetween(yearly, '2012-02-29', '2012-01-01', '2020-12-31')).toEqual([
      '2012-02-29',
      '2016-02-29',
      '2020-02-29',
    ]);
  });

  it('BACKWARD takes the last day before it, where section 4.3.4 shows FORWARD taking 1 March', () => {
    expect(occurrencesBetween(yearly, '2012-02-29', '2012-01-01', '2017-12-31', 'backward')).toEqual([
      '2012-02-29',
      '2013-02-28',
      '2014-02-28',
      '2015-02-28',
      '2016-02-29',
      '2017-02-28',
    ]);
  });

  it('BACKWARD from the 31st takes the last day of every month, by hand', () => {
    expect(occurrencesBetween(monthly, '2014-01-31', '2014-01-01', '2014-06-30', 'backward')).toEqual([
      '2014-01-31',
      '2014-02-28',
      '2014-03-31',
      '2014-04-30',
      '2014-05-31',
      '2014-06-30',
    ]);
  });

  it('counts a day moved back as an occurrence of COUNT, and a day left out as none', () => {
    const thrice = read('FREQ=MONTHLY;COUNT=3');
    const within = ['2014-01-31', '2014-01-01', '2015-12-31'] as const;
    expect(occurrencesBetween(thrice, ...within)).toEqual(['2014-01-31', '2014-03-31', '2014-05-31']);
    expect(occurrencesBetween(thrice, ...within, 'backward')).toEqual([
      '2014-01-31',
      '2014-02-28',
      '2014-03-31',
    ]);
  });
});

describe('rules that never fit a day', () => {
  it.each([
    ['a 30th of February', 'FREQ=DAILY;BYMONTH=2;BYMONTHDAY=30'],
    ['the same by month', 'FREQ=MONTHLY;BYMONTH=2;BYMONTHDAY=30'],
    ['the same by year', 'FREQ=YEARLY;BYMONTH=2;BYMONTHDAY=30'],
    ['the same with a COUNT', 'FREQ=YEARLY;BYMONTH=2;BYMONTHDAY=30;COUNT=3'],
    ['a leap day in odd years', 'FREQ=YEARLY;INTERVAL=2;BYMONTH=2;BYMONTHDAY=29'],
    ['a place the set does not have', 'FREQ=MONTHLY;BYDAY=MO;BYSETPOS=6'],
    ['each seventh day on another weekday', 'FREQ=DAILY;INTERVAL=7;BYDAY=SA'],
  ])('%s has no occurrence and ends', (_, text) => {
    expect(occurrencesBetween(read(text), '2013-06-07', '2013-01-01', '2999-12-31')).toEqual([]);
  });
});
