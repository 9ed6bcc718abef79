import { findSignOff, insertSignOff, listSignOffs, withdrawSignOffs } from '@/db/queries/bench';
import { listStepEntries } from '@/db/queries/step-entries';
import { getTaskStanding, lockTask } from '@/db/queries/tasks';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { Refusal, refuseField } from '@/lib/errors';
import type { SignOffTask, Work } from '@/lib/schemas/work';
import { accessTask } from './access';
import { getWork } from './get-work';
import { refuseEnded } from './refuse-ended';
import { refusingTaken } from './refusing-taken';

/**
 * Signs a task with the caller's name: as the second person, who has looked at what stands and entered none of it, or
 * for a test ride. A second person's signature takes the place of one that entries were made after. An id that this
 * task has already writes nothing. Throws `forbidden` on `kind` for a second person who made an entry, `conflict` on
 * `kind` when it is signed, on `id` when the task has ended.
 */
export async function signOffTask(ctx: Context, taskId: string, input: SignOffTask): Promise<Work> {
  await accessTask(ctx, taskId, 'closure.write');
  const by = personIdOf(ctx.actor);
  if (!by) throw new Refusal('forbidden', 'Only a person signs.');
  await refusingTaken({ sign_off_pkey: ['id', 'Another signature has this id.'] }, () =>
    runTransaction(ctx.db, async (trx) => {
      const task = await lockTask(trx, taskId);
      const first = await findSignOff(trx, input.id);
      if (first && first.task_id === taskId) return;
      if (first) throw refuseField('id', 'Another signature has this id.', 'conflict');
      if (task.ended_at) throw refuseEnded(await getTaskStanding(trx, taskId));
      const entries = await listStepEntries(trx, taskId);
      const lastSeq = entries.at(-1)?.seq ?? 0;
      if (input.kind === 'second_person' && entries.some(({ entered_by }) => entered_by === by))
        throw refuseField(
          'kind',
          'You did part of this work: somebody else signs as the second person.',
          'forbidden',
        );
      const standing = (await listSignOffs(trx, taskId)).find(({ kind }) => kind === input.kind);
      if (standing && (input.kind === 'test_ride' || standing.last_entry_seq >= lastSeq))
        throw refuseField('kind', `${standing.signer_name} has signed already.`, 'conflict');
      await withdrawSignOffs(trx, { taskId, kind: input.kind, at: ctx.now, by });
      await insertSignOff(trx, {
        id: input.id,
        task_id: taskId,
        kind: input.kind,
        note: input.note || null,
        last_entry_seq: lastSeq,
        signed_at: ctx.now,
        signed_by: by,
      });
    }),
  );
  return getWork(ctx, taskId);
}
