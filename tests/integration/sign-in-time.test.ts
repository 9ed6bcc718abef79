import { expect, test } from 'vitest';
import { signIn } from '@/lib/actions/sign-in';
import { SYSTEM } from '@/lib/domain/access';
import { testDatabase } from '../support/database';
import { addStaff } from '../support/people';

const database = testDatabase();
const ROUNDS = 11;

async function timeRefusal(email: string, round: number): Promise<number> {
  const from = performance.now();
  const input = { email, password: 'not the password', address: `203.0.113.${round}`, deviceToken: null };
  // A day between the rounds, so that no attempt has to wait for an earlier one.
  const now = new Date(Date.UTC(2026, 0, 1 + 2 * round));
  await expect(signIn({ db: database.db, actor: SYSTEM, now }, input)).rejects.toThrow('not right');
  return performance.now() - from;
}

const median = (times: number[]) => [...times].sort((a, b) => a - b)[Math.floor(times.length / 2)] ?? 0;

// A hash takes about ten times as long as the rest, so an answer without one would stand out by far more than two.
test('how long a refusal takes does not tell whether somebody has the address', async () => {
  const ada = await addStaff(database.db, 'Ada', 'manager');
  const [known, unknown]: number[][] = [[], []];
  for (let round = 0; round < ROUNDS; round += 1) {
    known!.push(await timeRefusal(ada.email, round));
    unknown!.push(await timeRefusal('nobody@wakewright.example', round));
  }
  const ratio = median(known!) / median(unknown!);
  expect(ratio).toBeGreaterThan(0.5);
  expect(ratio).toBeLessThan(2);
});
