import { randomUUID } from 'node:crypto';
import { expect } from 'vitest';
import { createRule } from '@/lib/actions/create-rule';
import type { PartNeed } from '@/lib/domain/rule';
import { createRule as createRuleInput } from '@/lib/schemas/rule';
import type { Closure, TaskPage } from '@/lib/schemas/task';
import type { TaskParts } from '@/lib/schemas/task-parts';
import { asSystem, openDock } from './crew';
import type { testDatabase } from './database';
import type { testApi } from './http';
import { addPart, onShelves, stockUp } from './stock';

/** A twin at home, a dock elsewhere, a carburettor kit and a plug of which there are none yet, and who works there. */
export async function makeWorkshop({ db }: ReturnType<typeof testDatabase>, api: ReturnType<typeof testApi>) {
  const home = await openDock(db);
  const south = (await openDock(db, { name: 'Cais Sul', fleetNumber: 'S-1' })).dock.id;
  const mechanic = await api.caller('mechanic');
  const manager = await api.caller('manager');
  const kit = (await addPart(db, 'Carburettor kit')).id;
  const plug = (await addPart(db, 'Plug')).id;
  const perCarb: PartNeed[] = [
    { partId: kit, quantity: 1, per: 'carb' },
    { partId: plug, quantity: 1, per: 'cylinder' },
  ];
  const open = async (more: object): Promise<string> => {
    const body = { unitId: home.unit.id, ...more };
    const answer = await mechanic.send<TaskPage>('POST', '/tasks', body);
    expect(answer.status, JSON.stringify(answer.body)).toBe(201);
    return answer.body.id;
  };
  const at = (taskId: string) => `/tasks/${taskId}/reservations`;
  return {
    ...{ home, south, mechanic, manager, kit, plug, perCarb, open },
    repair: () => open({ kind: 'repair', title: 'Torn hose' }),
    /** A rule for the twin at home, and the task that is open of it. */
    taskOf: async (parts: PartNeed[], more: { procedureId?: string } = {}): Promise<string> => {
      const rule = await createRule(
        asSystem(db, new Date()),
        createRuleInput.parse({
          name: `Rebuild ${randomUUID()}`,
          kind: 'rebuild',
          appliesTo: { dockIds: [home.dock.id] },
          triggers: [{ on: 'engine_hours', every: 5000 }],
          parts,
          ...more,
        }),
      );
      return open({ ruleId: rule.id });
    },
    stock: (partId: string, quantity: number, dockId = home.dock.id) =>
      stockUp(db, { partId, dockId, quantity }),
    shelves: () => onShelves(db),
    partsOf: async (taskId: string, by = mechanic) =>
      (await by.send<TaskParts>('GET', `/tasks/${taskId}/parts`)).body.parts,
    reserve: (taskId: string) => mechanic.send<TaskParts>('POST', at(taskId)),
    setAside: (taskId: string, body: object) => mechanic.send<TaskParts>('PUT', at(taskId), body),
    close: (taskId: string, body: object) => mechanic.send<Closure>('POST', `/tasks/${taskId}/closure`, body),
  };
}
