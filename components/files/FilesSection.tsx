'use client';

import { useState } from 'react';
import { Notice } from '@/components/ui/Notice';
import { useToast } from '@/components/ui/Toast';
import type { Failure } from '@/lib/client/api';
import type { Attachment } from '@/lib/schemas/attachment';
import { ChooseFiles } from './ChooseFiles';
import { FileTiles } from './FileTiles';
import { useFiles, type FileOf } from './use-files';

/** The pictures and documents of a unit or a task, and more of them. */
export function FilesSection({
  of,
  initial,
  me,
  mayAdd,
  mayRemove,
}: {
  of: FileOf;
  initial: readonly Attachment[];
  me: string;
  mayAdd: boolean;
  mayRemove: boolean;
}) {
  const { files, waiting, ready, add, remove, restore } = useFiles(of, initial, me);
  const [failure, setFailure] = useState<Failure | null>(null);
  const toast = useToast();
  const shown = files.map((file) => ({
    ...file,
    ...(of.taskId === undefined && { about: file.defectTitle ?? file.taskTitle ?? undefined }),
  }));
  async function take(id: string, name: string): Promise<void> {
    const refusal = await remove(id);
    setFailure(refusal);
    if (!refusal) toast({ text: `${name} is removed.`, undo: { run: () => void restore(id) } });
  }
  return (
    <section className="grid gap-4" aria-labelledby="files">
      <h2 id="files" className="text-2xl">
        Pictures and documents
      </h2>
      {shown.length === 0 && waiting.length === 0 ? (
        <p className="text-ink-soft">None yet{mayAdd ? ': a picture says more than a note.' : '.'}</p>
      ) : null}
      <FileTiles
        files={shown}
        waiting={waiting}
        onRemove={mayRemove ? ({ id, name }) => void take(id, name) : undefined}
      />
      {failure ? (
        <Notice tone="danger">
          {failure.errors[0] ? `This picture ${failure.errors[0].message}.` : failure.detail}
        </Notice>
      ) : null}
      {mayAdd ? (
        <div className="no-print">
          <ChooseFiles documents disabled={!ready} onChoose={(chosen) => void add(chosen)} />
        </div>
      ) : null}
    </section>
  );
}
