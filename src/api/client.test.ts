import { afterEach, describe, expect, it, vi } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { addressOf, call } from './client.ts';
import { ApiProblem, isProblem } from './problem.ts';

const id = '3f0c1a52-6f0e-4c1d-9d0e-2f4f3a0b1c2d';
const me = {
  user: { id, name: 'Maren Okafor', email: 'coach@greywater-row.example', role: 'coach' },
  practice: { id, name: 'Greywater Row' },
  session: { id, expiresAt: '2026-03-04T08:00:00Z' },
  codeMissing: false,
};
const answering = (response: () => Response) => {
  const fetched = vi.fn<typeof fetch>(() => Promise.resolve(response()));
  vi.stubGlobal('fetch', fetched);
  return fetched;
};
const refusal = (body: object, status: number) => () => Response.json(body, { status });

afterEach(() => vi.unstubAllGlobals());

const problemOfCall = async (promise: Promise<unknown>): Promise<ApiProblem> => {
  const error: unknown = await promise.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (!(error instanceof ApiProblem)) throw new Error('no ApiProblem was thrown');
  return error;
};

describe('call', () => {
  it('fills path and query and sends the body as JSON', async () => {
    const fetched = answering(() => Response.json(me));
    await call(routes.signIn, { body: { email: 'a@b.example', password: 'p' } });
    const [address, init] = fetched.mock.calls[0] ?? [];
    expect(address).toBe('/api/sign-in');
    expect(init?.method).toBe('POST');
    expect(init?.body).toBe('{"email":"a@b.example","password":"p"}');
  });

  it('gives the answer typed, without what the contract does not know', async () => {
    answering(() => Response.json({ ...me, secret: 1 }));
    expect(await call(routes.me, {})).toEqual(me);
  });

  it('answers nothing for 204', async () => {
    answering(() => new Response(null, { status: 204 }));
    expect(await call(routes.signOut, {})).toBeUndefined();
  });

  it('throws the server’s no with its code, faults and request id', async () => {
    const faults = [{ path: 'body.email', message: 'Write an e-mail address.' }];
    answering(
      refusal({ code: 'invalid-input', detail: 'Two fields.', faults, requestId: 'r-7' }, 422),
    );
    const problem = await problemOfCall(
      call(routes.signIn, { body: { email: 'x@y.example', password: 'p' } }),
    );
    expect(problem).toMatchObject({
      code: 'invalid-input',
      message: 'Two fields.',
      status: 422,
      requestId: 'r-7',
      faults,
    });
  });

  it('tells an unreachable server from a server that says no', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')));
    const problem = await problemOfCall(call(routes.me, {}));
    expect(problem.code).toBe('offline');
    expect(problem.requestId).toBeNull();
  });

  it('passes an abort on as it is', async () => {
    const controller = new AbortController();
    controller.abort(new Error('left the page'));
    vi.stubGlobal('fetch', () => Promise.reject(new Error('left the page')));
    await expect(call(routes.me, { signal: controller.signal })).rejects.toThrow('left the page');
  });

  it('says so when the answer is not what the contract promises', async () => {
    answering(() => Response.json({ user: 'nobody' }));
    expect((await problemOfCall(call(routes.me, {}))).code).toBe('unreadable-answer');
    answering(() => new Response('<html>'));
    expect((await problemOfCall(call(routes.me, {}))).code).toBe('unreadable-answer');
  });

  it('takes a gateway’s page for a server that restarts, and any other page for the unexpected', async () => {
    answering(() => new Response('<h1>Bad gateway</h1>', { status: 502 }));
    expect((await problemOfCall(call(routes.me, {}))).code).toBe('shutting-down');
    answering(() => new Response('<h1>Oops</h1>', { status: 500 }));
    expect((await problemOfCall(call(routes.me, {}))).code).toBe('unexpected');
    answering(refusal({ code: 'made-up' }, 400));
    expect((await problemOfCall(call(routes.me, {}))).code).toBe('unexpected');
  });
});

describe('addressOf', () => {
  it('gives the address of a picture', () => {
    expect(addressOf(routes.clipFrame, { params: { id, index: 12 } })).toBe(
      `/api/clips/${id}/frames/12`,
    );
  });

  it('leaves out what is undefined and encodes the rest', () => {
    expect(addressOf(routes.listAthletes, { query: { q: 'Åsa & co', coach: undefined } })).toBe(
      '/api/athletes?q=%C3%85sa+%26+co',
    );
  });
});

describe('isProblem', () => {
  it('narrows by code', () => {
    const problem = new ApiProblem('not-found');
    expect(isProblem(problem, 'offline', 'not-found')).toBe(true);
    expect(isProblem(problem, 'offline')).toBe(false);
    expect(isProblem(new Error('x'))).toBe(false);
  });
});
