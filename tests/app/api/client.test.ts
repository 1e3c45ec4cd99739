import { afterEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import type { ApiError } from 'src/api/api-error';
import { apiEvents, command, request } from 'src/api/client';

const answer = (status: number, body: unknown) =>
  new Response(typeof body === 'string' ? body : JSON.stringify(body), { status });
const fetched = vi.fn<typeof fetch>();
vi.stubGlobal('fetch', fetched);

afterEach(() => {
  fetched.mockReset();
  apiEvents.notSignedIn = () => undefined;
});
const failureOf = (call: Promise<unknown>) =>
  call.then(
    () => expect.unreachable('the call went through'),
    (error: unknown) => error as ApiError,
  );

describe('asking the server', () => {
  it('reads the answer with its shape', async () => {
    fetched.mockResolvedValue(answer(200, { count: 3, more: 'left out' }));
    await expect(request(z.object({ count: z.number() }), 'GET', '/x')).resolves.toEqual({ count: 3 });
  });

  it('leaves out what is not asked for, and escapes the rest', async () => {
    fetched.mockResolvedValue(answer(200, {}));
    await request(z.object({}), 'GET', '/x', { query: { letter: 'A&b=c', before: undefined, n: 0 } });
    expect(fetched.mock.calls[0]?.[0]).toBe('/api/x?letter=A%26b%3Dc&n=0');
  });

  it('sends a body as JSON, from the same origin', async () => {
    fetched.mockResolvedValue(new Response(null, { status: 204 }));
    await command('PUT', '/x', { a: 1 });
    expect(fetched.mock.calls.at(-1)?.[1]).toMatchObject({
      method: 'PUT',
      body: '{"a":1}',
      credentials: 'same-origin',
      headers: { 'content-type': 'application/json' },
    });
  });

  it('refuses an answer of another shape', async () => {
    fetched.mockResolvedValue(answer(200, { count: 'three' }));
    const error = await failureOf(request(z.object({ count: z.number() }), 'GET', '/x'));
    expect(error.code).toBe('UNREADABLE');
  });
});

describe('when it does not work', () => {
  it('carries code, sentence and fields of the server', async () => {
    const error = { code: 'INVALID_INPUT', message: 'look at the fields', fields: { title: 'is missing' } };
    fetched.mockResolvedValue(answer(400, { error }));
    expect(await failureOf(command('POST', '/x', {}))).toMatchObject({ ...error, status: 400 });
  });

  it('says that there is no line', async () => {
    fetched.mockRejectedValue(new TypeError('Failed to fetch'));
    expect(await failureOf(command('GET', '/x'))).toMatchObject({ code: 'NO_LINE', status: 0 });
  });

  it('copes with a page of a proxy instead of JSON', async () => {
    fetched.mockResolvedValue(answer(502, '<h1>Bad gateway</h1>'));
    const error = await failureOf(command('GET', '/x'));
    expect(error.code).toBe('UNREADABLE');
    expect(error.message).toContain('502');
  });

  it('tells the application once when the session has ended', async () => {
    const told = vi.fn();
    apiEvents.notSignedIn = told;
    fetched.mockResolvedValue(answer(401, { error: { code: 'NOT_SIGNED_IN', message: 'sign in' } }));
    await failureOf(command('GET', '/x'));
    expect(told).toHaveBeenCalledOnce();
  });

  it('does not send somebody to sign in who only mistyped a passphrase', async () => {
    const told = vi.fn();
    apiEvents.notSignedIn = told;
    fetched.mockResolvedValue(answer(401, { error: { code: 'WRONG_PASSWORD', message: 'no' } }));
    await failureOf(command('POST', '/x', {}));
    expect(told).not.toHaveBeenCalled();
  });

  it('ends the sign of activity whatever happens', async () => {
    const begun = vi.fn();
    const ended = vi.fn();
    Object.assign(apiEvents, { begin: begun, end: ended });
    fetched.mockRejectedValueOnce(new TypeError('no'));
    await failureOf(command('GET', '/x'));
    fetched.mockResolvedValueOnce(new Response(null, { status: 204 }));
    await command('GET', '/x');
    expect([begun.mock.calls.length, ended.mock.calls.length]).toEqual([2, 2]);
  });
});
