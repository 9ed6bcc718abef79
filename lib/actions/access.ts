import { findAttachment, type AttachmentRow } from '@/db/queries/attachments';
import { findModel, type ModelRow } from '@/db/queries/models';
import { findClosure, type ClosureRow } from '@/db/queries/closures';
import { findDefect, type DefectRow } from '@/db/queries/defects';
import { findLayUp, type LayUpRow } from '@/db/queries/lay-ups';
import { findMeterFacts, type MeterFactsAsked } from '@/db/queries/meter-facts';
import { findPart, type PartRow } from '@/db/queries/parts';
import { findProcedure, type ProcedureRow } from '@/db/queries/procedures';
import { findReading, type ReadingRow } from '@/db/queries/readings';
import { findUnit, type UnitRow } from '@/db/queries/units';
import { findTask, type TaskRow } from '@/db/queries/tasks';
import { findDock, type DockRow } from '@/db/queries/docks';
import { findRule, type NamedRuleRow } from '@/db/queries/rules';
import { findPerson, type PersonRow } from '@/db/queries/people';
import type { Context } from '@/lib/context';
import {
  canAtDock,
  canFleetWide,
  canSomewhere,
  worksAt,
  type DockAct,
  type FleetAct,
} from '@/lib/domain/access';
import { Refusal, refuseField } from '@/lib/errors';

declare const checked: unique symbol;
/** A row that the policy was asked about. Only this file makes one; an action that changes a row takes one. */
export type Checked<Row> = Row & { readonly [checked]: true };

/** Throws `forbidden` unless the actor may do this, which concerns every dock. */
export function requireFleetWide(ctx: Context, act: FleetAct): void {
  if (!canFleetWide(ctx.actor, act)) throw forbidden();
}

/** Throws `forbidden` unless the actor may do this at some dock: for lists, which narrow to the docks themselves. */
export function requireSomewhere(ctx: Context, act: DockAct): void {
  if (!canSomewhere(ctx.actor, act)) throw forbidden();
}

/** Throws `forbidden` unless the actor may do this at the dock; `path` names the field that chose the dock. */
export function requireAtDock(ctx: Context, act: DockAct, dockId: string, path = ''): void {
  if (canAtDock(ctx.actor, act, dockId)) return;
  if (path && !worksAt(ctx.actor, dockId))
    throw refuseField(path, 'is at a dock you do not work at', 'forbidden');
  throw forbidden();
}

/** The dock. Throws `not_found` on `path`, or `forbidden`. */
export async function accessDock(
  ctx: Context,
  dockId: string,
  act: DockAct,
  path = 'dockId',
): Promise<Checked<DockRow>> {
  const row = await findDock(ctx.db, dockId);
  if (!row) throw refuseField(path, 'is no dock of this fleet', 'not_found');
  requireAtDock(ctx, act, row.id, path);
  return row as Checked<DockRow>;
}

/** The unit. Throws `not_found` on `path`, or `forbidden`. */
export async function accessUnit(
  ctx: Context,
  unitId: string,
  act: DockAct,
  path = 'id',
): Promise<Checked<UnitRow>> {
  return checkRow(ctx, await findUnit(ctx.db, unitId), act, [path, 'unit']);
}

/** The rule, ended or in force. Throws `forbidden`, or `not_found` on `path`. */
export async function accessRule(
  ctx: Context,
  ruleId: string,
  act: FleetAct,
  path = 'id',
): Promise<Checked<NamedRuleRow>> {
  requireFleetWide(ctx, act);
  const row = await findRule(ctx.db, ruleId);
  if (!row) throw refuseField(path, 'is no rule of this fleet', 'not_found');
  return row as Checked<NamedRuleRow>;
}

/** The procedure with its latest version, retired or in use. Throws `forbidden`, or `not_found` on `path`. */
export async function accessProcedure(
  ctx: Context,
  procedureId: string,
  act: FleetAct,
  path = 'id',
): Promise<Checked<ProcedureRow>> {
  requireFleetWide(ctx, act);
  const row = await findProcedure(ctx.db, procedureId);
  if (!row) throw refuseField(path, 'is no procedure of this fleet', 'not_found');
  return row as Checked<ProcedureRow>;
}

