import type { NextAuthOptions } from 'next-auth';
import CredentialsProvider from 'next-auth/providers/credentials';
import { getDatabase } from '@/db/client';
import { endSession } from '@/lib/actions/end-session';
import { DEVICE_MS, SESSION_MS, signIn, type SignedIn } from '@/lib/actions/sign-in';
import { SYSTEM } from '@/lib/domain/access';
import { env } from '@/lib/env';
import { Refusal } from '@/lib/errors';
import { findActor } from './actor';
import { parseCredentials } from './credentials';
import { deviceCookieName, readCookie, sessionCookieName, usesSecureCookies } from './cookies';
import { readSessionToken, signSessionToken } from './session-token';

declare module 'next-auth' {
  interface User {
    sessionId: string;
    expiresAtSeconds: number;
  }
}
declare module 'next-auth/jwt' {
  interface JWT {
    sessionId?: string;
    expiresAtSeconds?: number;
  }
}

/** Who asks, from where. What comes of a sign-in is put in here, for next-auth tells it only as an address. */
export type AuthRequest = { headers: Headers; address: string; signedIn?: SignedIn; refusal?: Refusal };

/**
 * How next-auth signs people in here. Its token is ours (`session-token.ts`) and names a session in the database;
 * who somebody is and what they may do is never in it. Made anew for each request.
 */
export function authOptions(request: AuthRequest): NextAuthOptions {
  const secret = env().AUTH_SECRET;
  return {
    secret,
    useSecureCookies: usesSecureCookies(),
    cookies: {
      sessionToken: {
        name: sessionCookieName(),
        options: { httpOnly: true, sameSite: 'lax', path: '/', secure: usesSecureCookies() },
      },
    },
    session: { strategy: 'jwt', maxAge: SESSION_MS / 1000 },
    pages: { signIn: '/sign-in', signOut: '/sign-in', error: '/sign-in' },
    providers: [
      CredentialsProvider({
        name: 'E-mail and password',
        credentials: { email: { type: 'email' }, password: { type: 'password' } },
        authorize: (credentials) => authorize(credentials, request),
      }),
    ],
    jwt: {
      encode: async ({ token }) =>
        signSessionToken(
          { sessionId: token?.sessionId ?? '', expiresAtSeconds: token?.expiresAtSeconds ?? 0 },
          secret,
        ),
      decode: async ({ token }) => {
        const said = token ? readSessionToken(token, secret, new Date()) : null;
        return said && { ...said };
      },
    },
    callbacks: {
      jwt: ({ token, user }) => {
        const { sessionId, expiresAtSeconds } = user ?? token;
        return { sessionId, expiresAtSeconds };
      },
      session: async ({ token }) => {
        const actor = await findActor(getDatabase(), request.headers);
        if (!actor || !token.expiresAtSeconds) return {} as never;
        const { personId: id, name, email, role } = actor;
        const expires = new Date(token.expiresAtSeconds * 1000).toISOString();
        return { user: { id, name, email, role }, expires } as never;
      },
    },
    events: {
      signOut: async ({ token }) => {
        if (token?.sessionId) await endSession(systemContext(), { sessionId: token.sessionId });
      },
    },
  };
}

/** The `Set-Cookie` that makes the browser a known device of whoever signed in. */
export function deviceCookie({ deviceToken }: SignedIn): string {
  const secure = usesSecureCookies() ? '; Secure' : '';
  return `${deviceCookieName()}=${deviceToken}; Path=/; Max-Age=${DEVICE_MS / 1000}; HttpOnly; SameSite=Lax${secure}`;
}

async function authorize(given: unknown, request: AuthRequest) {
  try {
    const { email, password } = parseCredentials(given);
    const device = readCookie(request.headers.get('cookie'), deviceCookieName());
    const signedIn = await signIn(systemContext(), {
      email,
      password,
      address: request.address,
      deviceToken: device && /^[\w-]{43}$/.test(device) ? device : null,
    });
    request.signedIn = signedIn;
    const expiresAtSeconds = Math.floor(signedIn.expiresAt.getTime() / 1000);
    return { id: signedIn.personId, sessionId: signedIn.sessionId, expiresAtSeconds };
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    request.refusal = error;
    return null;
  }
}

function systemContext() {
  return { db: getDatabase(), actor: SYSTEM, now: new Date() };
}
