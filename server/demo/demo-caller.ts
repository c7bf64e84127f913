const lookAgainMs = 400;

/** Calls the server's own routes over HTTP as one signed-in person. */
export class DemoCaller {
  private constructor(
    private readonly url: string,
    private readonly cookie: string,
  ) {}

  static async signIn(url: string, email: string, password: string): Promise<DemoCaller> {
    const response = await fetch(`${url}/api/auth/sign-in/email`, {
      method: 'POST',
      headers: { 'content-type': 'application/json', origin: url },
      body: JSON.stringify({ email, password }),
    });
    if (!response.ok) throw new Error(`${email} could not sign in: ${response.status} ${await response.text()}`);
    return new DemoCaller(
      url,
      response.headers
        .getSetCookie()
        .map((cookie) => cookie.split(';')[0])
        .join('; '),
    );
  }

  get = <T>(path: string): Promise<T> => this.call(path, { method: 'GET' });

  send = <T>(method: 'POST' | 'PUT' | 'PATCH', path: string, body: unknown): Promise<T> =>
    this.call(path, { method, headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) });

  upload(path: string, fileName: string, bytes: Buffer): Promise<unknown> {
    const form = new FormData();
    form.append('files', new Blob([new Uint8Array(bytes)]), fileName);
    return this.call(path, { method: 'POST', body: form });
  }

  /** Asks again until the answer is as wanted. */
  async waitFor<T>(path: string, isWanted: (answer: T) => boolean): Promise<T> {
    for (;;) {
      const answer = await this.get<T>(path);
      if (isWanted(answer)) return answer;
      await new Promise((resolve) => setTimeout(resolve, lookAgainMs).unref());
    }
  }

  private async call<T>(path: string, init: RequestInit & { headers?: Record<string, string> }): Promise<T> {
    const response = await fetch(this.url + path, { ...init, headers: { ...init.headers, cookie: this.cookie } });
    if (!response.ok) throw new Error(`${init.method ?? 'GET'} ${path}: ${response.status} ${await response.text()}`);
    return (await response.json()) as T;
  }
}
