import Link from 'next/link';
import { kindWords } from '@/components/task/task-words';
import { DataTable, type TableColumn } from '@/components/ui/DataTable';
import type { ProcedureLine } from '@/lib/schemas/procedure';

const COLUMNS: TableColumn[] = [
  { id: 'name', header: 'Procedure', sortable: true },
  { id: 'kind', header: 'Kind', sortable: true },
  { id: 'steps', header: 'Steps', align: 'end', sortable: true },
  { id: 'version', header: 'Version', align: 'end' },
  { id: 'rules', header: 'Followed by the rules' },
];

/** The procedures in use and the rules that name them. */
export function ProcedureTable({ procedures }: { procedures: readonly ProcedureLine[] }) {
  return (
    <DataTable
      caption="Procedures"
      columns={COLUMNS}
      rows={procedures.map((procedure) => ({
        key: procedure.id,
        cells: {
          name: (
            <Link
              href={`/procedures/${procedure.id}`}
              className="link inline-flex min-h-target items-center font-bold break-words"
            >
              {procedure.name}
            </Link>
          ),
          kind: kindWords[procedure.kind],
          steps: <span className="numerals">{procedure.stepCount}</span>,
          version: <span className="numerals">{procedure.version}</span>,
          rules: procedure.ruleNames.length > 0 ? procedure.ruleNames.join(', ') : 'None',
        },
        sort: { name: procedure.name, kind: procedure.kind, steps: procedure.stepCount },
      }))}
    />
  );
}
