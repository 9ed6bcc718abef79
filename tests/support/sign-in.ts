/** Cookies by name; a later one replaces an earlier one. */
function keepCookies(jar: Map<string, string>, response: Response): void {
  for (const cookie of response.headers.getSetCookie()) {
    const [pair = ''] = cookie.split(';');
    const at = pair.indexOf('=');
    jar.set(pair.slice(0, at), pair.slice(at + 1));
  }
}

const header = (jar: Map<string, string>) => [...jar].map(([name, value]) => `${name}=${value}`).join('; ');

/**
 * Signs in as the sign-in page does, through next-auth's credentials callback, and answers the Cookie header of
 * the session. Throws when it is refused.
 */
export async function signIn(baseUrl: string, email: string, password: string): Promise<string> {
  const jar = new Map<string, string>();
  const csrf = await fetch(`${baseUrl}/api/auth/csrf`);
  keepCookies(jar, csrf);
  const { csrfToken } = (await csrf.json()) as { csrfToken: string };
  const answer = await fetch(`${baseUrl}/api/auth/callback/credentials`, {
    method: 'POST',
    headers: { cookie: header(jar), origin: baseUrl },
    body: new URLSearchParams({ csrfToken, email, password, json: 'true' }),
    redirect: 'manual',
  });
  keepCookies(jar, answer);
  if (![...jar.keys()].some((name) => name.includes('session-token'))) {
    throw new Error(`${email} could not sign in: ${answer.status} ${await answer.text()}`);
  }
  return header(jar);
}
