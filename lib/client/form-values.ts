/** What a form's field says, as text without blanks around it; '' when there is none of that name. */
export function textOf(form: HTMLFormElement, name: string): string {
  return rawOf(form, name).trim();
}

/** As `textOf`, blanks kept: for passwords. */
export function rawOf(form: HTMLFormElement, name: string): string {
  const value = new FormData(form).get(name);
  return typeof value === 'string' ? value : '';
}
