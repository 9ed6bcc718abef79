// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { afterEach, expect, test } from 'vitest';
import { Keypad } from '@/components/ui/Keypad';
import { cleanTyped } from '@/components/ui/keypad-value';

afterEach(cleanup);

function Pad({ start = '', error, decimals }: { start?: string; error?: string; decimals?: number }) {
  const [value, setValue] = useState(start);
  return (
    <Keypad
      label="Engine hours"
      id="hours"
      suffix="h"
      value={value}
      onChange={setValue}
      error={error}
      decimals={decimals}
    />
  );
}

const field = () => screen.getByRole<HTMLInputElement>('textbox');
const press = (...names: string[]) =>
  names.forEach((name) => fireEvent.click(screen.getByRole('button', { name })));

test('hours are entered key by key with one decimal', () => {
  render(<Pad />);
  press('4', '1', '2', 'Decimal point', '7', '9');
  expect(field().value).toBe('412.7');
});

test('a second decimal point and a sixth whole digit change nothing', () => {
  render(<Pad />);
  press('1', '2', '3', '4', '5', '6', 'Decimal point', 'Decimal point', '8');
  expect(field().value).toBe('12345.8');
});

test('a leading zero is replaced, and a point first is read as nought point', () => {
  render(<Pad />);
  press('0', '7');
  expect(field().value).toBe('7');
  press('Delete last digit', 'Delete last digit', 'Decimal point', '5');
  expect(field().value).toBe('0.5');
});

test('a hardware keyboard may type with a comma; letters are left out', () => {
  render(<Pad />);
  fireEvent.change(field(), { target: { value: '41a2,75' } });
  expect(field().value).toBe('412.7');
  expect(cleanTyped('-3', 1, 5)).toBe('3');
});

test('whole numbers have no decimal key', () => {
  render(<Pad decimals={0} />);
  expect(screen.queryByRole('button', { name: 'Decimal point' })).toBeNull();
});

test('the error belongs to the field', () => {
  render(<Pad error="Lower than the last reading, 410.2 h" />);
  expect(field().getAttribute('aria-invalid')).toBe('true');
  expect(document.getElementById('hours-error')?.textContent).toContain('Lower than the last reading');
  expect(field().getAttribute('aria-describedby')).toBe('hours-error');
});
