import type { ColumnType, Generated, JSONColumnType } from 'kysely';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import type { DuePointColumns } from '@/lib/domain/duty-standing';
import type { ClosedPart, ClosedResult, ClosedSignOff } from '@/lib/domain/closed-work';
import type { Judgement, Specs } from '@/lib/domain/measurement';
import type { EntryValue, Stage, Step } from '@/lib/domain/procedure';
import type { MoveKind } from '@/lib/domain/stock';
import type { Lead, Labour, PartNeed, Scope, Trigger, Window } from '@/lib/domain/rule';

/** An instant: read as a Date, written as a Date. */
type Instant = ColumnType<Date, Date, Date>;
/** As Instant, with a default of the database's clock when none is given. */
type DefaultInstant = ColumnType<Date, Date | undefined, Date>;
type MaybeInstant = ColumnType<Date | null, Date | null | undefined, Date | null>;
/** jsonb: read as its parsed value, written as JSON text. */
type Json<T extends object> = JSONColumnType<T>;
type DefaultJson<T extends object> = ColumnType<T, string | undefined, string>;

export interface OperatorTable {
  id: Generated<string>;
  only_one: Generated<boolean>;
  name: string;
  created_at: DefaultInstant;
}

export interface DockTable {
  id: Generated<string>;
  name: string;
  time_zone: string;
  season_from: string | null;
  season_to: string | null;
  open_weekdays: Generated<string[]>;
  craft_numbers: Generated<'us' | 'other'>;
  created_at: DefaultInstant;
}

export interface ModelTable {
  id: Generated<string>;
  name: string;
  propulsion: 'jet' | 'outboard' | 'inboard' | 'electric';
  stroke: 'two' | 'four' | null;
  engines: number;
  cylinders: number;
  carb_count: number;
  specs: DefaultJson<Specs>;
  created_at: DefaultInstant;
}

export interface PersonTable {
  id: Generated<string>;
  email: string;
  name: string;
  role: 'manager' | 'mechanic' | 'dock';
  dock_ids: Generated<string[]>;
  password_hash: string | null;
  session_version: Generated<number>;
  digest_wanted: Generated<boolean>;
  unsubscribe_key: Generated<string>;
  created_at: DefaultInstant;
  deactivated_at: MaybeInstant;
  deactivated_by: string | null;
}

export interface SessionTable {
  id: Generated<string>;
  person_id: string;
  session_version: number;
  created_at: DefaultInstant;
  expires_at: Instant;
  ended_at: MaybeInstant;
}

export interface KnownDeviceTable {
  id: Generated<string>;
  person_id: string;
  token_hash: Buffer;
  created_at: DefaultInstant;
  expires_at: Instant;
}

export interface SignInAttemptTable {
  id: ColumnType<number, never, never>;
  email_key: string;
  address: string;
  device_id: string | null;
  succeeded: boolean;
  attempted_at: DefaultInstant;
}

export interface InvitationTable {
  id: Generated<string>;
  email: string;
  name: string;
  role: 'manager' | 'mechanic' | 'dock';
  dock_ids: Generated<string[]>;
  token_hash: Buffer;
  invited_by: string;
  invited_at: DefaultInstant;
  expires_at: Instant;
  accepted_at: MaybeInstant;
  withdrawn_at: MaybeInstant;
}

export interface PasswordResetTable {
  id: Generated<string>;
  person_id: string;
  token_hash: Buffer;
  asked_at: DefaultInstant;
  expires_at: Instant;
  used_at: MaybeInstant;
}

export interface ApiKeyTable {
  id: Generated<string>;
  person_id: string;
  name: string;
  prefix: string;
  key_hash: Buffer;
  created_at: DefaultInstant;
  last_used_at: MaybeInstant;
  revoked_at: MaybeInstant;
}

export interface UnitTable {
  id: Generated<string>;
  fleet_number: string;
  model_id: string;
  dock_id: string;
  hin: string | null;
  registration: string | null;
  entered_service_on: CalendarDay;
  carb_count_override: number | null;
  specs: DefaultJson<Specs>;
  created_at: DefaultInstant;
  created_by: string | null;
  retired_at: MaybeInstant;
  retired_by: string | null;
}

export interface OutingTable {
  id: string;
  unit_id: string;
  dock_id: string;
  started_at: MaybeInstant;
  checked_out_by: string | null;
  due_back_at: MaybeInstant;
  planned_tenths: number | null;
  renter_reference: string | null;
  ended_at: MaybeInstant;
  checked_in_by: string | null;
  ended_dock_id: string | null;
  voided_at: MaybeInstant;
  voided_by: string | null;
  void_reason: string | null;
}

export interface ReadingTable {
  id: Generated<string>;
  unit_id: string;
  taken_at: Instant;
  shown_tenths: number;
  base_tenths: number;
  engine_hours_tenths: ColumnType<number, never, never>;
  source: 'entry' | 'check_in' | 'logged' | 'swap_final' | 'swap_first' | 'closure' | 'correction';
  outing_id: string | null;
  recorded_at: DefaultInstant;
  recorded_by: string | null;
  confirm_reason: string | null;
  review_code: 'unusual_jump' | 'late_arrival' | null;
  reviewed_at: MaybeInstant;
  reviewed_by: string | null;
  review_note: string | null;
  voided_at: MaybeInstant;
  voided_by: string | null;
  void_reason: string | null;
  replaces_reading_id: string | null;
}

