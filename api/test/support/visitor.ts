import type { Server } from 'node:http';
import request, { type Response, type Test } from 'supertest';
import { expect } from 'vitest';

export interface Sending {
  body?: unknown;
  /** Sent as If-Match. */
  version?: number;
  /** Sent as Idempotency-Key. */
  key?: string;
  headers?: Record<string, string>;
}

/** A browser at our own pages: it keeps cookies and says where it comes from. */
export class Visitor {
  private readonly jar = new Map<string, string>();

  constructor(
    private readonly http: Server,
    private readonly origin: string,
  ) {}

  get cookies(): ReadonlyMap<string, string> {
    return this.jar;
  }

  setCookie(name: string, value: string): void {
    this.jar.set(name, value);
  }

  get(path: string, headers: Record<string, string> = {}): Promise<Response> {
    return this.send('GET', path, { headers });
  }

  post(path: string, body: unknown, more: Sending = {}): Promise<Response> {
    return this.send('POST', path, { body, ...more });
  }

  patch(path: string, version: number | undefined, body: unknown): Promise<Response> {
    return this.send('PATCH', path, { body, version });
  }

  delete(path: string, version?: number): Promise<Response> {
    return this.send('DELETE', path, { version });
  }

  async send(method: string, path: string, sending: Sending = {}): Promise<Response> {
    let call: Test = request(this.http)[method.toLowerCase() as 'get'](path);
    if (method !== 'GET') call = call.set('Origin', this.origin);
    if (this.jar.size > 0) {
      call = call.set(
        'Cookie',
        [...this.jar].map(([name, value]) => `${name}=${value}`).join('; '),
      );
    }
    if (sending.version !== undefined) call = call.set('If-Match', `"${sending.version}"`);
    if (sending.key !== undefined) call = call.set('Idempotency-Key', sending.key);
    for (const [name, value] of Object.entries(sending.headers ?? {})) call = call.set(name, value);
    const response = await (sending.body === undefined ? call : call.send(sending.body as object));
    this.keep(response);
    return response;
  }

  /** Sign in or fail the test. */
  async signIn(email: string, password: string): Promise<this> {
    const response = await this.post('/api/session', { email, password });
    expect(response.status, response.text).toBe(200);
    return this;
  }

  private keep(response: Response): void {
    const lines = (response.headers['set-cookie'] ?? []) as unknown as string[];
    for (const line of lines) {
      const [pair] = line.split(';');
      const [name, value] = pair.split('=');
      if (value === '') this.jar.delete(name);
      else this.jar.set(name, value);
    }
  }
}
