/** Numbers on craft against the Code of Federal Regulations, both sections seen in full. */
import { describe, expect, it } from 'vitest';
import { checkHullNumber } from '@/lib/domain/hull-number';
import { checkRegistration } from '@/lib/domain/registration';

// The section gives no whole number; these are made up from its paragraphs (a) to (d).
describe('hull identification numbers, 33 CFR 181.25', () => {
  it.each([
    ['ABC12345A282', 'twelve characters: maker, serial, January, year, model year'],
    ['XYZ0W9K7L383', 'letters and digits in the serial; December is L'],
    ['OIQ12345A282', 'I, O and Q are barred from the serial only'],
    ['ABC12345D404', 'certified in April of a year ending in 4, model year 04'],
  ])('%s is one: %s', (text) => {
    expect(checkHullNumber(text)).toEqual({ ok: true, value: text });
  });

  it.each(['abc12345a282', 'ABC-12345-A2-82', ' ABC 12345 A282 ', 'US-ABC12345A282'])(
    '%s is read as ABC12345A282',
    (text) => {
      expect(checkHullNumber(text)).toEqual({ ok: true, value: 'ABC12345A282' });
    },
  );

  it.each([
    ['', 'has 12 characters; this one has 0'],
    ['ABC12345A28', 'has 12 characters; this one has 11'],
    ['ABC12345A2828', 'has 12 characters; this one has 13'],
    ['ABC1234IA282', 'no letters I, O or Q'],
    ['ABCO2345A282', 'no letters I, O or Q'],
    ['ABC12Q45A282', 'no letters I, O or Q'],
    ['ABC12345M282', 'a letter for the month'],
    ['ABC123451282', 'a letter for the month'],
    ['ABC12345AB82', 'the last digit of the year'],
    ['ABC12345A2X2', 'the last two digits of the model year'],
    ['ABC12345A28é', 'letters A to Z and digits only'],
  ])('%s is refused: %s', (text, reason) => {
    const checked = checkHullNumber(text);
    expect(checked).toMatchObject({ ok: false, reason: expect.stringContaining(reason) });
  });
});

describe('registrations, 33 CFR 174.23', () => {
  it.each([
    ['NH 1234 BD', 'the example of paragraph (a)(1)'],
    ['WN 567 EFG', 'the example of paragraph (a)(2)'],
    ['FL 1 A', 'not more than four digits and two letters'],
    ['IO 12 AB', 'letters of the state may be I and O, only the suffix may not'],
  ])('%s is one: %s', (text) => {
    expect(checkRegistration(text)).toEqual({ ok: true, value: text });
  });

  it.each(['nh1234bd', 'NH-1234-BD', ' NH  1234 BD '])('%s is read as NH 1234 BD', (text) => {
    expect(checkRegistration(text)).toEqual({ ok: true, value: 'NH 1234 BD' });
  });

  it.each([
    ['', 'two letters, digits and letters'],
    ['NH 1234', 'two letters, digits and letters'],
    ['N 1234 BD', 'two letters, digits and letters'],
    ['NHX 1234 BD', 'two letters, digits and letters'],
    ['NH 1234 BDE', 'up to 4 digits and 2 letters'],
    ['NH 12345 B', 'up to 4 digits and 2 letters'],
    ['WN 567 EFGH', 'up to 3 digits and 3 letters'],
    ['NH 1234 BI', 'never I, O or Q'],
    ['NH 1234 OB', 'never I, O or Q'],
    ['WN 567 EQG', 'never I, O or Q'],
  ])('%s is refused: %s', (text, reason) => {
    const checked = checkRegistration(text);
    expect(checked).toMatchObject({ ok: false, reason: expect.stringContaining(reason) });
  });
});