export interface LiveMeterTable {
  unit_id: string;
  revision: Generated<number>;
  reading_id: string | null;
  read_at: Instant;
  base_tenths: number;
  shown_tenths: number;
  engine_hours_tenths: number;
  starting_outings: Generated<number>;
  outing_count: number;
}

export interface RuleTable {
  id: Generated<string>;
  name: string;
  kind: 'inspection' | 'service' | 'rebuild';
  scope: Json<Scope>;
  triggers: Json<Trigger[]>;
  lead: Json<Lead>;
  tolerance: Json<Window>;
  holds_unit: boolean;
  labour: Json<Labour>;
  parts: DefaultJson<PartNeed[]>;
  procedure_id: string | null;
  wants_second_person: Generated<boolean>;
  wants_test_ride: Generated<boolean>;
  revision: Generated<number>;
  created_at: DefaultInstant;
  created_by: string | null;
  changed_at: DefaultInstant;
  changed_by: string | null;
  ended_at: MaybeInstant;
  ended_by: string | null;
  end_reason: string | null;
}

export interface ProcedureTable {
  id: Generated<string>;
  kind: 'inspection' | 'service' | 'rebuild' | 'repair';
  name: string;
  retired_at: MaybeInstant;
  retired_by: string | null;
  created_at: DefaultInstant;
}

export interface ProcedureVersionTable {
  id: Generated<string>;
  procedure_id: string;
  version: number;
  steps: Json<Step[]>;
  note: string | null;
  written_at: DefaultInstant;
  written_by: string | null;
}

export interface AssessmentTable {
  unit_id: string;
  wanted_revision: Generated<number>;
  assessed_revision: Generated<number>;
  assessed_at: MaybeInstant;
  facts_hash: string | null;
  points_hash: string | null;
}

export interface DuePointTable extends DuePointColumns {
  unit_id: string;
  rule_id: string;
  trigger_index: number;
}

export interface DefectTable {
  id: Generated<string>;
  unit_id: string;
  title: string;
  detail: string | null;
  holds_unit: boolean;
  reported_at: Instant;
  reported_by: string | null;
  reading_id: string | null;
  step_entry_id: string | null;
  cleared_at: MaybeInstant;
  cleared_by: string | null;
  clear_note: string | null;
}

export interface LayUpTable {
  id: Generated<string>;
  unit_id: string;
  from_on: CalendarDay;
  until_on: CalendarDay | null;
  reason: string;
  recorded_at: DefaultInstant;
  recorded_by: string | null;
  ended_at: MaybeInstant;
  ended_by: string | null;
}

export interface TaskTable {
  id: Generated<string>;
  unit_id: string;
  kind: 'inspection' | 'service' | 'rebuild' | 'repair';
  title: string;
  detail: string | null;
  origin: 'rule' | 'defect' | 'person';
  rule_id: string | null;
  defect_id: string | null;
  procedure_version_id: string | null;
  only_per: 'engine' | 'cylinder' | 'carb' | null;
  only_place: number | null;
  step_entry_id: string | null;
  wants_second_person: Generated<boolean>;
  wants_test_ride: Generated<boolean>;
  planned_on: CalendarDay | null;
  planned_at: MaybeInstant;
  planned_by: string | null;
  expected_minutes: number | null;
  opened_at: Instant;
  opened_by: string | null;
  started_at: MaybeInstant;
  started_by: string | null;
  ended_at: MaybeInstant;
  withdrawn_by: string | null;
  withdraw_reason: string | null;
  revision: Generated<number>;
}

export interface TaskNoteTable {
  id: Generated<string>;
  task_id: string;
  text: string;
  written_at: Instant;
  written_by: string | null;
}

export interface StepEntryTable {
  id: Generated<string>;
  seq: ColumnType<number, never, never>;
  task_id: string;
  unit_id: string;
  step_key: string;
  place: number;
  stage: Stage | null;
  value: Json<EntryValue>;
  /** Of a measurement: the spec it was judged by, and how. */
  spec: string | null;
  judged: JSONColumnType<Judgement | null, string | null, never>;
  engine_hours_tenths: number;
  follows_id: string | null;
  entered_at: Instant;
  entered_by: string | null;
  recorded_at: Instant;
}

export interface TaskPresenceTable {
  task_id: string;
  person_id: string;
  seen_at: Instant;
}

export interface SignOffTable {
  id: string;
  task_id: string;
  kind: 'second_person' | 'test_ride';
  note: string | null;
  /** The latest entry there was when it was signed; 0 before the first. */
  last_entry_seq: number;
  signed_at: Instant;
  signed_by: string;
  withdrawn_at: MaybeInstant;
  withdrawn_by: string | null;
}

