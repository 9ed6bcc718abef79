'use client';

import {
  createColumnHelper,
  createSortedRowModel,
  rowSortingFeature,
  tableFeatures,
  useTable,
  type Row,
  type SortingState,
} from '@tanstack/react-table';
import { useMemo, useState, type ReactNode } from 'react';
import { cx } from './cx';
import { SortControl } from './SortControl';

export type SortValue = string | number | null;

export type TableColumn = {
  id: string;
  header: string;
  /** Numbers stand at the end of their cell. */
  align?: 'start' | 'end';
  /** Sorts by the row's `sort[id]`. */
  sortable?: boolean;
};

export type TableRow = {
  key: string;
  cells: Record<string, ReactNode>;
  /** What each sortable column is ordered by; null and absent come last either way round. */
  sort?: Record<string, SortValue>;
};

const features = tableFeatures({ rowSortingFeature, sortedRowModel: createSortedRowModel() });
const helper = createColumnHelper<typeof features, TableRow>();

function compareValues(
  a: Row<typeof features, TableRow>,
  b: Row<typeof features, TableRow>,
  id: string,
): number {
  const [left, right] = [a.original.sort?.[id], b.original.sort?.[id]];
  if (typeof left === 'number' && typeof right === 'number') return left - right;
  return String(left).localeCompare(String(right), 'en', { numeric: true });
}

/**
 * A table whose headers sort and stay in sight, and whose rows become stacked entries on a phone. Rows are
 * plain data with drawn cells, so a server page can hand them over. `caption` names it for those who hear it.
 */
export function DataTable({
  caption,
  columns,
  rows,
  empty,
  initialSort,
}: {
  caption: string;
  columns: TableColumn[];
  rows: TableRow[];
  empty?: ReactNode;
  initialSort?: { id: string; desc?: boolean };
}) {
  const [sorting, setSorting] = useState<SortingState>(
    initialSort ? [{ id: initialSort.id, desc: initialSort.desc ?? false }] : [],
  );
  const tableColumns = useMemo(
    () =>
      helper.columns(
        columns.map((column) =>
          helper.accessor((row) => row.sort?.[column.id] ?? undefined, {
            id: column.id,
            header: column.header,
            enableSorting: column.sortable ?? false,
            sortFn: compareValues,
            sortUndefined: 'last',
            sortDescFirst: false,
          }),
        ),
      ),
    [columns],
  );
  const table = useTable({
    features,
    columns: tableColumns,
    data: rows,
    getRowId: (row) => row.key,
    state: { sorting },
    onSortingChange: setSorting,
  });
  if (rows.length === 0) return <>{empty ?? <p className="py-4 text-ink-soft">Nothing to show.</p>}</>;
  const current = sorting[0];
  return (
    <div className="grid gap-2">
      <SortControl columns={columns} current={current} onChange={(next) => setSorting(next ? [next] : [])} />
      <table role="table" className="data-table">
        <caption className="sr-only">{caption}</caption>
        <thead role="rowgroup">
          <tr role="row">
            {columns.map((column) => {
              const sorted =
                current?.id === column.id ? (current.desc ? 'descending' : 'ascending') : undefined;
              return (
                <th
                  key={column.id}
                  role="columnheader"
                  scope="col"
                  aria-sort={sorted}
                  className={cx(column.align === 'end' && 'text-right')}
                >
                  {column.sortable ? (
                    <button
                      type="button"
                      className="inline-flex min-h-target items-center gap-2 font-bold underline-offset-4 hover:underline"
                      onClick={() => table.getColumn(column.id)?.toggleSorting(sorted === 'ascending')}
                    >
                      {column.header}
                      <SortMark sorted={sorted} />
                    </button>
                  ) : (
                    <span className="inline-flex min-h-target items-center">{column.header}</span>
                  )}
                </th>
              );
            })}
          </tr>
        </thead>
        <tbody role="rowgroup">
          {table.getRowModel().rows.map((row) => (
            <tr key={row.id} role="row">
              {columns.map((column) => (
                <td key={column.id} role="cell" className={cx(column.align === 'end' && 'data-end')}>
                  <span aria-hidden="true" className="data-label">
                    {column.header}
                  </span>
                  <div className="min-w-0">{row.original.cells[column.id]}</div>
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function SortMark({ sorted }: { sorted: 'ascending' | 'descending' | undefined }) {
  return (
    <svg viewBox="0 0 10 16" className="h-4 w-2.5 shrink-0" aria-hidden="true">
      <path d="M5 1 9 6H1Z" fill={sorted === 'ascending' ? 'currentColor' : 'none'} stroke="currentColor" />
      <path
        d="M5 15 1 10h8Z"
        fill={sorted === 'descending' ? 'currentColor' : 'none'}
        stroke="currentColor"
      />
    </svg>
  );
}
