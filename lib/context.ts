import type { Kysely } from 'kysely';
import type { DB } from '@/db/tables';
import type { Actor } from '@/lib/domain/access';

/** What every action is given: where the records are, who asks, and what time it is. For ever these three. */
export type Context = { db: Kysely<DB>; actor: Actor; now: Date };
