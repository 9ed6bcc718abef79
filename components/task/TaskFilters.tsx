'use client';

import { usePathname, useRouter, useSearchParams } from 'next/navigation';
import { useId, useState } from 'react';
import { Button } from '@/components/ui/Button';
import { cx } from '@/components/ui/cx';
import { Select, type SelectOption } from '@/components/ui/Select';

export type Filter = { name: string; label: string; all: string; options: SelectOption[] };

/**
 * Narrows a screen by what stands in its address, so that it can be kept, sent and gone back to. A phone folds them
 * behind one button that says how many are set.
 */
export function TaskFilters({ filters }: { filters: Filter[] }) {
  const router = useRouter();
  const path = usePathname();
  const query = useSearchParams();
  const id = useId();
  const [unfolded, setUnfolded] = useState(false);
  const set = filters.filter(({ name }) => query.get(name)).length;
  function choose(name: string, value: string): void {
    const next = new URLSearchParams(query);
    if (value) next.set(name, value);
    else next.delete(name);
    next.delete('cursor');
    router.replace(next.size > 0 ? `${path}?${next}` : path, { scroll: false });
  }
  return (
    <div className="no-print grid gap-3">
      <Button
        className="justify-self-start sm:hidden"
        aria-expanded={unfolded}
        aria-controls={id}
        onClick={() => setUnfolded(!unfolded)}
      >
        {unfolded ? 'Fold filters away' : set > 0 ? `Filters: ${set} set` : 'Filters'}
      </Button>
      <div
        id={id}
        className={cx('grid-cols-2 gap-3 sm:flex sm:flex-wrap sm:items-end', unfolded ? 'grid' : 'hidden')}
      >
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
    </div>
  );
}
