import { afterEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { defineEndpoint } from '#shared/api/endpoint.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { addressOf, call, whenSignedOut } from './call.ts';
import { answerFor } from './sources.ts';

const endpoint = defineEndpoint({
  method: 'patch',
  path: '/api/shelves/:shelfId',
  summary: '',
  action: null,
  params: z.object({ shelfId: z.string() }),
  query: z.object({ q: z.string().optional(), limit: z.coerce.number().default(5) }),
  body: z.object({ name: z.string() }),
  reply: z.object({ name: z.string() }),
});

const problemOf = (status: number, code: string, more: object = {}) =>
  JSON.stringify({ type: 'about:blank', title: '', status, code, detail: 'In words.', requestId: '1', ...more });

const answer = (status: number, text: string) => {
  const fetched = vi.fn<typeof fetch>(() => Promise.resolve(new Response(text, { status })));
  vi.stubGlobal('fetch', fetched);
  return fetched;
};

const given = { params: { shelfId: 'a/b' }, query: { q: '455 kc' }, body: { name: 'upper' } };
const failure = () => call(endpoint, given).catch((error: unknown) => error);

afterEach(() => vi.unstubAllGlobals());

describe('asking an endpoint', () => {
  it('fills in the path and the query, and sends the body as JSON', async () => {
    const fetched = answer(200, '{"name":"upper","more":1}');
    await expect(call(endpoint, given)).resolves.toEqual({ name: 'upper' });
    expect(fetched.mock.calls[0]?.[0]).toBe('/api/shelves/a%2Fb?q=455+kc');
    expect(fetched.mock.calls[0]?.[1]).toMatchObject({ method: 'PATCH', body: '{"name":"upper"}' });
  });

  it('leaves out of an address what is not said', () => {
    expect(addressOf(endpoint, { params: { shelfId: 'a' }, query: {} })).toBe('/api/shelves/a');
  });

  it('turns problem details into an error with its code and issues', async () => {
    answer(400, problemOf(400, 'invalid-input', { issues: [{ path: 'name', message: 'Give a name.' }] }));
    const error = await failure();
    expect(error).toBeInstanceOf(AppError);
    expect(error).toMatchObject({
      code: 'invalid-input',
      message: 'In words.',
      details: { issues: [{ path: 'name', message: 'Give a name.' }] },
    });
  });

  it('tells that nobody is signed in any more', async () => {
    const told = vi.fn();
    const stop = whenSignedOut(told);
    answer(401, problemOf(401, 'not-signed-in'));
    await failure();
    stop();
    expect(told).toHaveBeenCalledOnce();
  });

  it('says so when the server cannot be reached or answers nonsense', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('network')));
    expect(await failure()).toMatchObject({ code: 'busy' });
    answer(502, '<html>');
    expect(await failure()).toMatchObject({ code: 'busy' });
    answer(200, '{"name":7}');
    expect(String(await failure())).toMatch(/Reload the page/);
  });
});

describe('the answer for an uploaded file', () => {
  const item = {
    id: 'refused',
    manualId: 'm',
    fileName: 'notes.txt',
    sha256: 'x',
    bytes: 3,
    mediaType: '',
    pageCount: null,
    createdAt: '2026-01-01T00:00:00.000Z',
  };

  it('is found in the problem details when every file was refused', () => {
    const items = [{ ...item, state: 'refused', problem: 'This is not a scan.' }];
    expect(answerFor(415, problemOf(415, 'wrong-kind', { items }))).toMatchObject({
      state: 'refused',
      problem: 'This is not a scan.',
    });
  });

  it('is an error when the request itself was refused', () => {
    expect(() => answerFor(403, problemOf(403, 'role-too-low'))).toThrow('In words.');
  });
});
