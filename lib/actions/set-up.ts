import { findOperator, insertOperator } from '@/db/queries/operator';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { Refusal } from '@/lib/errors';
import type { SetUp, SetUpDone } from '@/lib/schemas/setup';
import { addStarterProcedures } from './add-starter-procedures';
import { checkNewPassword } from './check-new-password';
import { createDock } from './create-dock';
import { createPerson } from './create-person';

/**
 * Names the operator of an empty server, with its first dock, first manager and the starter procedures: once. Of two at the same time one
 * waits for the other and is refused. The caller has checked the token. Throws `already_set_up`, `invalid_input`.
 */
export async function setUp(ctx: Context, input: Omit<SetUp, 'token'>): Promise<SetUpDone> {
  if (await findOperator(ctx.db)) throw alreadySetUp();
  const { name, email, password } = input.manager;
  checkNewPassword(password, email, 'manager.password');
  return runTransaction(ctx.db, async (trx) => {
    const inside = { ...ctx, db: trx };
    await insertOnlyOperator(inside, input.operatorName);
    const dock = await createDock(inside, input.dock);
    await addStarterProcedures(inside);
    const manager = await createPerson(inside, { name, email, role: 'manager', password });
    return { operatorName: input.operatorName, dock, manager };
  });
}

async function insertOnlyOperator(ctx: Context, name: string): Promise<void> {
  try {
    await insertOperator(ctx.db, name, ctx.now);
  } catch (error) {
    if ((error as { constraint?: string }).constraint === 'operator_only_one_key') throw alreadySetUp();
    throw error;
  }
}

function alreadySetUp(): Refusal {
  return new Refusal('already_set_up', 'Wakewright is set up here already. Sign in instead.');
}
