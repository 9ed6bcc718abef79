import { cache } from 'react';
import { headers } from 'next/headers';
import { redirect } from 'next/navigation';
import { getDatabase } from '@/db/client';
import { getOperator } from '@/lib/actions/get-operator';
import type { Context } from '@/lib/context';
import type { PersonActor } from '@/lib/domain/access';
import { SYSTEM } from '@/lib/domain/access';
import { findActor } from './actor';
import { PATH_HEADER, safeNext } from './next-path';

const now = cache(() => new Date());
const signedIn = cache(async () => findActor(getDatabase(), await headers(), now()));

/**
 * The signed-in person, for a server page. Sends anybody else to sign in and back again, and the first visitor of
 * an empty server to set it up. However often a page and its layout ask, the database is asked once.
 */
export async function requirePerson(): Promise<PersonActor> {
  const actor = await signedIn();
  if (actor) return actor;
  if (!(await getOperator({ db: getDatabase() }))) redirect('/setup');
  const next = safeNext((await headers()).get(PATH_HEADER));
  redirect(next === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(next)}`);
}

/** What a server page gives to an action: as `requirePerson`, with where the records are and what time it is. */
export async function pageContext(): Promise<Context & { actor: PersonActor }> {
  return { actor: await requirePerson(), db: getDatabase(), now: now() };
}

/** What a page that anybody may open gives to an action: nobody's context, so the action checks a token of its own. */
export function publicContext(): Context {
  return { actor: SYSTEM, db: getDatabase(), now: now() };
}

/** Whether somebody is signed in, for a page that anybody may open. */
export async function isSignedIn(): Promise<boolean> {
  return (await signedIn()) !== null;
}
