'use client';

import { useState } from 'react';
import { send, type Failure } from '@/lib/client/api';
import type { Rule } from '@/lib/schemas/rule';
import type { FormState } from './form-state';
import { checkDraft, draftOf, newDraft, newTrigger, type RuleDraft } from './rule-draft';

const SCHEDULE = /^(triggers|lead|window)\b/;

/** The rule form's state: what is typed, what is wrong with it, and saving it. */
export function useRuleForm(rule: Rule | null, today: string, readOnly: boolean) {
  const [begun] = useState(() => (rule ? draftOf(rule, today) : newDraft(today)));
  const [draft, setDraft] = useState<RuleDraft>(begun);
  const [touched, setTouched] = useState<ReadonlySet<string>>(new Set());
  const [failure, setFailure] = useState<Failure | null>(null);
  const [busy, setBusy] = useState(false);
  const [tried, setTried] = useState(false);
  const [saved, setSaved] = useState(false);
  const checked = checkDraft(draft);

  const update = (path: string, change: (before: RuleDraft) => RuleDraft) => {
    setDraft(change);
    setTouched((before) => new Set(before).add(path));
    setFailure(null);
  };
  const refused = Object.fromEntries((failure?.errors ?? []).map(({ path, message }) => [path, message]));
  const form: FormState = {
    draft,
    readOnly,
    change: (path, part) => update(path, (before) => ({ ...before, ...part })),
    changeTrigger: (path, index, part) =>
      update(path, (before) => ({
        ...before,
        triggers: before.triggers.map((trigger, at) => (at === index ? { ...trigger, ...part } : trigger)),
      })),
    // A window that is too wide shows while the trigger is typed as well, since both make it so.
    errorOf: (path) =>
      refused[path] ??
      (tried || touched.has(path) || path.startsWith('window.') ? checked.errors[path] : undefined),
  };
  const addTrigger = () =>
    update('triggers', (before) => {
      const key = 1 + Math.max(...before.triggers.map((trigger) => trigger.key));
      return { ...before, triggers: [...before.triggers, newTrigger(key, 'calendar', today)] };
    });
  const removeTrigger = (index: number) => {
    update('triggers', (before) => ({
      ...before,
      triggers: before.triggers.filter((_, at) => at !== index),
    }));
    // Those after it move up; what was said of a place is not true of it any more.
    setTouched((before) => new Set([...before].filter((path) => !SCHEDULE.test(path))));
  };
  /** Saves; answers the rule as it is stored, or null when something is wrong. */
  const save = async (): Promise<Rule | null> => {
    setTried(true);
    if (!checked.input || busy) return null;
    setBusy(true);
    const answer = rule
      ? await send<Rule>('PUT', `/api/v1/rules/${rule.id}`, {
          ...checked.input,
          parts: rule.parts,
          procedureId: rule.procedureId,
          revision: rule.revision,
        })
      : await send<Rule>('POST', '/api/v1/rules', checked.input);
    setBusy(false);
    setFailure(answer.ok ? null : answer);
    setSaved(answer.ok);
    return answer.ok ? answer.data : null;
  };
  const listed = failure
    ? failure.errors.length > 0
      ? [...failure.errors]
      : [{ path: '', message: failure.detail }]
    : tried
      ? Object.entries(checked.errors).map(([path, message]) => ({ path, message }))
      : [];
  const unsaved = !saved && !readOnly && JSON.stringify(draft) !== JSON.stringify(begun);
  return { form, checked, busy, unsaved, listed, addTrigger, removeTrigger, save };
}