/** The part or kit, retired or in use. Throws `forbidden`, or `not_found` on `path`. */
export async function accessPart(
  ctx: Context,
  partId: string,
  act: FleetAct,
  path = 'id',
): Promise<Checked<PartRow>> {
  requireFleetWide(ctx, act);
  const row = await findPart(ctx.db, partId);
  if (!row) throw refuseField(path, 'is no part of this stock', 'not_found');
  return row as Checked<PartRow>;
}

/** The model. Throws `forbidden`, or `not_found` on `path`. */
export async function accessModel(
  ctx: Context,
  modelId: string,
  act: FleetAct,
  path = 'id',
): Promise<Checked<ModelRow>> {
  requireFleetWide(ctx, act);
  const row = await findModel(ctx.db, modelId);
  if (!row) throw refuseField(path, 'is no model of this fleet', 'not_found');
  return row as Checked<ModelRow>;
}

/** The task, with its unit's dock. Throws `not_found` on `path`, or `forbidden`. */
export async function accessTask(
  ctx: Context,
  taskId: string,
  act: DockAct,
  path = 'id',
): Promise<Checked<TaskRow>> {
  return checkRow(ctx, await findTask(ctx.db, taskId), act, [path, 'task']);
}

/** The row, if there is one and the actor may do this at its dock. Throws `not_found` on `path`, or `forbidden`. */
function checkRow<Row extends { dock_id: string }>(
  ctx: Context,
  row: Row | undefined,
  act: DockAct,
  [path, noun]: [path: string, noun: string],
): Checked<Row> {
  if (!row) throw refuseField(path, `is no ${noun} of this fleet`, 'not_found');
  requireAtDock(ctx, act, row.dock_id, path);
  return row as Checked<Row>;
}

/** What a reading of the unit is held against, at this instant. Throws `not_found` on `unitId`, or `forbidden`. */
export async function accessMeterFacts(ctx: Context, asked: MeterFactsAsked, act: DockAct) {
  return checkRow(ctx, await findMeterFacts(ctx.db, asked), act, ['unitId', 'unit']);
}

/** The reading, with its unit's dock. Throws `not_found` on `id`, or `forbidden`. */
export async function accessReading(ctx: Context, id: string, act: DockAct): Promise<Checked<ReadingRow>> {
  return checkRow(ctx, await findReading(ctx.db, id), act, ['id', 'reading']);
}

/** The defect, with its unit's dock. Throws `not_found` on `path`, or `forbidden`. */
export async function accessDefect(
  ctx: Context,
  id: string,
  act: DockAct,
  path = 'id',
): Promise<Checked<DefectRow>> {
  return checkRow(ctx, await findDefect(ctx.db, id), act, [path, 'defect']);
}

/** The lay-up, with its unit's dock. Throws `not_found` on `id`, or `forbidden`. */
export async function accessLayUp(ctx: Context, id: string, act: DockAct): Promise<Checked<LayUpRow>> {
  return checkRow(ctx, await findLayUp(ctx.db, id), act, ['id', 'lay-up']);
}

/** The person, deactivated ones too. Throws `forbidden`, or `not_found` on `path`. */
export async function accessPerson(
  ctx: Context,
  personId: string,
  act: FleetAct,
  path = 'id',
): Promise<Checked<PersonRow>> {
  requireFleetWide(ctx, act);
  const row = await findPerson(ctx.db, personId);
  if (!row) throw refuseField(path, 'is nobody here', 'not_found');
  return row as Checked<PersonRow>;
}

/** The picture or document, removed or not, with its unit's dock. Throws `not_found` on `id`, or `forbidden`. */
export async function accessAttachment(
  ctx: Context,
  id: string,
  act: DockAct,
): Promise<Checked<AttachmentRow>> {
  return checkRow(ctx, await findAttachment(ctx.db, id), act, ['id', 'attachment']);
}

/** The closure, with its unit's dock. Throws `not_found` on `id`, or `forbidden`. */
export async function accessClosure(ctx: Context, id: string, act: DockAct): Promise<Checked<ClosureRow>> {
  return checkRow(ctx, await findClosure(ctx.db, id), act, ['id', 'closure']);
}

function forbidden(): Refusal {
  return new Refusal('forbidden', 'Your role does not allow this. Ask a manager.');
}
