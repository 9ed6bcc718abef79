'use client';

import { useState } from 'react';
import { send, type Failure } from '@/lib/client/api';
import type { Rule } from '@/lib/schemas/rule';
import type { FormState } from './form-state';
import { checkDraft, draftOf, newDraft, type CheckedDraft } from './rule-draft';
import { useRuleDraft } from './use-rule-draft';

/** The rule form's state: what is typed, what is wrong with it, and saving it. */
export function useRuleForm(rule: Rule | null, today: string, readOnly: boolean) {
  const [failure, setFailure] = useState<Failure | null>(null);
  const [busy, setBusy] = useState(false);
  const [tried, setTried] = useState(false);
  const [saved, setSaved] = useState(false);
  const typed = useRuleDraft(
    () => (rule ? draftOf(rule, today) : newDraft(today)),
    today,
    () => setFailure(null),
  );
  const checked = checkDraft(typed.draft);
  const refused = Object.fromEntries((failure?.errors ?? []).map(({ path, message }) => [path, message]));
  const form: FormState = {
    draft: typed.draft,
    readOnly,
    change: typed.change,
    changeTrigger: typed.changeTrigger,
    // A window that is too wide shows while the trigger is typed as well, since both make it so.
    errorOf: (path) =>
      refused[path] ??
      (tried || typed.touched.has(path) || path.startsWith('window.') ? checked.errors[path] : undefined),
  };
  /** Saves; answers the rule as it is stored, or null when something is wrong. */
  const save = async (): Promise<Rule | null> => {
    setTried(true);
    if (!checked.input || busy) return null;
    setBusy(true);
    const answer = rule
      ? await send<Rule>('PUT', `/api/v1/rules/${rule.id}`, {
          ...checked.input,
          revision: rule.revision,
        })
      : await send<Rule>('POST', '/api/v1/rules', checked.input);
    setBusy(false);
    setFailure(answer.ok ? null : answer);
    setSaved(answer.ok);
    return answer.ok ? answer.data : null;
  };
  return {
    form,
    checked,
    busy,
    unsaved: typed.changed && !saved && !readOnly,
    listed: listErrors(failure, tried ? checked : null),
    addTrigger: typed.addTrigger,
    removeTrigger: typed.removeTrigger,
    save,
  };
}

/** What stands above the form: why the server refused, else what is wrong with what is typed. */
function listErrors(failure: Failure | null, checked: CheckedDraft | null) {
  if (failure)
    return failure.errors.length > 0 ? [...failure.errors] : [{ path: '', message: failure.detail }];
  return Object.entries(checked?.errors ?? {}).map(([path, message]) => ({ path, message }));
}
