import Link from 'next/link';
import { DataTable, type TableColumn } from '@/components/ui/DataTable';
import type { ModelsPage } from '@/lib/schemas/fleet';
import { engineText } from './model-words';

const COLUMNS: TableColumn[] = [
  { id: 'name', header: 'Model', sortable: true },
  { id: 'engine', header: 'What drives it' },
  { id: 'specs', header: 'Specs', align: 'end', sortable: true },
  { id: 'units', header: 'Units', align: 'end', sortable: true },
];

/** The models with their engines and how many units of each there are. */
export function ModelTable({ models }: { models: ModelsPage['models'] }) {
  return (
    <DataTable
      caption="Models"
      columns={COLUMNS}
      rows={models.map((model) => {
        const specs = Object.keys(model.specs).length;
        return {
          key: model.id,
          cells: {
            name: (
              <Link
                href={`/models/${model.id}`}
                className="link inline-flex min-h-target items-center font-bold break-words"
              >
                {model.name}
              </Link>
            ),
            engine: engineText(model),
            specs: <span className="numerals">{specs}</span>,
            units: (
              <Link
                href={`/units?model=${model.id}`}
                className="link numerals inline-flex min-h-target min-w-target items-center sm:justify-end"
              >
                {model.unitCount}
                <span className="sr-only"> units of {model.name}</span>
              </Link>
            ),
          },
          sort: { name: model.name, specs, units: model.unitCount },
        };
      })}
    />
  );
}
