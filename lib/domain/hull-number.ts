import type { CheckedNumber } from './craft-number';

const refuse = (reason: string): CheckedNumber => ({ ok: false, reason });

/**
 * Checks a hull identification number against 33 CFR 181.25: twelve characters, three of the maker's code,
 * five of a serial number without I, O and Q, a letter for the month of certification (A January to L
 * December), the last digit of its year, two digits of the model year.
 *
 * Spaces, hyphens and slashes are dropped, as is the country "US" before the twelve; letters become capitals.
 * The regulation does not say the maker's code is letters only, so digits pass in it.
 */
export function checkHullNumber(text: string): CheckedNumber {
  const bare = text.toUpperCase().replace(/[\s/-]/g, '');
  const value = bare.length === 14 && bare.startsWith('US') ? bare.slice(2) : bare;
  if (/[^A-Z0-9]/.test(value)) return refuse('A hull number has letters A to Z and digits only.');
  if (value.length !== 12) {
    return refuse(`A hull number has 12 characters; this one has ${value.length}.`);
  }
  if (/[IOQ]/.test(value.slice(3, 8))) {
    return refuse('The serial number, characters 4 to 8, has no letters I, O or Q.');
  }
  if (!/[A-L]/.test(value[8]!)) {
    return refuse('Character 9 is a letter for the month, A (January) to L (December).');
  }
  if (!/\d/.test(value[9]!)) return refuse('Character 10 is the last digit of the year of certification.');
  if (!/^\d\d$/.test(value.slice(10))) {
    return refuse('Characters 11 and 12 are the last two digits of the model year.');
  }
  return { ok: true, value };
}
