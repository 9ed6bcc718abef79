'use client';

import { useState } from 'react';
import type { FormState } from './form-state';
import { newTrigger, type RuleDraft } from './rule-draft';

const IN_A_TRIGGER = /^triggers\./;

/** What is typed on the rule form, and which fields it was typed in. `onChange` runs at every change. */
export function useRuleDraft(begin: () => RuleDraft, today: string, onChange: () => void) {
  const [begun] = useState(begin);
  const [draft, setDraft] = useState<RuleDraft>(begun);
  const [touched, setTouched] = useState<ReadonlySet<string>>(new Set());

  const update = (path: string, change: (before: RuleDraft) => RuleDraft) => {
    setDraft(change);
    setTouched((before) => new Set(before).add(path));
    onChange();
  };
  const change: FormState['change'] = (path, part) => update(path, (before) => ({ ...before, ...part }));
  const changeTrigger: FormState['changeTrigger'] = (path, index, part) =>
    update(path, (before) => ({
      ...before,
      triggers: before.triggers.map((trigger, at) => (at === index ? { ...trigger, ...part } : trigger)),
    }));
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
    setTouched((before) => new Set([...before].filter((path) => !IN_A_TRIGGER.test(path))));
  };
  const changed = JSON.stringify(draft) !== JSON.stringify(begun);
  return { draft, touched, changed, change, changeTrigger, addTrigger, removeTrigger };
}
