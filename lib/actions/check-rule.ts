import { listDocks } from '@/db/queries/docks';
import { listModels } from '@/db/queries/models';
import { listPartsOf } from '@/db/queries/parts';
import { findProcedure } from '@/db/queries/procedures';
import type { Context } from '@/lib/context';
import { Refusal, type FieldError } from '@/lib/errors';
import type { CreateRule } from '@/lib/schemas/rule';

/** Throws `invalid_input` for every id in the rule that names nothing, each at its own path. */
export async function checkRule({ db }: Context, input: CreateRule): Promise<void> {
  const { modelIds = [], dockIds = [] } = input.appliesTo;
  const models = modelIds.length > 0 ? await listModels(db) : [];
  const docks = dockIds.length > 0 ? await listDocks(db, dockIds) : [];
  const errors: FieldError[] = [
    ...findUnknown(modelIds, models, 'appliesTo.modelIds', 'is no model of this fleet'),
    ...findUnknown(dockIds, docks, 'appliesTo.dockIds', 'is no dock of this fleet'),
    ...(await findPartFaults(db, input.parts)),
    ...(await findProcedureFault(db, input.procedureId)),
  ];
  if (errors.length === 0) return;
  throw new Refusal(
    'invalid_input',
    errors.map(({ path, message }) => `${path}: ${message}`).join('; '),
    errors,
  );
}

async function findPartFaults(db: Context['db'], parts: CreateRule['parts']): Promise<FieldError[]> {
  if (parts.length === 0) return [];
  const ids = parts.map(({ partId }) => partId);
  const known = new Map((await listPartsOf(db, ids)).map((part) => [part.id, part]));
  return ids.flatMap((id, index) => {
    const part = known.get(id);
    if (part && part.retired_at === null) return [];
    const message = part ? 'is a part that is retired' : 'is no part of this stock';
    return [{ path: `parts.${index}.partId`, message }];
  });
}

async function findProcedureFault(db: Context['db'], id: string | null | undefined): Promise<FieldError[]> {
  if (!id) return [];
  const procedure = await findProcedure(db, id);
  if (procedure && procedure.retired_at === null) return [];
  const message = procedure ? 'is a procedure that is retired' : 'is no procedure of this fleet';
  return [{ path: 'procedureId', message }];
}

function findUnknown(
  ids: readonly string[],
  known: readonly { id: string }[],
  path: string,
  message: string,
): FieldError[] {
  const there = new Set(known.map(({ id }) => id));
  return ids.flatMap((id, index) => (there.has(id) ? [] : [{ path: `${path}.${index}`, message }]));
}
