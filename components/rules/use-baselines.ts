'use client';

import { useState } from 'react';
import { send } from '@/lib/client/api';
import { recordBaseline, type Baseline } from '@/lib/schemas/baseline';

/** What is typed for one rule. */
export type BaselineDraft = { closedOn: string; engineHours: string; outings: string };
const EMPTY: BaselineDraft = { closedOn: '', engineHours: '', outings: '' };

type Errors = Record<string, string>;

/** Whether anything was typed for a rule. */
const isFilled = (draft: BaselineDraft) => Object.values(draft).some((text) => text.trim() !== '');

const numberOf = (text: string) => {
  const trimmed = text.trim();
  return trimmed === '' ? undefined : /^-?\d+(\.\d+)?$/.test(trimmed) ? Number(trimmed) : trimmed;
};

/** Baselines of a unit as they are typed, rule by rule, and saving them: one, or all that were filled in. */
export function useBaselines(unitId: string) {
  const [drafts, setDrafts] = useState<Record<string, BaselineDraft>>({});
  const [note, setNote] = useState('');
  const [errors, setErrors] = useState<Record<string, Errors>>({});
  const [busy, setBusy] = useState(false);

  const draftOf = (ruleId: string) => drafts[ruleId] ?? EMPTY;
  const change = (ruleId: string, part: Partial<BaselineDraft>) => {
    setDrafts((before) => ({ ...before, [ruleId]: { ...(before[ruleId] ?? EMPTY), ...part } }));
    setErrors((before) => ({ ...before, [ruleId]: {} }));
  };

  const saveOne = async (ruleId: string): Promise<boolean> => {
    const { closedOn, engineHours, outings } = draftOf(ruleId);
    const input = {
      ruleId,
      closedOn,
      engineHours: numberOf(engineHours),
      outings: numberOf(outings),
      note,
    };
    const parsed = recordBaseline.safeParse(input);
    const refused = parsed.success
      ? await refusal(unitId, parsed.data)
      : Object.fromEntries(parsed.error.issues.map(({ path, message }) => [path.join('.'), message]));
    setErrors((before) => ({ ...before, [ruleId]: refused ?? {} }));
    if (!refused) setDrafts(({ [ruleId]: _saved, ...rest }) => rest);
    return !refused;
  };
  /** Saves these rules' baselines one after the other; answers how many were recorded and how many refused. */
  const save = async (ruleIds: readonly string[]): Promise<{ recorded: number; refused: number }> => {
    setBusy(true);
    const outcomes: boolean[] = [];
    for (const ruleId of ruleIds) outcomes.push(await saveOne(ruleId));
    setBusy(false);
    const recorded = outcomes.filter(Boolean).length;
    return { recorded, refused: outcomes.length - recorded };
  };
  const filled = Object.keys(drafts).filter((ruleId) => isFilled(draftOf(ruleId)));
  const noteError = Object.values(errors).find((each) => each['note'])?.['note'];
  return { draftOf, change, note, setNote, errors, noteError, busy, filled, save };
}

async function refusal(unitId: string, input: object): Promise<Errors | null> {
  const answer = await send<Baseline>('POST', `/api/v1/units/${unitId}/baselines`, input);
  if (answer.ok) return null;
  return answer.errors.length > 0
    ? Object.fromEntries(answer.errors.map(({ path, message }) => [path, message]))
    : { '': answer.detail };
}
