import type { FormEvent, ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { formError, type Failure } from '@/lib/client/api';

/**
 * A form about oneself: what went wrong apart from its `fields` above them, one button below. At the front door it
 * takes the whole width and its button is large.
 */
export function AccountForm({
  fields,
  button,
  sending,
  onSubmit,
  children,
  below,
  door = false,
}: {
  fields: string[];
  button: string;
  sending: { busy: boolean; failure: Failure | null };
  onSubmit: (form: HTMLFormElement) => Promise<void>;
  children: ReactNode;
  below?: ReactNode;
  door?: boolean;
}) {
  const error = formError(sending.failure, fields);
  function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    void onSubmit(event.currentTarget);
  }
  const send = (
    <Button type="submit" kind="primary" busy={sending.busy} {...(door && { size: 'large', wide: true })}>
      {button}
    </Button>
  );
  return (
    <form onSubmit={submit} noValidate className={door ? 'grid gap-5' : 'grid max-w-xl gap-5'}>
      {error ? <Notice tone="danger">{error}</Notice> : null}
      {children}
      {door ? send : <div>{send}</div>}
      {below}
    </form>
  );
}
