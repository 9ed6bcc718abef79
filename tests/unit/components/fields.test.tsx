// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, expect, test } from 'vitest';
import { Checkbox } from '@/components/ui/Checkbox';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { NumberInput } from '@/components/ui/NumberInput';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { Select } from '@/components/ui/Select';
import { TextInput } from '@/components/ui/TextInput';

afterEach(cleanup);

test('a field is found by its label and described by its hint and error', () => {
  render(<TextInput name="fleetNumber" label="Fleet number" hint="As painted" error="Already taken" />);
  const input = screen.getByLabelText('Fleet number');
  expect(input.id).toBe('fleetNumber');
  expect(input.getAttribute('aria-describedby')).toBe('fleetNumber-hint fleetNumber-error');
  expect(input.getAttribute('aria-invalid')).toBe('true');
  expect(document.getElementById('fleetNumber-error')?.textContent).toBe('Error: Already taken');
});

test('a field without an error is not marked invalid', () => {
  render(<TextInput name="fleetNumber" label="Fleet number" />);
  const input = screen.getByLabelText('Fleet number');
  expect(input.hasAttribute('aria-invalid')).toBe(false);
  expect(input.hasAttribute('aria-describedby')).toBe(false);
});

test('a number names its unit of measure and asks for a decimal keypad', () => {
  render(<NumberInput name="hours" label="Engine hours" suffix="h" />);
  const input = screen.getByLabelText('Engine hours (h)');
  expect(input.getAttribute('inputmode')).toBe('decimal');
  expect(input.getAttribute('type')).toBe('text');
});

test('a choice from a list reports what was chosen', () => {
  const chosen: string[] = [];
  render(
    <Select
      name="dock"
      label="Dock"
      options={[
        { value: 'a', label: 'North Basin' },
        { value: 'b', label: 'Mill Quay' },
      ]}
      onChange={(event) => chosen.push(event.target.value)}
    />,
  );
  fireEvent.change(screen.getByLabelText('Dock'), { target: { value: 'b' } });
  expect(chosen).toEqual(['b']);
});

test('one of a few is chosen with radio buttons in a named group', () => {
  render(
    <RadioGroup
      name="anchor"
      label="Counts from"
      defaultValue="scheduled"
      options={[
        { value: 'scheduled', label: 'Schedule' },
        { value: 'completed', label: 'Completion' },
      ]}
    />,
  );
  expect(screen.getByRole('radiogroup', { name: 'Counts from' })).toBeTruthy();
  const completed = screen.getByRole<HTMLInputElement>('radio', { name: 'Completion' });
  fireEvent.click(completed);
  expect(completed.checked).toBe(true);
  expect(screen.getByRole<HTMLInputElement>('radio', { name: 'Schedule' }).checked).toBe(false);
});

test('a checkbox is ticked through its label', () => {
  render(<Checkbox name="holdsUnit" label="Holds the unit" />);
  fireEvent.click(screen.getByText('Holds the unit'));
  expect(screen.getByRole<HTMLInputElement>('checkbox').checked).toBe(true);
});

test('the error summary takes the focus and links each message to its field', () => {
  const { rerender } = render(<ErrorSummary errors={[]} />);
  expect(screen.queryByRole('alert')).toBeNull();
  rerender(
    <ErrorSummary
      errors={[
        { path: 'hours', message: 'Enter the engine hours' },
        { path: '', message: 'The unit is out' },
      ]}
    />,
  );
  expect(document.activeElement).toBe(screen.getByRole('alert'));
  expect(screen.getByRole('link', { name: 'Enter the engine hours' }).getAttribute('href')).toBe('#hours');
  expect(screen.getByText('The unit is out').closest('a')).toBeNull();
});
