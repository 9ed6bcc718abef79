/**
 * Goes to a page of ours by loading it anew, for when who is signed in has changed: nothing that the person before
 * saw stays in the browser's memory.
 */
export function goTo(path: string): void {
  window.location.assign(path);
}
