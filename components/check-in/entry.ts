import { formatTenths } from '@/lib/domain/meter';
import type { CreateCheckIn } from '@/lib/schemas/check-in';

/** What is typed on the check-in screen. */
export type Typed = {
  hours: string;
  swapped: boolean;
  oldFinal: string;
  newFirst: string;
  faulty: boolean;
  title: string;
  detail: string;
  holdsUnit: boolean;
  reason: string;
};

export const NOTHING: Typed = {
  hours: '',
  swapped: false,
  oldFinal: '',
  newFirst: '',
  faulty: false,
  title: '',
  detail: '',
  holdsUnit: true,
  reason: '',
};

type Body = Omit<CreateCheckIn, 'at' | 'hours' | 'meterSwap'> & {
  hours: number | string;
  meterSwap?: { oldFinal: number | string; newFirst: number | string };
};

/** A number as the API takes it; what is none is sent as it was typed, for the server to say what is wrong. */
function number(text: string): number | string {
  return /^\d+(\.\d*)?$/.test(text.trim()) ? Number(text) : text;
}

/** The body of the check-in. */
export function toBody(id: string, unitId: string, typed: Typed): Body {
  return {
    id,
    unitId,
    hours: number(typed.hours),
    ...(typed.swapped && {
      meterSwap: { oldFinal: number(typed.oldFinal), newFirst: number(typed.newFirst) },
    }),
    ...(typed.faulty && {
      defect: {
        title: typed.title,
        holdsUnit: typed.holdsUnit,
        ...(typed.detail.trim() && { detail: typed.detail }),
      },
    }),
    ...(typed.reason.trim() && { confirmReason: typed.reason }),
  };
}

/** What the typed number says against the last reading, as one types: null while there is no number. */
export function describeRun(typed: Typed, lastShown: number): { text: string; lower: boolean } | null {
  if (typed.swapped || !/^\d+(\.\d*)?$/.test(typed.hours)) return null;
  const tenths = Math.round(Number(typed.hours) * 10) - Math.round(lastShown * 10);
  if (tenths < 0)
    return {
      text: `${formatTenths(-tenths)} h less than the last reading. Read the meter again.`,
      lower: true,
    };
  return { text: `${formatTenths(tenths)} h since the last reading.`, lower: false };
}
