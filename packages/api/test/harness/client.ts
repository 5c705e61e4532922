import { randomUUID } from 'node:crypto';
import type { Server } from 'node:http';
import request, { type Response, type Test } from 'supertest';
import { cookieOf } from '../../src/platform/http/csrf.js';

type Options = { key?: string; version?: number; headers?: Record<string, string> };

/** A browser that talks to the API: keeps cookies, sends the CSRF token and the origin, makes idempotency keys. */
export class Client {
  private cookies = new Map<string, string>();

  constructor(
    /** A server of this process, or the address of one elsewhere. */
    private readonly server: Server | string,
    private readonly origin: string,
    /** Put before paths that do not start with `/api`. */
    readonly prefix = '/api',
  ) {}

  /** The same browser, with paths below another prefix. */
  below(prefix: string): Client {
    const client = new Client(this.server, this.origin, prefix);
    client.cookies = this.cookies;
    return client;
  }

  /** Another browser with the same cookies, as somebody who copied them would have. */
  copy(): Client {
    const client = new Client(this.server, this.origin, this.prefix);
    client.cookies = new Map(this.cookies);
    return client;
  }

  cookie(name: string): string | undefined {
    return this.cookies.get(name);
  }

  setCookie(name: string, value: string): void {
    this.cookies.set(name, value);
  }

  get(path: string, query: Record<string, string> = {}): Promise<Response> {
    return this.finish(request(this.server).get(this.address(path)).query(query));
  }

  post(path: string, body: object = {}, options: Options = {}): Promise<Response> {
    return this.send('post', path, body, { key: randomUUID(), ...options });
  }

  put(path: string, body: object, version: number, options: Options = {}): Promise<Response> {
    return this.send('put', path, body, { version, ...options });
  }

  patch(path: string, body: object, version: number, options: Options = {}): Promise<Response> {
    return this.send('patch', path, body, { version, ...options });
  }

  delete(path: string, version?: number, options: Options = {}): Promise<Response> {
    return this.send('delete', path, undefined, {
      ...(version === undefined ? {} : { version }),
      ...options,
    });
  }

  async upload(
    path: string,
    name: string,
    bytes: Buffer,
    fields: Record<string, string> = {},
  ): Promise<Response> {
    const token = await this.csrfToken();
    const call = request(this.server)
      .post(this.address(path))
      .set({ Origin: this.origin, 'X-CSRF-Token': token, 'Idempotency-Key': randomUUID() });
    for (const [field, value] of Object.entries(fields)) void call.field(field, value);
    return this.finish(call.attach('file', bytes, name));
  }

  async send(
    method: 'post' | 'put' | 'patch' | 'delete',
    path: string,
    body: unknown,
    { key, version, headers = {} }: Options = {},
  ): Promise<Response> {
    const call = request(this.server)
      [method](this.address(path))
      .set({
        Origin: this.origin,
        'X-CSRF-Token': await this.csrfToken(),
        ...(key === undefined ? {} : { 'Idempotency-Key': key }),
        ...(version === undefined ? {} : { 'If-Match': `"${version}"` }),
        ...headers,
      });
    return this.finish(body === undefined ? call : call.send(body as object));
  }

  /** What this browser sends along, for requests that a test puts together by hand. */
  async credentials(): Promise<{ cookie: string; token: string }> {
    return { token: await this.csrfToken(), cookie: this.cookieHeader() };
  }

  private cookieHeader(): string {
    return [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
  }

  private async csrfToken(): Promise<string> {
    if (!this.cookies.has('bookmatch-csrf')) await this.get('/api/openapi.json');
    return decodeURIComponent(this.cookies.get('bookmatch-csrf') ?? '');
  }

  private address(path: string): string {
    return path.startsWith('/api') ? path : this.prefix + path;
  }

  private async finish(call: Test): Promise<Response> {
    const cookie = this.cookieHeader();
    const response = await (cookie === '' ? call : call.set('Cookie', cookie));
    const set = (response.headers['set-cookie'] ?? []) as unknown as string[];
    for (const line of set) this.remember(line);
    return response;
  }

  private remember(line: string): void {
    const name = line.slice(0, line.indexOf('='));
    const value = cookieOf(line, name) ?? '';
    if (/expires=Thu, 01 Jan 1970/i.test(line)) this.cookies.delete(name);
    else this.cookies.set(name, value);
  }
}
