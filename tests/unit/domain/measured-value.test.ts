import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  formatMeasured,
  fromKept,
  listUnitsLike,
  MEASURED_UNITS,
  parseMeasured,
  toKept,
  type MeasuredUnit,
} from '@/lib/domain/measured-value';

const read = (text: string, unit: MeasuredUnit) => parseMeasured(text, unit);
const valueOf = (text: string, unit: MeasuredUnit) => {
  const parsed = read(text, unit);
  if ('fault' in parsed) throw new Error(`${text}: ${parsed.fault}`);
  return parsed.value;
};
const faultOf = (text: string, unit: MeasuredUnit) => {
  const parsed = read(text, unit);
  return 'fault' in parsed ? parsed.fault : null;
};

test.each(['1 1/4', '1¼', '1 ¼', '1.25', '1,25', '5/4', '1 1/4 turns', '1.25 turn', ' 1.25 '])(
  'one and a quarter turns may be said as “%s”',
  (text) => {
    expect(read(text, 'turns')).toEqual({ typed: text.trim(), unit: 'turns', value: 1.25 });
  },
);

test('a unit of measure after the number wins over the usual one, and what was typed is kept', () => {
  expect(read('2 bar', 'psi')).toEqual({ typed: '2 bar', unit: 'bar', value: 200_000 });
  expect(valueOf('150 kPa', 'psi')).toBe(150_000);
  expect(valueOf('25', 'psi')).toBe(valueOf('25 PSI', 'kPa'));
  expect(valueOf('0.040 in', 'mm')).toBeCloseTo(1.016, 12);
  expect(valueOf('3 °C', '°C')).toBe(3);
  expect(valueOf('-3', '°C')).toBe(-3);
});

test.each([
  ['', 'turns', 'is empty'],
  ['a bit', 'turns', 'is not a number as 1.25, 1 1/4 or 1¼'],
  ['1.2.3', 'psi', 'is not in a unit known here: use psi, kPa, bar'],
  ['1/0', 'turns', 'divides by zero'],
  ['25 mm', 'psi', 'is in mm, not in psi'],
  ['25 furlongs', 'psi', 'is not in a unit known here: use psi, kPa, bar'],
  ['1e5', 'psi', 'is not in a unit known here: use psi, kPa, bar'],
] as const)('“%s” in %s %s', (text, unit, fault) => {
  expect(faultOf(text, unit)).toBe(fault);
});

test.each([
  ['1¼ turns', 1.25, 'turns'],
  ['¼ turn', 0.25, 'turns'],
  ['1 turn', 1, 'turns'],
  ['0 turns', 0, 'turns'],
  ['2⅜ turns', 2.375, 'turns'],
  ['1.3 turns', 1.3, 'turns'],
  ['10 V', 10, 'V'],
  ['100', 100, ''],
  ['−3.5 °C', -3.5, '°C'],
] as const)('is shown as %s', (text, value, unit) => {
  expect(formatMeasured(value, unit)).toBe(text);
});

test('what is shown reads back as the same value, in every unit of measure', () => {
  fc.assert(
    fc.property(fc.constantFrom(...MEASURED_UNITS), fc.integer({ min: 0, max: 99_999 }), (unit, tenths) => {
      const number = tenths / (unit === 'turns' ? 8 : 10);
      const shown = formatMeasured(toKept(number, unit), unit);
      expect(fromKept(valueOf(shown, unit), unit)).toBeCloseTo(number, 9);
    }),
  );
});

test('an entry may be typed in any unit of the same dimension, the usual one first', () => {
  expect(listUnitsLike('bar')).toEqual(['bar', 'psi', 'kPa']);
  expect(listUnitsLike('turns')).toEqual(['turns']);
});
