/** What came back, its body parsed where it is JSON. */
export interface Reply {
  readonly status: number;
  readonly headers: Headers;
  readonly text: string;
  // eslint-disable-next-line @typescript-eslint/no-explicit-any -- suites look into replies of every shape
  readonly body: any;
  readonly etag: string | null;
}

/** A browser as far as cookies and the XSRF header go, and nothing more. */
export class TestClient {
  readonly cookies = new Map<string, string>();

  constructor(private readonly url: string) {}

  get(path: string, headers?: Record<string, string>): Promise<Reply> {
    return this.send('GET', path, undefined, headers);
  }

  post(path: string, body?: unknown, headers?: Record<string, string>): Promise<Reply> {
    return this.send('POST', path, body, headers);
  }

  put(path: string, body?: unknown, headers?: Record<string, string>): Promise<Reply> {
    return this.send('PUT', path, body, headers);
  }

  patch(path: string, body?: unknown, headers?: Record<string, string>): Promise<Reply> {
    return this.send('PATCH', path, body, headers);
  }

  delete(path: string, headers?: Record<string, string>): Promise<Reply> {
    return this.send('DELETE', path, undefined, headers);
  }

  /** @param headers a header set to '' is left out, also one this client would add by itself */
  async send(
    method: string,
    path: string,
    body?: unknown,
    headers: Record<string, string> = {},
  ): Promise<Reply> {
    const token = this.cookies.get('XSRF-TOKEN');
    const all: Record<string, string> = {
      ...(body !== undefined && { 'Content-Type': 'application/json' }),
      ...(method !== 'GET' && token !== undefined && { 'X-XSRF-TOKEN': token }),
      ...(this.cookies.size > 0 && { Cookie: this.cookieHeader }),
      ...headers,
    };
    const sent = Object.fromEntries(Object.entries(all).filter(([, value]) => value !== ''));
    const text = typeof body === 'string' ? body : JSON.stringify(body);
    const response = await fetch(this.url + path, {
      ...{ method, headers: sent, redirect: 'manual' },
      ...(body !== undefined && { body: text }),
    });
    this.#keep(response.headers.getSetCookie());
    return read(response);
  }

  /** All cookies as one header. */
  get cookieHeader(): string {
    return [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
  }

  #keep(setCookies: readonly string[]): void {
    for (const line of setCookies) {
      const [name, value] = (line.split(';')[0] ?? '').split(/=(.*)/s);
      if (name) this.cookies.set(name, value ?? '');
    }
  }
}

async function read(response: Response): Promise<Reply> {
  const text = await response.text();
  const isJson = (response.headers.get('Content-Type') ?? '').includes('json');
  const { status, headers } = response;
  return {
    ...{ status, headers, text, etag: headers.get('ETag') },
    body: isJson && text !== '' ? (JSON.parse(text) as unknown) : null,
  };
}
