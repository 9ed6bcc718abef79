import { send, type Answer } from './api';

/**
 * Begins a session in this browser through next-auth's credentials callback. Answers as `send` does: a wrong
 * password as `not_signed_in`, too many of them as `too_many_attempts` with how long to wait in its sentence.
 */
export async function signIn(email: string, password: string): Promise<Answer<unknown>> {
  return sendWithToken('/api/auth/callback/credentials', { email, password });
}

/** Ends this browser's session. */
export async function signOut(): Promise<Answer<unknown>> {
  return sendWithToken('/api/auth/signout', {});
}

/** next-auth's own routes want the token that they gave to this browser's cookie. */
async function sendWithToken(path: string, body: Record<string, string>): Promise<Answer<unknown>> {
  const csrf = await send<{ csrfToken: string }>('GET', '/api/auth/csrf');
  if (!csrf.ok) return csrf;
  return send('POST', path, { ...body, csrfToken: csrf.data.csrfToken, json: 'true' });
}
