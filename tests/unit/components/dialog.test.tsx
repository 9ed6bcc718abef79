// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { afterEach, expect, test } from 'vitest';
import { Button } from '@/components/ui/Button';
import { Dialog } from '@/components/ui/Dialog';
import { ToastProvider, useToast } from '@/components/ui/Toast';

afterEach(cleanup);

function Ask() {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button onClick={() => setOpen(true)}>Void</Button>
      <Dialog open={open} onClose={() => setOpen(false)} title="Void this reading?">
        It stays in the history.
      </Dialog>
    </>
  );
}

const dialog = () => document.querySelector('dialog')!;

test('a dialog opens on request, is named by its title, and closes by its button', () => {
  render(<Ask />);
  expect(dialog().open).toBe(false);
  fireEvent.click(screen.getByRole('button', { name: 'Void' }));
  expect(dialog().open).toBe(true);
  expect(screen.getByRole('dialog', { name: 'Void this reading?' })).toBe(dialog());
  fireEvent.click(screen.getByRole('button', { name: 'Close' }));
  expect(dialog().open).toBe(false);
});

test('Escape closes a dialog', () => {
  render(<Ask />);
  fireEvent.click(screen.getByRole('button', { name: 'Void' }));
  fireEvent(dialog(), new Event('cancel', { cancelable: true }));
  expect(dialog().open).toBe(false);
});

function Deed({ undone }: { undone: () => void }) {
  const show = useToast();
  return (
    <Button onClick={() => show({ text: 'Task moved to Thu 5 Jun 1997', undo: { run: undone } })}>
      Move
    </Button>
  );
}

test('a deed can be taken back from its toast, which then goes', () => {
  let undone = 0;
  render(
    <ToastProvider>
      <Deed undone={() => (undone += 1)} />
    </ToastProvider>,
  );
  fireEvent.click(screen.getByRole('button', { name: 'Move' }));
  expect(screen.getByRole('status').textContent).toContain('Task moved');
  fireEvent.click(screen.getByRole('button', { name: 'Undo' }));
  expect(undone).toBe(1);
  expect(screen.getByRole('status').textContent).toBe('');
});

test('a busy button takes no second press', () => {
  let presses = 0;
  render(
    <Button busy onClick={() => (presses += 1)}>
      Saving
    </Button>,
  );
  fireEvent.click(screen.getByRole('button'));
  expect(presses).toBe(0);
});
