/** What a check of a number on a craft answers: the number in its one spelling, or why it is none. */
export type CheckedNumber = { ok: true; value: string } | { ok: false; reason: string };
