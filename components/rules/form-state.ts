import type { RuleDraft, TriggerDraft } from './rule-draft';

/** What each part of the rule form is given. */
export type FormState = {
  draft: RuleDraft;
  /** Changes what is typed; `path` names the field of the API that it is about. */
  change: (path: string, part: Partial<RuleDraft>) => void;
  changeTrigger: (path: string, index: number, part: Partial<TriggerDraft>) => void;
  /** What is wrong with a field, once it was typed in or a save was tried. */
  errorOf: (path: string) => string | undefined;
  readOnly: boolean;
};
