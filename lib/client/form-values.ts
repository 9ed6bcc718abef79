/** What a form's field says, as text without blanks around it; '' when there is none of that name. */
export function textOf(form: HTMLFormElement, name: string): string {
  return rawOf(form, name).trim();
}

/** As `textOf`, blanks kept: for passwords. */
export function rawOf(form: HTMLFormElement, name: string): string {
  const value = new FormData(form).get(name);
  return typeof value === 'string' ? value : '';
}

/** A number as it is typed, with a comma or a point. Text that is none stays text, for the API to refuse by name. */
export function numberOf(form: HTMLFormElement, name: string): number | string | undefined {
  const text = textOf(form, name);
  if (text === '') return undefined;
  const value = Number(text.replace(',', '.'));
  return Number.isFinite(value) ? value : text;
}
