'use client';

import { useState, type FormEvent } from 'react';
import { NewPasswordInput } from '@/components/account/NewPasswordInput';
import { Button } from '@/components/ui/Button';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { Notice } from '@/components/ui/Notice';
import { TextInput } from '@/components/ui/TextInput';
import { fieldError, send } from '@/lib/client/api';
import { rawOf, textOf } from '@/lib/client/form-values';
import { goTo } from '@/lib/client/go-to';
import { signIn } from '@/lib/client/sign-in';
import { useSend } from '@/lib/client/use-send';
import { FirstDockFields } from './FirstDockFields';

/** Names the operator, the first dock and the first manager, who is signed in right away. */
export function SetupForm({ timeZones }: { timeZones: string[] }) {
  const { busy, failure, run } = useSend();
  const [allYear, setAllYear] = useState(true);
  const error = (path: string) => fieldError(failure, path);

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const body = readForm(event.currentTarget, allYear);
    if (!(await run(() => send('POST', '/api/v1/setup', body)))) return;
    const { email, password } = body.manager;
    goTo((await run(() => signIn(email, password))) ? '/' : '/sign-in');
  }

  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-8">
      {failure && failure.errors.length === 0 ? <Notice tone="danger">{failure.detail}</Notice> : null}
      <ErrorSummary
        errors={(failure?.errors ?? []).map((each) => ({ ...each, message: named(each.path, each.message) }))}
      />
      <Part title="This server">
        <TextInput
          name="token"
          label="Set-up token"
          hint="It was printed where this server was started."
          autoComplete="off"
          spellCheck={false}
          error={error('token')}
          large
        />
      </Part>
      <Part title="Operator">
        <TextInput
          name="operatorName"
          label="Name of the operator"
          autoComplete="organization"
          error={error('operatorName')}
          large
        />
      </Part>
      <Part title="First dock">
        <FirstDockFields timeZones={timeZones} allYear={allYear} onAllYear={setAllYear} error={error} />
      </Part>
      <Part title="First manager">
        <TextInput
          name="manager.name"
          label="Your name"
          autoComplete="name"
          error={error('manager.name')}
          large
        />
        <TextInput
          name="manager.email"
          type="email"
          label="E-mail address"
          autoComplete="username"
          error={error('manager.email')}
          large
        />
        <NewPasswordInput name="manager.password" error={error('manager.password')} />
      </Part>
      <Button type="submit" kind="primary" size="large" wide busy={busy}>
        Set up and sign in
      </Button>
    </form>
  );
}

function Part({ title, children }: { title: string; children: React.ReactNode }) {
  return (
    <fieldset className="grid gap-5">
      <legend className="mb-3 text-xl font-bold">{title}</legend>
      {children}
    </fieldset>
  );
}

const NAMES: Record<string, string> = {
  token: 'Set-up token',
  operatorName: 'Name of the operator',
  'dock.name': 'Name of the dock',
  'dock.timeZone': 'Time zone',
  'dock.season.from': 'First day',
  'dock.season.to': 'Last day',
  'manager.name': 'Your name',
  'manager.email': 'E-mail address',
  'manager.password': 'Password',
};

function named(path: string, message: string): string {
  return NAMES[path] ? `${NAMES[path]}: ${message}` : message;
}

function readForm(form: HTMLFormElement, allYear: boolean) {
  const season = { from: textOf(form, 'dock.season.from'), to: textOf(form, 'dock.season.to') };
  return {
    token: textOf(form, 'token'),
    operatorName: textOf(form, 'operatorName'),
    dock: {
      name: textOf(form, 'dock.name'),
      timeZone: textOf(form, 'dock.timeZone'),
      ...(!allYear && { season }),
    },
    manager: {
      name: textOf(form, 'manager.name'),
      email: textOf(form, 'manager.email'),
      password: rawOf(form, 'manager.password'),
    },
  };
}
