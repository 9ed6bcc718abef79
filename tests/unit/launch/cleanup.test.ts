import { expect, test } from 'vitest';
import { createCleanup } from '@/lib/launch/cleanup';

test('what was started is stopped, latest first, once', async () => {
  const stopped: string[] = [];
  const cleanup = createCleanup();
  for (const name of ['database', 'worker', 'web']) cleanup.add(name, () => stopped.push(name));
  await Promise.all([cleanup.run(), cleanup.run()]);
  expect(stopped).toEqual(['web', 'worker', 'database']);
});

test('one that cannot be stopped is named and the rest is stopped', async () => {
  const stopped: string[] = [];
  const said: string[] = [];
  const cleanup = createCleanup((line) => said.push(line));
  cleanup.add('database', () => stopped.push('database'));
  cleanup.add('worker', () => Promise.reject(new Error('it is stuck')));
  await cleanup.run();
  expect(stopped).toEqual(['database']);
  expect(said).toEqual(['  worker could not be stopped: it is stuck']);
});

test('what is started while everything stops is stopped too', async () => {
  const stopped: string[] = [];
  const cleanup = createCleanup();
  cleanup.add('build', () => cleanup.add('web', () => stopped.push('web')));
  await cleanup.run();
  await cleanup.run();
  expect(stopped).toEqual(['web']);
});
