'use client';

import { useState } from 'react';
import { Checkbox } from '@/components/ui/Checkbox';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { fieldError, type Failure } from '@/lib/client/api';
import type { Role } from '@/lib/domain/access';
import { ROLE_OPTIONS, type NamedDock } from './words';

/** What somebody is and where they work. Its fields are `role`, `where` and `dock`. */
export function RoleAndDocks({
  docks,
  role,
  dockIds,
  failure,
}: {
  docks: NamedDock[];
  role: Role;
  dockIds: readonly string[];
  failure: Failure | null;
}) {
  const [where, setWhere] = useState(dockIds.length === 0 ? 'all' : 'some');
  const docksError = failure?.errors.find((error) => error.path.startsWith('dockIds'))?.message;
  return (
    <>
      <RadioGroup
        name="role"
        id="role"
        label="Role"
        options={ROLE_OPTIONS}
        defaultValue={role}
        error={fieldError(failure, 'role')}
      />
      <RadioGroup
        name="where"
        id="dockIds"
        label="Works at"
        options={[
          { value: 'all', label: 'All docks' },
          { value: 'some', label: 'Some docks only' },
        ]}
        value={where}
        onChange={(event) => setWhere(event.target.value)}
        error={docksError}
      />
      {where === 'some' ? (
        <fieldset className="grid pl-9">
          <legend className="sr-only">Which docks</legend>
          {docks.map((dock) => (
            <Checkbox
              key={dock.id}
              id={`dock-${dock.id}`}
              name="dock"
              value={dock.id}
              label={dock.name}
              defaultChecked={dockIds.includes(dock.id)}
            />
          ))}
        </fieldset>
      ) : null}
    </>
  );
}

/** What the fields say; null docks when "some" was chosen and none was named. */
export function readRoleAndDocks(form: HTMLFormElement): { role: string; dockIds: string[] | null } {
  const given = new FormData(form);
  const named = given.getAll('dock').map(String);
  const some = given.get('where') === 'some';
  return { role: String(given.get('role')), dockIds: some ? (named.length > 0 ? named : null) : [] };
}
