const weekdays = ['Sun', 'Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat'];
const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/**
 * A calendar day `YYYY-MM-DD` as "Thu 5 Jun 1997". Own names instead of the platform's, so that server and
 * browser draw the same letters. Throws a RangeError for text that is not a day.
 */
export function dayText(date: string): string {
  const match = /^(\d{4})-(\d{2})-(\d{2})$/.exec(date);
  const at = match ? new Date(`${date}T00:00:00Z`) : new Date(NaN);
  if (!match || Number.isNaN(at.getTime()) || at.getUTCDate() !== Number(match[3]))
    throw new RangeError(`not a calendar day: ${date}`);
  return `${weekdays[at.getUTCDay()]} ${at.getUTCDate()} ${months[at.getUTCMonth()]} ${at.getUTCFullYear()}`;
}

/** An instant as "Thu 5 Jun 1997, 14:05" in an IANA time zone. Throws a RangeError for an unknown zone. */
export function instantText(at: Date, timeZone: string): string {
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  }).formatToParts(at);
  const part = (type: Intl.DateTimeFormatPartTypes) => parts.find((each) => each.type === type)?.value ?? '';
  const day = dayText(`${part('year').padStart(4, '0')}-${part('month')}-${part('day')}`);
  return `${day}, ${part('hour')}:${part('minute')}`;
}

const steps = [
  { seconds: 86_400, one: 'day', many: 'days' },
  { seconds: 3_600, one: 'hour', many: 'hours' },
  { seconds: 60, one: 'minute', many: 'minutes' },
] as const;

/** How far `at` is from `now`, in whole units rounded down: "3 hours ago", "in 2 days", "just now". */
export function relativeText(at: Date, now: Date): string {
  const seconds = Math.floor(Math.abs(now.getTime() - at.getTime()) / 1000);
  const step = steps.find((each) => seconds >= each.seconds);
  if (!step) return 'just now';
  const count = Math.floor(seconds / step.seconds);
  const amount = `${count} ${count === 1 ? step.one : step.many}`;
  return at.getTime() <= now.getTime() ? `${amount} ago` : `in ${amount}`;
}
