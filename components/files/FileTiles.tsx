'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Dialog } from '@/components/ui/Dialog';
import { Tag } from '@/components/ui/Tag';
import type { Attachment } from '@/lib/schemas/attachment';
import type { WaitingFile } from './use-files';

/** What a tile shows of a file the server has. */
export type ShownFile = Pick<Attachment, 'id' | 'name' | 'kind'> & { about?: string };

const TILE = 'grid size-32 place-items-center overflow-hidden border-2 bg-raised';

/** Pictures small, to be opened large; documents by name; and what has not reached the server yet. */
export function FileTiles({
  files,
  waiting,
  onRemove,
}: {
  files: readonly ShownFile[];
  waiting: readonly WaitingFile[];
  /** Without it nothing is removed from here. */
  onRemove?: (file: ShownFile) => void;
}) {
  const [open, setOpen] = useState<ShownFile | null>(null);
  return (
    <>
      <ul className="flex flex-wrap gap-3">
        {waiting.map((file) => (
          <li key={file.id} className="grid w-32 content-start gap-1">
            <span className={`${TILE} border-dashed border-edge`}>
              {file.isPicture ? (
                <img src={file.url} alt={file.name} className="size-full object-cover" />
              ) : (
                file.name
              )}
            </span>
            {file.refused ? (
              <>
                <Tag tone="danger">Not taken</Tag>
                <span className="text-sm">This file {file.refused}.</span>
                <Button kind="quiet" onClick={file.discard}>
                  Forget it
                </Button>
              </>
            ) : file.share !== null ? (
              <span role="status" className="text-sm">
                Sending, {Math.round(100 * file.share)} %
              </span>
            ) : (
              <span role="status" className="text-sm">
                Kept on this device
              </span>
            )}
          </li>
        ))}
        {files.map((file) => (
          <li key={file.id} className="grid w-32 content-start gap-1">
            {file.kind === 'picture' ? (
              <button
                type="button"
                className={`${TILE} border-edge hover:border-ink`}
                aria-label={`Open ${file.name}`}
                onClick={() => setOpen(file)}
              >
                <img
                  src={`/api/v1/attachments/${file.id}/thumb`}
                  alt=""
                  loading="lazy"
                  className="size-full object-cover"
                />
              </button>
            ) : (
              <a
                className={`${TILE} link border-edge p-2 text-center break-all`}
                href={`/api/v1/attachments/${file.id}`}
              >
                {file.name}
              </a>
            )}
            {file.about ? <span className="text-sm text-ink-soft">{file.about}</span> : null}
          </li>
        ))}
      </ul>
      <Dialog
        open={open !== null}
        onClose={() => setOpen(null)}
        title={open?.name}
        footer={
          open && onRemove ? (
            <Button
              onClick={() => {
                onRemove(open);
                setOpen(null);
              }}
            >
              Remove
            </Button>
          ) : undefined
        }
      >
        {open ? (
          <img src={`/api/v1/attachments/${open.id}`} alt={open.name} className="mx-auto max-h-[70dvh]" />
        ) : null}
      </Dialog>
    </>
  );
}
