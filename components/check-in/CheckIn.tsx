'use client';

import { useState } from 'react';
import type { UnitReadiness } from '@/lib/schemas/availability';
import type { CheckIn as CheckedIn } from '@/lib/schemas/check-in';
import { CheckInForm } from './CheckInForm';
import { CheckInResult } from './CheckInResult';

/** Taking one unit back: the number first, then what happened. */
export function CheckIn({ unit, now }: { unit: UnitReadiness; now: string }) {
  const [done, setDone] = useState<CheckedIn | null>(null);
  return done ? (
    <CheckInResult unit={unit} done={done} />
  ) : (
    <CheckInForm unit={unit} now={now} onDone={setDone} />
  );
}
