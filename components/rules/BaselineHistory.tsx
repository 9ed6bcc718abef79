'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { DataTable, type TableColumn } from '@/components/ui/DataTable';
import { Dialog } from '@/components/ui/Dialog';
import { useToast } from '@/components/ui/Toast';
import { send } from '@/lib/client/api';
import { describeDay } from '@/lib/domain/words';
import type { Baseline } from '@/lib/schemas/baseline';
import { hoursText } from './due-words';

const COLUMNS: TableColumn[] = [
  { id: 'rule', header: 'Rule', sortable: true },
  { id: 'on', header: 'Last done on', sortable: true },
  { id: 'at', header: 'At', align: 'end' },
  { id: 'outings', header: 'Outings', align: 'end' },
  { id: 'note', header: 'Who says so' },
  { id: 'act', header: 'Standing' },
];

/** What was recorded, withdrawn lines too; a manager may withdraw a mistake. */
export function BaselineHistory({ baselines, mayWithdraw }: { baselines: Baseline[]; mayWithdraw: boolean }) {
  const router = useRouter();
  const toast = useToast();
  const [asked, setAsked] = useState<Baseline | null>(null);
  const [busy, setBusy] = useState(false);

  const withdraw = async ({ id, unitId, ruleName }: Baseline) => {
    setBusy(true);
    const answer = await send<Baseline>('POST', `/api/v1/units/${unitId}/baselines/${id}/withdrawal`);
    setBusy(false);
    setAsked(null);
    toast({
      text: answer.ok
        ? `The baseline of “${ruleName}” is withdrawn; its due points are being worked out again.`
        : answer.detail,
    });
    router.refresh();
  };

  return (
    <>
      <DataTable
        caption="Baselines recorded for this unit"
        columns={COLUMNS}
        empty={<p className="text-ink-soft">Nothing is recorded yet.</p>}
        rows={baselines.map((baseline) => ({
          key: baseline.id,
          cells: {
            rule: baseline.ruleName,
            on: describeDay(baseline.closedOn),
            at: <span className="numerals whitespace-nowrap">{hoursText(baseline.engineHours)}</span>,
            outings: <span className="numerals">{baseline.outings}</span>,
            note: `${baseline.note}${baseline.recordedBy ? ` (${baseline.recordedBy})` : ''}`,
            act: baseline.withdrawnAt ? (
              `Withdrawn${baseline.withdrawnBy ? ` by ${baseline.withdrawnBy}` : ''}`
            ) : mayWithdraw ? (
              <Button onClick={() => setAsked(baseline)}>Withdraw</Button>
            ) : (
              'Counts'
            ),
          },
          sort: { rule: baseline.ruleName, on: baseline.closedOn },
        }))}
      />
      <Dialog
        open={asked !== null}
        onClose={() => setAsked(null)}
        title={`Withdraw the baseline of “${asked?.ruleName ?? ''}”?`}
        footer={
          <>
            <Button onClick={() => setAsked(null)}>Keep it</Button>
            <Button kind="danger" busy={busy} onClick={() => asked && void withdraw(asked)}>
              Withdraw
            </Button>
          </>
        }
      >
        The unit goes back to what was known before, and may become overdue. The line is kept, marked as
        withdrawn.
      </Dialog>
    </>
  );
}
