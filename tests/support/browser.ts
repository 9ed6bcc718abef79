/** A browser without a window: keeps its cookies, says where its requests come from, signs in. */
export type Browser = {
  jar: Map<string, string>;
  fetch(path: string, init?: RequestInit): Promise<Response>;
  /** Signs in as the page does and answers the response. */
  signIn(email: string, password: string): Promise<Response>;
  signOut(): Promise<Response>;
  /** Whether the server takes this browser for somebody. */
  isSignedIn(): Promise<boolean>;
};

/** `address` is where a proxy in front of the server would say the browser is. */
export function openBrowser(baseUrl: string, { address }: { address?: string } = {}): Browser {
  const jar = new Map<string, string>();
  async function fetchAs(path: string, init: RequestInit = {}): Promise<Response> {
    const headers = new Headers(init.headers);
    if (!headers.has('origin')) headers.set('origin', baseUrl);
    if (address) headers.set('x-forwarded-for', address);
    headers.set('cookie', [...jar].map(([name, value]) => `${name}=${value}`).join('; '));
    const response = await fetch(`${baseUrl}${path}`, { redirect: 'manual', ...init, headers });
    for (const cookie of response.headers.getSetCookie()) {
      const [, name = '', value = ''] = /^([^=]+)=([^;]*)/.exec(cookie) ?? [];
      if (value === '' || /max-age=0/i.test(cookie)) jar.delete(name);
      else jar.set(name, value);
    }
    return response;
  }
  async function withToken(path: string, fields: Record<string, string>): Promise<Response> {
    const { csrfToken } = (await (await fetchAs('/api/auth/csrf')).json()) as { csrfToken: string };
    return fetchAs(path, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify({ ...fields, csrfToken, json: 'true' }),
    });
  }
  return {
    jar,
    fetch: fetchAs,
    signIn: (email, password) => withToken('/api/auth/callback/credentials', { email, password }),
    signOut: () => withToken('/api/auth/signout', {}),
    isSignedIn: async () => (await fetchAs('/api/v1/account')).status === 200,
  };
}

/** Sends JSON from a browser, as a form of ours does. */
export async function sendFrom(
  browser: Browser,
  method: string,
  path: string,
  body?: unknown,
): Promise<{ status: number; body: Record<string, unknown> }> {
  const response = await browser.fetch(`/api/v1${path}`, {
    method,
    ...(body !== undefined && {
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify(body),
    }),
  });
  const text = await response.text();
  return { status: response.status, body: text ? (JSON.parse(text) as Record<string, unknown>) : {} };
}
