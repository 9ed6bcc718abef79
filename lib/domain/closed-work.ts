import type { SignOffKind } from './closing-check';
import type { MeasuredUnit } from './measured-value';
import type { Judgement } from './measurement';
import type { EntryValue, Per, Stage } from './procedure';

/** A result as it stood when its task was closed, with the limits it was judged by. Instants are ISO text in UTC. */
export type ClosedResult = {
  stepKey: string;
  title: string;
  per: Per;
  place: number;
  stage: Stage | null;
  /** Of a measurement, the unit of measure it is shown in. */
  unit: MeasuredUnit | null;
  value: EntryValue;
  judged: Judgement | null;
  enteredAt: string;
  enteredBy: { id: string; name: string } | null;
};

/** A signature as it stood when its task was closed. */
export type ClosedSignOff = {
  kind: SignOffKind;
  note: string | null;
  signedAt: string;
  signedBy: { id: string; name: string };
};

/** What a closing took out of stock, with the words that the part and the dock had then. */
export type ClosedPart = {
  partId: string;
  number: string;
  name: string;
  quantity: number;
  dockId: string;
  dockName: string;
  /** Why it was taken although the stock said otherwise. */
  reason: string | null;
};
