import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { EMPTY, of, Subject } from 'rxjs';
import { ApiClient } from './api-client';
import { ApiProblem } from './api-problem';
import { SESSION_RENEWAL, type SessionRenewal } from './session-renewal';

const KEY = 'Idempotency-Key';
const signedOut = {
  type: 'about:blank',
  title: 'Sign in first',
  status: 401,
  code: 'not-signed-in',
  detail: 'Sign in first.',
};

function setUp(renewal: SessionRenewal = () => EMPTY) {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      { provide: SESSION_RENEWAL, useValue: renewal },
    ],
  });
  return { api: TestBed.inject(ApiClient), http: TestBed.inject(HttpTestingController) };
}

function problemOf(error: unknown) {
  if (!(error instanceof ApiProblem)) throw new Error('not a problem');
  return error.problem;
}

describe('ApiClient', () => {
  it('leaves absent filters out of the address', () => {
    const { api, http } = setUp();
    api.get('/api/x', { query: { q: 'wren', kind: '', after: undefined, limit: 20 } }).subscribe();
    expect(http.expectOne('/api/x?q=wren&limit=20').request.method).toBe('GET');
  });

  it('sends the version that a change was made from', () => {
    const { api, http } = setUp();
    api.patch('/api/x', {}, { version: 3 }).subscribe();
    expect(http.expectOne('/api/x').request.headers.get('If-Match')).toBe('"3"');
  });

  it('checks the shape of an answer', () => {
    const { api, http } = setUp();
    const answer = { parse: () => 'checked' };
    const seen: string[] = [];
    api.get('/api/x', { answer }).subscribe((value) => seen.push(value));
    http.expectOne('/api/x').flush({});
    expect(seen).toEqual(['checked']);
  });

  it('hands over the problem document of a refusal', () => {
    const { api, http } = setUp();
    const problem = {
      ...signedOut,
      status: 422,
      code: 'invalid-input',
      fields: [{ path: 'a', message: 'b' }],
    };
    let error: unknown;
    api.get('/api/x').subscribe({ error: (thrown: unknown) => (error = thrown) });
    http.expectOne('/api/x').flush(problem, { status: 422, statusText: '' });
    expect(problemOf(error)).toEqual(problem);
  });

  it('tells a lost network from a fault', () => {
    const { api, http } = setUp();
    const codes: string[] = [];
    const collect = { error: (thrown: unknown) => codes.push(problemOf(thrown).code) };
    api.get('/api/x').subscribe(collect);
    http.expectOne('/api/x').error(new ProgressEvent('error'));
    api.get('/api/x').subscribe(collect);
    http.expectOne('/api/x').flush('<html>', { status: 502, statusText: '' });
    expect(codes).toEqual(['no-connection', 'fault']);
  });
});

describe('the idempotency key of a post', () => {
  const post = (api: ApiClient, body: object) =>
    api.post('/api/x', body).subscribe({ error: () => undefined });
  const next = (http: HttpTestingController) => http.expectOne('/api/x');

  it('is its own for each action once the one before is answered', () => {
    const { api, http } = setUp();
    post(api, { a: 1 });
    const first = next(http);
    first.flush({});
    post(api, { a: 1 });
    expect(next(http).request.headers.get(KEY)).not.toBe(first.request.headers.get(KEY));
  });

  it('stays the same for a repeat after the network was lost or the server failed', () => {
    const { api, http } = setUp();
    post(api, { a: 1 });
    const lost = next(http);
    lost.error(new ProgressEvent('error'));
    post(api, { a: 1 });
    const failed = next(http);
    failed.flush('', { status: 503, statusText: '' });
    post(api, { a: 1 });
    const keys = [lost, failed, next(http)].map(({ request }) => request.headers.get(KEY));
    expect(new Set(keys).size).toBe(1);
    expect(keys[0]?.length).toBeGreaterThanOrEqual(8);
  });

  it('is another one when what is posted differs', () => {
    const { api, http } = setUp();
    post(api, { a: 1 });
    const lost = next(http);
    lost.error(new ProgressEvent('error'));
    post(api, { a: 2 });
    expect(next(http).request.headers.get(KEY)).not.toBe(lost.request.headers.get(KEY));
  });

  it('is another one after a refusal, which did nothing', () => {
    const { api, http } = setUp();
    post(api, { a: 1 });
    const refused = next(http);
    refused.flush({ ...signedOut, status: 422, code: 'invalid-input' }, { status: 422, statusText: '' });
    post(api, { a: 1 });
    expect(next(http).request.headers.get(KEY)).not.toBe(refused.request.headers.get(KEY));
  });
});

describe('an anti-forgery cookie that is gone', () => {
  it('is brought by the refusal, so the same request goes once more and only once', () => {
    const { api, http } = setUp();
    const codes: string[] = [];
    api.post('/api/x', {}).subscribe({ error: (thrown: unknown) => codes.push(problemOf(thrown).code) });
    const crossSite = { ...signedOut, status: 403, code: 'cross-site' };
    const first = http.expectOne('/api/x');
    first.flush(crossSite, { status: 403, statusText: '' });
    const second = http.expectOne('/api/x');
    expect(second.request.headers.get(KEY)).toBe(first.request.headers.get(KEY));
    second.flush(crossSite, { status: 403, statusText: '' });
    http.expectNone('/api/x');
    expect(codes).toEqual(['cross-site']);
  });
});

describe('a session that ended', () => {
  it('is renewed in place, and the request goes on with the same key', () => {
    const renewed = new Subject<void>();
    const { api, http } = setUp(() => renewed);
    const seen: unknown[] = [];
    api.post('/api/x', { a: 1 }).subscribe((value) => seen.push(value));
    const first = http.expectOne('/api/x');
    first.flush(signedOut, { status: 401, statusText: '' });
    http.expectNone('/api/x');
    renewed.next();
    const second = http.expectOne('/api/x');
    expect(second.request.headers.get(KEY)).toBe(first.request.headers.get(KEY));
    second.flush({ done: true });
    expect(seen).toEqual([{ done: true }]);
  });

  it('fails the request when the person does not sign in again, or where nobody needs to be signed in', () => {
    const asked = jest.fn(() => EMPTY);
    const { api, http } = setUp(asked);
    const codes: string[] = [];
    const collect = { error: (thrown: unknown) => codes.push(problemOf(thrown).code) };
    api.get('/api/x').subscribe(collect);
    http.expectOne('/api/x').flush(signedOut, { status: 401, statusText: '' });
    api.get('/api/x', { whenSignedOut: 'fail' }).subscribe(collect);
    http.expectOne('/api/x').flush(signedOut, { status: 401, statusText: '' });
    expect(codes).toEqual(['not-signed-in', 'not-signed-in']);
    expect(asked).toHaveBeenCalledTimes(1);
  });

  it('does not ask for a wrong password at the door', () => {
    const asked = jest.fn(() => of(undefined));
    const { api, http } = setUp(asked);
    api.post('/api/account/sign-in', {}).subscribe({ error: () => undefined });
    const wrong = { ...signedOut, code: 'wrong-credentials' };
    http.expectOne('/api/account/sign-in').flush(wrong, { status: 401, statusText: '' });
    expect(asked).not.toHaveBeenCalled();
  });
});
