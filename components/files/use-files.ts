'use client';

import { useCallback, useEffect, useMemo, useState } from 'react';
import { send } from '@/lib/client/api';
import { makeId } from '@/lib/client/entry-id';
import { discardEntry, keepEntry, progressOf, type KeptEntry, type SentEntry } from '@/lib/client/outbox';
import { useOutbox } from '@/lib/client/use-outbox';
import type { Attachment } from '@/lib/schemas/attachment';

/** Of what a file is. */
export type FileOf = { unitId: string; taskId?: string; defectId?: string };
/** A file that only this device has yet: with a picture of it, how much has gone, and why it was refused. */
export type WaitingFile = {
  id: string;
  name: string;
  url: string;
  isPicture: boolean;
  share: number | null;
  refused: string | null;
  discard: () => void;
};

/** Keeps a file on this device for the server; it goes in its turn. Answers the id it has from now on. */
export async function keepFile(
  file: File,
  of: FileOf,
  { scope, owner }: { scope: string; owner: string },
): Promise<string> {
  const id = makeId();
  const name =
    file.name
      .replaceAll(/[\u0000-\u001f\u007f]/g, ' ')
      .trim()
      .slice(-120) || 'picture';
  const query = new URLSearchParams({ id, name, ...of });
  await keepEntry({
    ...{ id, scope, owner, file, body: {} },
    path: `/api/v1/attachments?${query.toString()}`,
    madeAt: new Date().toISOString(),
  });
  return id;
}

/** Addresses of files of this device, one for an entry however often it is read. */
const urls = new Map<string, string>();

function urlOf(id: string, file: Blob): string {
  const url = urls.get(id) ?? URL.createObjectURL(file);
  urls.set(id, url);
  return url;
}

function forgetUrls(ids: ReadonlySet<string>): void {
  for (const id of ids) {
    const url = urls.get(id);
    if (url) URL.revokeObjectURL(url);
    urls.delete(id);
  }
}

/** The files among what is kept, each with an address to show it by until it is gone. */
export function useWaitingFiles(kept: readonly KeptEntry[]): WaitingFile[] {
  const files = useMemo(() => kept.filter(({ file }) => file !== undefined), [kept]);
  const ids = files.map(({ id }) => id).join(' ');
  useEffect(() => () => forgetUrls(new Set(ids.split(' '))), [ids]);
  return files.map((entry) => ({
    id: entry.id,
    name: new URLSearchParams(entry.path.split('?')[1]).get('name') ?? '',
    url: urlOf(entry.id, entry.file!),
    isPicture: entry.file!.type.startsWith('image/'),
    share: progressOf(entry.id),
    refused: entry.refused && (entry.refused.errors[0]?.message ?? entry.refused.detail),
    discard: () => void discardEntry(entry.order),
  }));
}

/** The files of a unit, task or defect: those the server has, and those on their way to it. */
export function useFiles(of: FileOf, initial: readonly Attachment[], owner: string) {
  const scope = `files:${of.taskId ?? of.defectId ?? of.unitId}`;
  const [added, setAdded] = useState<Attachment[]>([]);
  const [removed, setRemoved] = useState<string[]>([]);
  const sent = useCallback(({ answer }: SentEntry) => {
    setAdded((list) => [answer as Attachment, ...list]);
  }, []);
  const { kept, ready, drain } = useOutbox(scope, owner, sent);
  const waiting = useWaitingFiles(kept);
  const known = new Set(initial.map(({ id }) => id));
  const files = [...added.filter(({ id }) => !known.has(id)), ...initial].filter(
    ({ id }) => !removed.includes(id),
  );
  return {
    ...{ files, waiting, ready, sendNow: drain },
    add: async (chosen: readonly File[]) => {
      for (const file of chosen) await keepFile(file, of, { scope, owner });
      drain();
    },
    remove: async (id: string) => {
      const answer = await send('DELETE', `/api/v1/attachments/${id}`);
      if (answer.ok) setRemoved((list) => [...list, id]);
      return answer.ok ? null : answer;
    },
    restore: async (id: string) => {
      const answer = await send('POST', `/api/v1/attachments/${id}/restoration`);
      if (answer.ok) setRemoved((list) => list.filter((one) => one !== id));
    },
  };
}
