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

const changes = new EventTarget();
const channel = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel('wakewright-outbox');
channel?.addEventListener('message', () => changes.dispatchEvent(new Event('change')));

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
export async function drainOutbox(
  owner: string,
  sent: (entry: KeptEntry, answer: unknown) => void,
): Promise<void> {
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
        sent(entry, answer.data);
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

/** One drain at a time, over all tabs where the browser can: ids make a second one harmless, only wasteful. */
async function alone(work: () => Promise<void>): Promise<void> {
  if (draining) return;
  draining = true;
  try {
    const locks = typeof navigator === 'undefined' ? undefined : navigator.locks;
    if (!locks) await work();
    else
      await locks.request('wakewright-outbox', { ifAvailable: true }, (lock) => (lock ? work() : undefined));
  } finally {
    draining = false;
  }
}
