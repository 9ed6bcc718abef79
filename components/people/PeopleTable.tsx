import { DataTable } from '@/components/ui/DataTable';
import { Tag } from '@/components/ui/Tag';
import type { Person } from '@/lib/schemas/person';
import { ChangePerson } from './ChangePerson';
import { docksInWords, roleWord, type NamedDock } from './words';

/** Everybody, with what they are and where they work. */
export function PeopleTable({ people, docks }: { people: Person[]; docks: NamedDock[] }) {
  return (
    <DataTable
      caption="People"
      columns={[
        { id: 'name', header: 'Name', sortable: true },
        { id: 'role', header: 'Role', sortable: true },
        { id: 'docks', header: 'Works at' },
        { id: 'access', header: 'Access', sortable: true },
        { id: 'change', header: 'Change' },
      ]}
      rows={people.map((person) => ({
        key: person.id,
        sort: {
          name: person.name,
          role: roleWord(person.role),
          access: person.deactivatedAt ? 'Deactivated' : 'Active',
        },
        cells: {
          name: (
            <>
              <span className="block font-semibold">{person.name}</span>
              <span className="break-all text-ink-soft">{person.email}</span>
            </>
          ),
          role: roleWord(person.role),
          docks: docksInWords(person.dockIds, docks),
          access: person.deactivatedAt ? <Tag tone="warn">Deactivated</Tag> : 'Active',
          change: <ChangePerson person={person} docks={docks} />,
        },
      }))}
    />
  );
}
