import type { Problem, SessionView } from '@quarterpoise/dto';

/** What a body holds is for each test to say by its expectations; `any` keeps those readable. */
// oxlint-disable-next-line typescript/no-explicit-any -- see above
type Body = any;

export interface Answer<T = Body> {
  readonly status: number;
  readonly headers: Headers;
  readonly body: T;
}

/** A browser as far as the API can tell: keeps the cookie, sends the token with writes. */
export class TestClient {
  cookie: string | null = null;
  csrfToken: string | null = null;

  constructor(
    private readonly url: string,
    private readonly ip: string,
  ) {}

  /** A request below /api/v1; null for a header leaves out one that would be sent by itself. */
  async send(
    method: string,
    path: string,
    init: {
      body?: NonNullable<RequestInit['body']>;
      headers?: Record<string, string | null>;
      signal?: AbortSignal;
    } = {},
  ): Promise<Response> {
    const headers: Record<string, string | null> = {
      'x-forwarded-for': this.ip,
      cookie: this.cookie,
      'x-csrf-token': method === 'GET' ? null : this.csrfToken,
      ...init.headers,
    };
    const response = await fetch(`${this.url}/api/v1${path}`, {
      method,
      headers: Object.entries(headers).flatMap(([name, value]) =>
        value === null ? [] : [[name, value] as [string, string]],
      ),
      ...(init.body !== undefined && { body: init.body, duplex: 'half' }),
      ...(init.signal && { signal: init.signal }),
    } as RequestInit);
    for (const line of response.headers.getSetCookie()) {
      const [pair = ''] = line.split(';', 1);
      this.cookie = pair.endsWith('=') ? null : pair;
    }
    return response;
  }

  async get<T = Body>(path: string, headers: Record<string, string | null> = {}): Promise<Answer<T>> {
    return this.read(await this.send('GET', path, { headers }));
  }

  async post<T = Body>(path: string, body?: unknown, headers: Record<string, string | null> = {}): Promise<Answer<T>> {
    return this.read(
      await this.send('POST', path, {
        ...(body !== undefined && { body: JSON.stringify(body) }),
        headers: { ...(body !== undefined && { 'content-type': 'application/json' }), ...headers },
      }),
    );
  }

  /** Sends a file the way the upload page does: fields first. */
  async upload<T = Body>(
    path: string,
    fields: Record<string, string>,
    file: { name: string; content: string | Blob },
    headers: Record<string, string | null> = {},
  ): Promise<Answer<T>> {
    const form = new FormData();
    for (const [name, value] of Object.entries(fields)) form.append(name, value);
    form.append('file', file.content instanceof Blob ? file.content : new Blob([file.content]), file.name);
    return this.read(await this.send('POST', path, { body: form, headers }));
  }

  private async read<T>(response: Response): Promise<Answer<T>> {
    const text = await response.text();
    const isJson = response.headers.get('content-type')?.includes('json') ?? false;
    const body = (isJson && text !== '' ? JSON.parse(text) : text) as T;
    const token = (body as Partial<SessionView>)?.csrfToken;
    if (typeof token === 'string') this.csrfToken = token;
    return { status: response.status, headers: response.headers, body };
  }
}

/** What every refusal looks like, for `toMatchObject`. */
export const problemWith = (code: Problem['code']) => ({ type: `/problems/${code}`, code });
