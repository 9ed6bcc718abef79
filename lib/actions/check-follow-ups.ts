import { findProcedure } from '@/db/queries/procedures';
import type { Context } from '@/lib/context';
import { Refusal, type FieldError } from '@/lib/errors';
import type { CreateProcedure } from '@/lib/schemas/procedure';

/** Throws `invalid_input` for every procedure that a failing step is to open and that there is not. */
export async function checkFollowUps({ db }: Context, steps: CreateProcedure['steps']): Promise<void> {
  const errors: FieldError[] = [];
  for (const [index, { onFail }] of steps.entries()) {
    if (!onFail?.procedureId) continue;
    const procedure = await findProcedure(db, onFail.procedureId);
    if (!procedure || procedure.retired_at !== null)
      errors.push({ path: `steps.${index}.onFail.procedureId`, message: 'is no procedure in use' });
  }
  if (errors.length > 0)
    throw new Refusal(
      'invalid_input',
      errors.map(({ path, message }) => `${path}: ${message}`).join('; '),
      errors,
    );
}
