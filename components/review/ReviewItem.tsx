'use client';

import Link from 'next/link';
import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { DescriptionList } from '@/components/ui/DescriptionList';
import { Dialog } from '@/components/ui/Dialog';
import { Tag } from '@/components/ui/Tag';
import { instantText } from '@/components/ui/time-text';
import type { Reading } from '@/lib/schemas/reading';
import { AcceptForm } from './AcceptForm';
import { VoidForm } from './VoidForm';

const WHY = { unusual_jump: 'Unusual jump', late_arrival: 'Arrived late' } as const;

/** One reading that waits: both values, why it was kept, and the two things to do about it. */
export function ReviewItem({ reading }: { reading: Reading }) {
  const [open, setOpen] = useState<'accept' | 'void' | null>(null);
  const { previous, timeZone } = reading;
  const when = (at: string) => instantText(new Date(at), timeZone);
  const items = [
    { term: 'Reading', detail: `${reading.engineHours.toFixed(1)} h on ${when(reading.at)}` },
    {
      term: 'The one before',
      detail: previous ? `${previous.engineHours.toFixed(1)} h on ${when(previous.at)}` : 'None',
    },
    {
      term: 'Run between',
      detail: previous ? `${(reading.engineHours - previous.engineHours).toFixed(1)} h` : '–',
    },
    ...(reading.outingStartedAt
      ? [{ term: 'Outing', detail: `since ${when(reading.outingStartedAt)}` }]
      : []),
    { term: 'Reason given', detail: reading.confirmReason ?? 'None' },
    { term: 'Kept by', detail: `${reading.recordedBy ?? 'The system'}, ${when(reading.recordedAt)}` },
  ];
  return (
    <section aria-label={`Reading of ${reading.fleetNumber}`} className="grid max-w-prose gap-3">
      <h2 className="flex flex-wrap items-center gap-3 text-2xl">
        <Link
          href={`/units/${reading.unitId}`}
          className="link numerals inline-flex min-h-target items-center"
        >
          {reading.fleetNumber}
        </Link>
        <span className="text-base font-normal text-ink-soft">{reading.dockName}</span>
        {reading.review ? <Tag tone="warn">{WHY[reading.review]}</Tag> : null}
      </h2>
      <DescriptionList items={items} />
      <div className="flex flex-wrap gap-2">
        <Button kind="primary" size="large" onClick={() => setOpen('accept')}>
          Accept
        </Button>
        <Button size="large" onClick={() => setOpen('void')}>
          Void
        </Button>
      </div>
      <Dialog
        open={open === 'accept'}
        onClose={() => setOpen(null)}
        title={`Accept the reading of ${reading.fleetNumber}`}
      >
        {open === 'accept' ? <AcceptForm reading={reading} onDone={() => setOpen(null)} /> : null}
      </Dialog>
      <Dialog
        open={open === 'void'}
        onClose={() => setOpen(null)}
        title={`Void the reading of ${reading.fleetNumber}`}
      >
        {open === 'void' ? <VoidForm reading={reading} onDone={() => setOpen(null)} /> : null}
      </Dialog>
    </section>
  );
}
