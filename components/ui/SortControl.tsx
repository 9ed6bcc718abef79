import { Select } from './Select';

/** The choice of order for stacked rows, where there are no headers to press. Seen on a phone only. */
export function SortControl({
  columns,
  current,
  onChange,
}: {
  columns: { id: string; header: string; sortable?: boolean }[];
  current: { id: string; desc: boolean } | undefined;
  onChange: (next: { id: string; desc: boolean } | null) => void;
}) {
  const sortable = columns.filter((column) => column.sortable);
  if (sortable.length === 0) return null;
  return (
    <div className="no-print sm:hidden">
      <Select
        label="Sort by"
        value={current ? `${current.desc ? 'desc' : 'asc'}:${current.id}` : ''}
        placeholder="As listed"
        options={sortable.flatMap((column) => [
          { value: `asc:${column.id}`, label: `${column.header}, upwards` },
          { value: `desc:${column.id}`, label: `${column.header}, downwards` },
        ])}
        onChange={(event) => {
          const [direction, id] = event.target.value.split(/:(.*)/s);
          onChange(id ? { id, desc: direction === 'desc' } : null);
        }}
      />
    </div>
  );
}