export interface AttachmentTable {
  id: string;
  unit_id: string;
  task_id: string | null;
  defect_id: string | null;
  kind: 'picture' | 'document';
  name: string;
  content_type: string;
  object_key: string;
  thumb_key: string | null;
  bytes: number;
  width: number | null;
  height: number | null;
  added_at: Instant;
  added_by: string | null;
  removed_at: MaybeInstant;
  removed_by: string | null;
}

export interface ClosureTable {
  id: Generated<string>;
  task_id: string;
  unit_id: string;
  rule_id: string | null;
  closed_at: Instant;
  closed_on: CalendarDay;
  engine_hours_tenths: number;
  outings: number;
  minutes: number | null;
  note: string | null;
  results: DefaultJson<ClosedResult[]>;
  sign_offs: DefaultJson<ClosedSignOff[]>;
  parts_used: DefaultJson<ClosedPart[]>;
  held_since_at: MaybeInstant;
  closed_by: string | null;
  recorded_at: DefaultInstant;
  reversed_at: MaybeInstant;
  reversed_by: string | null;
  reverse_reason: string | null;
}

export interface PartTable {
  id: string;
  number: string;
  name: string;
  supplier: string | null;
  is_kit: Generated<boolean>;
  created_at: Instant;
  created_by: string | null;
  retired_at: MaybeInstant;
  retired_by: string | null;
}

export interface KitPartTable {
  kit_id: string;
  part_id: string;
  quantity: number;
}

export interface ShelfTable {
  part_id: string;
  dock_id: string;
  low_at: number | null;
}

export interface StockMoveTable {
  id: Generated<string>;
  seq: ColumnType<number, never, never>;
  part_id: string;
  dock_id: string;
  /** What came in, negative for what went out. */
  quantity: number;
  kind: MoveKind;
  /** Moves that were written together: two docks, a kit and its parts, what a closing took and got back. */
  pair_id: string;
  task_id: string | null;
  closure_id: string | null;
  reason: string | null;
  moved_at: Instant;
  moved_by: string | null;
}

export interface ReservationTable {
  id: Generated<string>;
  task_id: string;
  part_id: string;
  dock_id: string;
  quantity: number;
  reserved_at: Instant;
  reserved_by: string | null;
  released_at: MaybeInstant;
  released_by: string | null;
}

/** How many of a part a task needs, where somebody said so. */
export interface TaskNeedTable {
  task_id: string;
  part_id: string;
  quantity: number;
  said_at: Instant;
  said_by: string | null;
}

export interface BaselineTable {
  id: Generated<string>;
  unit_id: string;
  rule_id: string;
  closed_on: CalendarDay;
  engine_hours_tenths: number;
  outings: number;
  note: string;
  recorded_at: DefaultInstant;
  recorded_by: string | null;
  withdrawn_at: MaybeInstant;
  withdrawn_by: string | null;
}

export interface DigestTable {
  id: Generated<string>;
  person_id: string;
  week_on: CalendarDay;
  claimed_at: Instant;
  sent_at: MaybeInstant;
  failure: string | null;
  mail_id: string | null;
}

export interface MailTable {
  id: Generated<string>;
  kind: string;
  recipient: string;
  subject: string;
  /** Empty once the letter is sent or failed for good, as `html_body` is null. */
  text_body: string;
  html_body: string | null;
  headers: DefaultJson<Record<string, string>>;
  queued_at: DefaultInstant;
  claimed_at: MaybeInstant;
  claim_id: string | null;
  sent_at: MaybeInstant;
  failure: string | null;
}

export interface WorkerHeartbeatTable {
  worker_id: string;
  started_at: Instant;
  beat_at: Instant;
  stopped_at: MaybeInstant;
}
/** The view of everything that counts as "done": closures not reversed and baselines not withdrawn. */
export interface ClosingView {
  id: string;
  unit_id: string;
  rule_id: string;
  closed_on: CalendarDay;
  closed_at: Date;
  engine_hours_tenths: number;
  outings: number;
}

export interface DB {
  operator: OperatorTable;
  dock: DockTable;
  model: ModelTable;
  person: PersonTable;
  session: SessionTable;
  known_device: KnownDeviceTable;
  sign_in_attempt: SignInAttemptTable;
  invitation: InvitationTable;
  password_reset: PasswordResetTable;
  api_key: ApiKeyTable;
  unit: UnitTable;
  outing: OutingTable;
  reading: ReadingTable;
  live_meter: LiveMeterTable;
  rule: RuleTable;
  procedure: ProcedureTable;
  procedure_version: ProcedureVersionTable;
  assessment: AssessmentTable;
  due_point: DuePointTable;
  defect: DefectTable;
  lay_up: LayUpTable;
  task: TaskTable;
  task_note: TaskNoteTable;
  step_entry: StepEntryTable;
  task_presence: TaskPresenceTable;
  sign_off: SignOffTable;
  attachment: AttachmentTable;
  closure: ClosureTable;
  part: PartTable;
  kit_part: KitPartTable;
  shelf: ShelfTable;
  stock_move: StockMoveTable;
  reservation: ReservationTable;
  task_need: TaskNeedTable;
  baseline: BaselineTable;
  digest: DigestTable;
  mail: MailTable;
  worker_heartbeat: WorkerHeartbeatTable;
  closing: ClosingView;
}
