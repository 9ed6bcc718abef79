import { z } from 'zod';
import { MEASURED_UNITS } from '@/lib/domain/measured-value';
import type { Limits } from '@/lib/domain/measurement';
import { id, listOf } from './common';

/** A measured quantity over engine hours. Pressure is in pascals, length in millimetres; `unit` is for showing. */
const series = z.object({
  spec: z.string(),
  unit: z.enum(MEASURED_UNITS),
  limits: z.custom<Limits>((value) => typeof value === 'object' && value !== null).nullable(),
  places: z.array(
    z.object({
      /** 0 for the unit as a whole, else the number of the carburettor, cylinder or engine. */
      place: z.int(),
      points: z.array(
        z.object({
          engineHours: z.number(),
          value: z.number(),
          stage: z.enum(['found', 'left']),
          taskId: id,
        }),
      ),
      /** Null where there is too little to say so. */
      trend: z.object({ towards: z.enum(['min', 'max']), hoursLeft: z.number() }).nullable(),
    }),
  ),
});

export const measurements = listOf(series);
export type Measurements = z.output<typeof measurements>;
export type MeasuredSeries = z.output<typeof series>;
