import request, { type Response } from 'supertest';
import type { TestApp } from '../../support/app.ts';

export interface Sent {
  readonly version?: number | null;
  readonly deed?: string;
  readonly body?: object;
  readonly headers?: Readonly<Record<string, string>>;
}

type Method = 'get' | 'post' | 'patch' | 'put' | 'delete';

/** Asks the server as somebody, on a page of ours. The clock goes on a little, so that nobody asks too often. */
export const talkTo =
  (server: TestApp) =>
  async (who: { readonly id: string }, method: Method, path: string, sent: Sent = {}): Promise<Response> => {
    server.clock.advance(3_000);
    const to = request(server.app);
    const req = to[method](`/api/${path}`).set({ ...(await server.as(who)), ...sent.headers });
    if (typeof sent.version === 'number') void req.set('If-Match', `"${sent.version}"`);
    if (sent.deed !== undefined) void req.set('Deed-Id', sent.deed);
    return method === 'get' ? req : req.send(sent.body ?? {});
  };
