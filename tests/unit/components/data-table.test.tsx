// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { afterEach, expect, test } from 'vitest';
import { DataTable, type TableColumn, type TableRow } from '@/components/ui/DataTable';

afterEach(cleanup);

const columns: TableColumn[] = [
  { id: 'unit', header: 'Unit', sortable: true },
  { id: 'hours', header: 'Engine hours', align: 'end', sortable: true },
  { id: 'note', header: 'Note' },
];
const row = (unit: string, hours: number | null): TableRow => ({
  key: unit,
  cells: { unit, hours: hours === null ? 'no reading' : `${hours} h`, note: '' },
  sort: { unit, hours },
});
const rows = [row('NB-10', 88), row('NB-2', null), row('NB-1', 412.7)];

const shown = () =>
  screen
    .getAllByRole('row')
    .slice(1)
    .map((line) => within(line).getAllByRole('cell')[0]?.querySelector('div')?.textContent);
const header = (name: string) => screen.getByRole('columnheader', { name });

test('rows stand as given until a header is pressed', () => {
  render(<DataTable caption="Units" columns={columns} rows={rows} />);
  expect(screen.getByRole('table', { name: 'Units' })).toBeTruthy();
  expect(shown()).toEqual(['NB-10', 'NB-2', 'NB-1']);
});

test('numbers sort as numbers, upwards first, and what is missing comes last both ways', () => {
  render(<DataTable caption="Units" columns={columns} rows={rows} />);
  fireEvent.click(within(header('Engine hours')).getByRole('button'));
  expect(shown()).toEqual(['NB-10', 'NB-1', 'NB-2']);
  expect(header('Engine hours').getAttribute('aria-sort')).toBe('ascending');
  fireEvent.click(within(header('Engine hours')).getByRole('button'));
  expect(shown()).toEqual(['NB-1', 'NB-10', 'NB-2']);
  expect(header('Engine hours').getAttribute('aria-sort')).toBe('descending');
});

test('fleet numbers sort by their number, not letter by letter', () => {
  render(<DataTable caption="Units" columns={columns} rows={rows} initialSort={{ id: 'unit' }} />);
  expect(shown()).toEqual(['NB-1', 'NB-2', 'NB-10']);
});

test('a phone sorts with a list, since stacked rows have no headers', () => {
  render(<DataTable caption="Units" columns={columns} rows={rows} />);
  fireEvent.change(screen.getByLabelText('Sort by'), { target: { value: 'desc:unit' } });
  expect(shown()).toEqual(['NB-10', 'NB-2', 'NB-1']);
  fireEvent.change(screen.getByLabelText('Sort by'), { target: { value: 'asc:unit' } });
  expect(shown()).toEqual(['NB-1', 'NB-2', 'NB-10']);
});

test('a column that does not sort has no button', () => {
  render(<DataTable caption="Units" columns={columns} rows={rows} />);
  expect(within(header('Note')).queryByRole('button')).toBeNull();
});

test('without rows the empty state stands in place of the table', () => {
  render(<DataTable caption="Units" columns={columns} rows={[]} empty={<p>No units yet</p>} />);
  expect(screen.queryByRole('table')).toBeNull();
  expect(screen.getByText('No units yet')).toBeTruthy();
});
