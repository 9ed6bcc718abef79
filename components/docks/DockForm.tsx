'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { LinkButton } from '@/components/ui/LinkButton';
import { useToast } from '@/components/ui/Toast';
import { fieldError, send } from '@/lib/client/api';
import { textOf } from '@/lib/client/form-values';
import { listErrors } from '@/lib/client/list-errors';
import { useSend } from '@/lib/client/use-send';
import type { Dock } from '@/lib/schemas/dock';
import { DockFields } from './DockFields';

const LABELS = {
  name: 'Name',
  timeZone: 'Time zone',
  'season.from': 'First day of the season',
  'season.to': 'Last day of the season',
  openWeekdays: 'Open on',
  craftNumbers: 'Numbers on craft',
};

/** Adds a dock, or changes one; `mayWrite` false only shows it. */
export function DockForm({
  dock,
  timeZones,
  mayWrite,
}: {
  dock: Dock | null;
  timeZones: string[];
  mayWrite: boolean;
}) {
  const router = useRouter();
  const toast = useToast();
  const { busy, failure, run } = useSend();
  const [allYear, setAllYear] = useState(dock ? dock.season === null : true);
  const [left, setLeft] = useState(false);

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const { season, ...body } = readDock(event.currentTarget, allYear);
    const done = await run(() =>
      dock
        ? send<Dock>('PATCH', `/api/v1/docks/${dock.id}`, { ...body, season })
        : send<Dock>('POST', '/api/v1/docks', { ...body, ...(season && { season }) }),
    );
    if (!done) return;
    setLeft(true);
    toast({ text: `${done.data.name} is saved.` });
    router.push('/docks');
    router.refresh();
  }

  return (
    <form noValidate className="grid max-w-3xl gap-8" onSubmit={(event) => void submit(event)}>
      <ErrorSummary errors={listErrors(failure, LABELS)} title="The dock is not saved" />
      <DockFields
        dock={dock}
        timeZones={timeZones}
        allYear={allYear}
        onAllYear={setAllYear}
        disabled={!mayWrite}
        error={(path) => fieldError(failure, path)}
      />
      {mayWrite ? (
        <div className="flex flex-wrap gap-3 border-t-2 border-line pt-4">
          <Button type="submit" kind="primary" size="large" busy={busy || left}>
            {dock ? 'Save' : 'Add the dock'}
          </Button>
          <LinkButton kind="quiet" size="large" href="/docks">
            Cancel
          </LinkButton>
        </div>
      ) : null}
    </form>
  );
}

function readDock(form: HTMLFormElement, allYear: boolean) {
  return {
    name: textOf(form, 'name'),
    timeZone: textOf(form, 'timeZone').replaceAll(' ', '_'),
    openWeekdays: new FormData(form).getAll('openWeekdays'),
    craftNumbers: textOf(form, 'craftNumbers'),
    season: allYear ? null : { from: textOf(form, 'season.from'), to: textOf(form, 'season.to') },
  };
}
