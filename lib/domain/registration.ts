import type { CheckedNumber } from './craft-number';

const refuse = (reason: string): CheckedNumber => ({ ok: false, reason });

/**
 * Checks a vessel's registration number against 33 CFR 174.23: two letters of the state, then up to four
 * digits and up to two letters, or up to three digits and up to three letters; no I, O or Q in the suffix.
 * At least one digit and one letter of suffix are asked for. Read in any spacing and case, returned as the
 * regulation writes it: 'NH 1234 BD'. Whether the state exists is not checked.
 */
export function checkRegistration(text: string): CheckedNumber {
  const [, state, digits, suffix] =
    /^([A-Z]{2})(\d+)([A-Z]+)$/.exec(text.toUpperCase().replace(/[\s-]/g, '')) ?? [];
  if (!state || !digits || !suffix) {
    return refuse('A registration is two letters, digits and letters, such as NH 1234 BD.');
  }
  if (!(digits.length <= 4 && suffix.length <= 2) && !(digits.length <= 3 && suffix.length <= 3)) {
    return refuse('A registration has up to 4 digits and 2 letters, or up to 3 digits and 3 letters.');
  }
  if (/[IOQ]/.test(suffix)) return refuse('The last letters of a registration are never I, O or Q.');
  return { ok: true, value: `${state} ${digits} ${suffix}` };
}
