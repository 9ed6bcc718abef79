'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { useToast } from '@/components/ui/Toast';
import { send } from '@/lib/client/api';
import type { ChangeTask, Task } from '@/lib/schemas/task';

/**
 * Changes a task at once and offers to take it back: `undo` is the change that does. A refusal is shown in the same
 * place. The page is drawn anew after either.
 */
export function useTaskChange(taskId: string) {
  const [busy, setBusy] = useState(false);
  const toast = useToast();
  const router = useRouter();
  async function change(input: ChangeTask, said: string, undo?: ChangeTask): Promise<boolean> {
    setBusy(true);
    const answer = await send<Task>('PATCH', `/api/v1/tasks/${taskId}`, input);
    setBusy(false);
    router.refresh();
    if (!answer.ok) {
      toast({ text: answer.detail });
      return false;
    }
    toast({ text: said, ...(undo && { undo: { run: () => void change(undo, 'Taken back.') } }) });
    return true;
  }
  return { busy, change };
}
