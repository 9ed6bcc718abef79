import { openDB, type DBSchema, type IDBPDatabase } from 'idb';
import { send, type Failure } from './api';
import { sendFile } from './send-file';

/** Something entered that the server is to have. `id` is the entry's own: sent twice, it is kept once. */
export type OutboxEntry = {
  id: string;
  /** What it belongs to, as `task:…`: what a page asks for. */
  scope: string;
  /** Who entered it: nobody else's session sends it. */
  owner: string;
  path: string;
  body: Readonly<Record<string, unknown>>;
  /** A file goes as it is, in place of `body`. */
  file?: Blob;
  madeAt: string;
};
/** An entry on this device, in the order it was made; `refused` once the server would not have it. */
export type KeptEntry = OutboxEntry & { order: number; faults: number; refused: Failure | null };

interface OutboxDatabase extends DBSchema {
  entry: { key: number; value: Omit<KeptEntry, 'order'> & { order?: number }; indexes: { id: string } };
}

/** After this many faults of the server at one entry the others go on without it. */
const MOST_FAULTS = 5;
/** With these, the entry is all right and the moment is not: it is sent again later. */
const LATER = ['connection_lost', 'not_signed_in', 'unavailable', 'too_many_attempts'];

let opened: Promise<IDBPDatabase<OutboxDatabase>> | null = null;

function open(): Promise<IDBPDatabase<OutboxDatabase>> {
  opened ??= openDB<OutboxDatabase>('wakewright-outbox', 1, {
    upgrade(database) {
      const store = database.createObjectStore('entry', { keyPath: 'order', autoIncrement: true });
      store.createIndex('id', 'id', { unique: true });
    },
  });
  return opened;
}

/** An entry that the server took, and what it answered. */
export type SentEntry = {
  entry: Pick<KeptEntry, 'id' | 'scope' | 'owner'>;
  isFile: boolean;
  answer: unknown;
};

const changes = new EventTarget();
const channel = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel('wakewright-outbox');
channel?.addEventListener('message', ({ data }: MessageEvent<SentEntry | 'change'>) => {
  if (data === 'change') changes.dispatchEvent(new Event('change'));
  else changes.dispatchEvent(new CustomEvent('sent', { detail: data }));
});

function tellChange(): void {
  changes.dispatchEvent(new Event('change'));
  channel?.postMessage('change');
}

/** Calls `listener` whenever what is kept changes, in this tab or another. Answers how to stop. */
export function onOutboxChange(listener: () => void): () => void {
  changes.addEventListener('change', listener);
  return () => changes.removeEventListener('change', listener);
}

/** How much of each file that is on its way has gone, from 0 to 1, by its entry's id. */
const progress = new Map<string, number>();

/** How much of an entry's file has gone, from 0 to 1; null while it is not on its way. */
export function progressOf(id: string): number | null {
  return progress.get(id) ?? null;
}

function tellProgress(id: string, share: number): void {
  progress.set(id, share);
  changes.dispatchEvent(new Event('change'));
}

/** Calls `listener` for every entry that is taken, whichever part of which tab sent it. Answers how to stop. */
export function onOutboxSent(listener: (sent: SentEntry) => void): () => void {
  const heard = (event: Event) => listener((event as CustomEvent<SentEntry>).detail);
  changes.addEventListener('sent', heard);
  return () => changes.removeEventListener('sent', heard);
}

function tellSent({ id, scope, owner, file }: KeptEntry, answer: unknown): void {
  const detail: SentEntry = { entry: { id, scope, owner }, isFile: file !== undefined, answer };
  changes.dispatchEvent(new CustomEvent('sent', { detail }));
  channel?.postMessage(detail);
}

/** Keeps an entry on this device. It is safe from a reload, a lost connection and a closed browser once this is done. */
export async function keepEntry(entry: OutboxEntry): Promise<void> {
  const database = await open();
  await database.add('entry', { ...entry, faults: 0, refused: null });
  tellChange();
}

/** What this person entered here that the server does not have, in the order it was made. */
export async function listKept(scope: string, owner: string): Promise<KeptEntry[]> {
  const all = (await (await open()).getAll('entry')) as KeptEntry[];
  return all.filter((entry) => entry.scope === scope && entry.owner === owner);
}

/** Forgets an entry that the server would not have. */
export async function discardEntry(order: number): Promise<void> {
  await (await open()).delete('entry', order);
  tellChange();
}

/** Sends what this person entered, in order, until all is sent or the server cannot be reached. */
export async function drainOutbox(owner: string): Promise<void> {
  await alone(async () => {
    const database = await open();
    const all = (await database.getAll('entry')) as KeptEntry[];
    for (const entry of all.filter((one) => one.owner === owner && one.refused === null)) {
      const answer = entry.file
        ? await sendFile<unknown>(entry.path, entry.file, (share) => tellProgress(entry.id, share))
        : await send<unknown>('POST', entry.path, entry.body);
      progress.delete(entry.id);
      if (answer.ok) {
        await database.delete('entry', entry.order);
        tellSent(entry, answer.data);
      } else if (LATER.includes(answer.code)) {
        return;
      } else if (answer.code === 'fault' && entry.faults + 1 < MOST_FAULTS) {
        await database.put('entry', { ...entry, faults: entry.faults + 1 });
        return;
      } else {
        await database.put('entry', { ...entry, refused: answer });
      }
      tellChange();
    }
  });
}

let draining = false;
let wantedAgain = false;

/**
 * One drain at a time, over all tabs where the browser can: ids make a second one harmless, only wasteful. One asked
 * for meanwhile follows at once, for it may be about what came after.
 */
async function alone(work: () => Promise<void>): Promise<void> {
  if (draining) {
    wantedAgain = true;
    return;
  }
  draining = true;
  try {
    const locks = typeof navigator === 'undefined' ? undefined : navigator.locks;
    do {
      wantedAgain = false;
      if (!locks) await work();
      else
        await locks.request('wakewright-outbox', { ifAvailable: true }, (lock) =>
          lock ? work() : undefined,
        );
    } while (wantedAgain);
  } finally {
    draining = false;
  }
}
