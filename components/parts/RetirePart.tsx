'use client';

import { useRouter } from 'next/navigation';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { useToast } from '@/components/ui/Toast';
import { send } from '@/lib/client/api';
import { useSend } from '@/lib/client/use-send';
import type { Part } from '@/lib/schemas/part';

/** Takes a part out of use, or says why that cannot be. */
export function RetirePart({ part }: { part: Pick<Part, 'id' | 'name'> }) {
  const router = useRouter();
  const toast = useToast();
  const { busy, failure, run } = useSend();
  async function retire(): Promise<void> {
    if (!(await run(() => send('POST', `/api/v1/parts/${part.id}/retirement`)))) return;
    toast({ text: `${part.name} is retired.` });
    router.push('/parts');
    router.refresh();
  }
  return (
    <section className="mt-10 grid max-w-3xl gap-3 border-t-2 border-line pt-4" aria-labelledby="retire">
      <h2 id="retire" className="text-xl">
        No longer used
      </h2>
      <p className="max-w-prose text-ink-soft">
        A retired part is offered nowhere any more. Its moves stay on record.
      </p>
      {failure ? <Notice tone="danger">It {failure.detail}.</Notice> : null}
      <div>
        <Button busy={busy} onClick={() => void retire()}>
          Retire {part.name}
        </Button>
      </div>
    </section>
  );
}
