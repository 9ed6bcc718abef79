import { z } from 'zod';
import { id } from './common';

export const closingsQuery = z.object({ ruleId: id });

/** That a rule's work was done on a unit, as `POST /rules/preview` takes it. */
export const closing = z.object({ on: z.string(), engineHours: z.number(), outings: z.int() });

export type ClosingShape = z.output<typeof closing>;
