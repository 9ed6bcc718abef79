import { z } from 'zod';
import { line } from './common';
import { createDock, dock } from './dock';
import { email, newPassword, person } from './person';

export const setUp = z.strictObject({
  token: z.string('give the token printed at start').trim().min(1, 'is empty').max(200, 'is no token'),
  operatorName: line(80),
  dock: createDock,
  manager: z.strictObject({ name: line(80), email, password: newPassword }),
});

export const setUpDone = z.object({ operatorName: z.string(), dock, manager: person });

export type SetUp = z.output<typeof setUp>;
export type SetUpDone = z.output<typeof setUpDone>;
