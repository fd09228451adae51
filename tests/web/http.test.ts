import * as z from 'zod';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { ProblemError, send, UnreachableError } from '../../web/lib/http.ts';

const answer = (status: number, body: unknown, type = 'application/json') =>
  vi.fn(() =>
    Promise.resolve(
      new Response(status === 204 ? null : JSON.stringify(body), { status, headers: { 'Content-Type': type } }),
    ),
  );

afterEach(() => vi.unstubAllGlobals());

describe('asking the server', () => {
  test('a write says which version it was made from', async () => {
    const fetch = answer(200, { version: 5 });
    vi.stubGlobal('fetch', fetch);
    expect(
      await send(z.object({ version: z.int() }), '/api/lines/1', {
        method: 'PATCH',
        version: 4,
        body: { text: 'inc' },
      }),
    ).toEqual({ version: 5 });
    const [, init] = fetch.mock.calls[0] as unknown as [string, RequestInit];
    expect(init.headers).toMatchObject({ 'If-Match': '"4"', 'Content-Type': 'application/json' });
    expect(init.body).toBe('{"text":"inc"}');
  });

  test('a refusal keeps the server’s own words and what it adds to them', async () => {
    vi.stubGlobal(
      'fetch',
      answer(412, { type: '/problems/stale-version', title: 'Someone saved before you', status: 412, row: { id: 1 } }),
    );
    const refused = await send(z.unknown(), '/api/x').catch((error: unknown) => error);
    expect(refused).toBeInstanceOf(ProblemError);
    expect(refused).toMatchObject({ kind: 'stale-version', problem: { status: 412, row: { id: 1 } } });
  });

  test('a refusal that is no problem document is still a refusal', async () => {
    vi.stubGlobal(
      'fetch',
      vi.fn(() => Promise.resolve(new Response('<html>', { status: 502 }))),
    );
    await expect(send(z.unknown(), '/api/x')).rejects.toMatchObject({ problem: { status: 502 } });
  });

  test('no answer is told apart from a refusal', async () => {
    vi.stubGlobal(
      'fetch',
      vi.fn(() => Promise.reject(new TypeError('failed'))),
    );
    await expect(send(z.unknown(), '/api/x')).rejects.toBeInstanceOf(UnreachableError);
  });

  test('an answer that is not what the contract says is an error', async () => {
    vi.stubGlobal('fetch', answer(200, { version: 'five' }));
    await expect(send(z.object({ version: z.int() }), '/api/x')).rejects.toBeInstanceOf(z.ZodError);
  });

  test('an empty answer is read as nothing', async () => {
    vi.stubGlobal('fetch', answer(204, null));
    await expect(send(z.undefined(), '/api/x', { method: 'DELETE' })).resolves.toBeUndefined();
  });
});
