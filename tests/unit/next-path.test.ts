import { expect, test } from 'vitest';
import { safeNext } from '@/lib/auth/next-path';

test.each(['/', '/tasks', '/units/7?tab=history', '/calendar?from=2026-07-01&to=2026-07-31#today'])(
  'signing in goes on to %s',
  (next) => {
    expect(safeNext(next)).toBe(next);
  },
);

// How browsers read an address (WHATWG URL): '\' is '/', tabs and line breaks are dropped.
test.each([
  null,
  undefined,
  '',
  'tasks',
  'https://elsewhere.example/',
  '//elsewhere.example',
  '/\\elsewhere.example',
  '/\t/elsewhere.example',
  '/\n/elsewhere.example',
  'javascript:alert(1)',
  '/tasks\\..\\x',
  '/sign-in?next=/tasks',
  '/api/v1/units',
])('signing in goes home instead of to %j', (next) => {
  expect(safeNext(next)).toBe('/');
});
