'use client';

import { usePathname, useRouter, useSearchParams } from 'next/navigation';
import { Select, type SelectOption } from '@/components/ui/Select';

export type Filter = { name: string; label: string; all: string; options: SelectOption[] };

/** Narrows a screen by what stands in its address, so that it can be kept, sent and gone back to. */
export function TaskFilters({ filters }: { filters: Filter[] }) {
  const router = useRouter();
  const path = usePathname();
  const query = useSearchParams();
  function choose(name: string, value: string): void {
    const next = new URLSearchParams(query);
    if (value) next.set(name, value);
    else next.delete(name);
    next.delete('cursor');
    router.replace(next.size > 0 ? `${path}?${next}` : path, { scroll: false });
  }
  return (
    <div className="no-print grid grid-cols-2 gap-3 sm:flex sm:flex-wrap sm:items-end">
      {filters.map(({ name, label, all, options }) => (
        <Select
          key={name}
          name={name}
          label={label}
          placeholder={all}
          options={options}
          value={query.get(name) ?? ''}
          onChange={(event) => choose(name, event.target.value)}
        />
      ))}
    </div>
  );
}
