import { checkHullNumber } from '@/lib/domain/hull-number';
import { checkRegistration } from '@/lib/domain/registration';
import type { CheckedNumber } from '@/lib/domain/craft-number';
import { Refusal, type FieldError } from '@/lib/errors';

export type CraftNumbers = { hin: string | null; registration: string | null };

/**
 * The numbers on a craft in their one spelling. At a dock of US craft they follow 33 CFR 181.25 (hull) and
 * 33 CFR 174.23 (registration); at any other dock they are taken as they are.
 * Throws `invalid_input` on `hin`, `registration` or both.
 */
export function checkCraftNumbers(rules: 'us' | 'other', numbers: CraftNumbers): CraftNumbers {
  if (rules === 'other') return numbers;
  const errors: FieldError[] = [];
  const spell = (path: string, text: string | null, check: (text: string) => CheckedNumber) => {
    if (text === null) return null;
    const checked = check(text);
    if (checked.ok) return checked.value;
    errors.push({ path, message: checked.reason });
    return null;
  };
  const spelt = {
    hin: spell('hin', numbers.hin, checkHullNumber),
    registration: spell('registration', numbers.registration, checkRegistration),
  };
  if (errors.length === 0) return spelt;
  throw new Refusal('invalid_input', errors.map((error) => error.message).join(' '), errors);
}

/** What the unique indexes of `unit` say of a number that another unit has. */
export const UNIT_TAKEN: Record<string, [path: string, message: string]> = {
  unit_fleet_number: ['fleetNumber', 'A unit has that fleet number already.'],
  unit_hin: ['hin', 'A unit has that hull number already.'],
};
