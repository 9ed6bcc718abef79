import { env } from '@/lib/env';

/** The whole address of a page of ours, for a letter: `linkTo('/tasks')`. */
export function linkTo(path: string): string {
  return new URL(path, env().PUBLIC_URL).href;
}

/** Where a development set-up keeps its mail; null where mail goes to people. */
export function mailboxUrl(): string | null {
  return env().MAILBOX_URL ?? null;
}
