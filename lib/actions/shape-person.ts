import type { PersonRow } from '@/db/queries/people';
import type { Person } from '@/lib/schemas/person';

/** A person as the API and the screens show them. */
export function toPerson(row: PersonRow): Person {
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    role: row.role,
    dockIds: row.dock_ids,
    digestWanted: row.digest_wanted,
    deactivatedAt: row.deactivated_at?.toISOString() ?? null,
  };
}
