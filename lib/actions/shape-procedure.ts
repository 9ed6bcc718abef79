import type { ProcedureRow, VersionRow } from '@/db/queries/procedures';
import { describeChanges } from '@/lib/domain/procedure-changes';
import type { Procedure, ProcedureLine } from '@/lib/schemas/procedure';
import { toNamed } from './shape-task';

/** A procedure with its latest steps and who wrote each version, as the API and the screens show it. */
export function toProcedure(row: ProcedureRow, versions: readonly VersionRow[]): Procedure {
  return {
    id: row.id,
    name: row.name,
    kind: row.kind,
    version: row.version,
    steps: row.steps,
    versions: versions.map((version, index) => ({
      version: version.version,
      note: version.note,
      changes: describeChanges(versions[index + 1]?.steps ?? version.steps, version.steps),
      writtenAt: version.written_at.toISOString(),
      writtenBy: toNamed(version.written_by, version.writer_name),
    })),
    retiredAt: row.retired_at?.toISOString() ?? null,
  };
}

/** A procedure as a list shows it. */
export function toProcedureLine(row: ProcedureRow): ProcedureLine {
  return {
    id: row.id,
    name: row.name,
    kind: row.kind,
    version: row.version,
    stepCount: row.steps.length,
    ruleNames: row.rule_names,
    writtenAt: row.written_at.toISOString(),
    writtenBy: toNamed(row.written_by, row.writer_name),
  };
}

/** What the unique index of `procedure` says. */
export const PROCEDURE_NAME: Record<string, [path: string, message: string]> = {
  procedure_name: ['name', 'A procedure has that name already.'],
};
