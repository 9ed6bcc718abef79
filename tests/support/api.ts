export interface Answer<T> {
  status: number;
  headers: Headers;
  body: T;
}

/** What a test asks of `/api/v1`; paths begin after that, as in `api.post('/units', {…})`. */
export interface Api {
  get<T = unknown>(path: string): Promise<Answer<T>>;
  post<T = unknown>(path: string, body?: unknown): Promise<Answer<T>>;
  put<T = unknown>(path: string, body?: unknown): Promise<Answer<T>>;
  patch<T = unknown>(path: string, body?: unknown): Promise<Answer<T>>;
  delete<T = unknown>(path: string): Promise<Answer<T>>;
  /** With a body that is sent as it is, for broken JSON and the like. */
  send<T = unknown>(method: string, path: string, init: RequestInit): Promise<Answer<T>>;
}

/** How a caller says who it is: with the Cookie header that signIn() answered, or with an API key. */
export type Caller = string | { key: string };

/** A caller of the API, or nobody. With a cookie it calls as a browser on our own pages does. */
export function api(baseUrl: string, caller: Caller = ''): Api {
  async function send<T>(method: string, path: string, init: RequestInit = {}): Promise<Answer<T>> {
    const headers = new Headers(init.headers);
    if (typeof caller !== 'string') headers.set('authorization', `Bearer ${caller.key}`);
    else if (caller) headers.set('cookie', caller);
    if (typeof caller === 'string' && !headers.has('origin')) headers.set('origin', baseUrl);
    const response = await fetch(`${baseUrl}/api/v1${path}`, {
      redirect: 'manual',
      ...init,
      method,
      headers,
    });
    const text = await response.text();
    const isJson = response.headers.get('content-type')?.includes('json') && text !== '';
    return {
      status: response.status,
      headers: response.headers,
      body: (isJson ? JSON.parse(text) : text) as T,
    };
  }
  const withBody =
    (method: string) =>
    <T>(path: string, body: unknown = {}) =>
      send<T>(method, path, { body: JSON.stringify(body), headers: { 'content-type': 'application/json' } });
  return {
    get: (path) => send('GET', path),
    post: withBody('POST'),
    put: withBody('PUT'),
    patch: withBody('PATCH'),
    delete: (path) => send('DELETE', path),
    send,
  };
}
