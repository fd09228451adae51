import { spawn } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { Agent, get } from 'node:http';
import { setTimeout as wait } from 'node:timers/promises';
import express from 'express';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import request from 'supertest';
import { anyFreePort } from '../../api/local/ports.mjs';
import { PROJECT_ROOT } from '../../api/platform/project-root.ts';
import { healthRoutes } from '../../api/http/health.ts';
import { orderlyEnd, type CleanUp } from '../../api/http/shutdown.ts';
import { openDatabase } from '../../api/platform/database.ts';
import { openStorage } from '../../api/platform/storage.ts';
import { buildApp, testVariables, type TestApp } from '../support/app.ts';
import { bareDatabase } from '../support/database.ts';

describe('health', () => {
  let house: TestApp;
  beforeAll(async () => {
    house = await buildApp();
  });
  afterAll(() => house.close());

  const ready = (deps: Partial<TestApp['deps']>, accepting = true) =>
    request(express().use(healthRoutes({ ...house.deps, ...deps }, { accepting }))).get('/health/ready');

  test('is ready with database and storage, and tells strangers nothing else', async () => {
    const res = await request(house.app).get('/health/ready');
    expect([res.status, res.body]).toEqual([200, { status: 'ready' }]);
  });

  test('is live without touching anything', async () => {
    const db = openDatabase({ url: 'postgres://x:y@127.0.0.1:9/none', pool: 2 });
    const res = await request(express().use(healthRoutes({ ...house.deps, db }, { accepting: true }))).get(
      '/health/live',
    );
    expect([res.status, res.body]).toEqual([200, { status: 'live' }]);
    await db.destroy();
  });

  test('is not ready without a database, a store, its tables, or when it is ending', async () => {
    const gone = openDatabase({ url: 'postgres://x:y@127.0.0.1:9/none', pool: 2 });
    const bare = await bareDatabase();
    const nowhere = openStorage({ ...house.env.s3, endpoint: 'http://127.0.0.1:9' });
    const calls = [ready({ db: gone }), ready({ db: bare.db }), ready({ storage: nowhere }), ready({}, false)];
    for (const res of await Promise.all(calls)) {
      expect([res.status, res.body]).toEqual([503, { status: 'not ready' }]);
    }
    await gone.destroy();
    await bare.drop();
    nowhere.close();
  });

  test('answers in time when the store accepts a call and then says nothing', async () => {
    const silent = createServer(() => undefined);
    await new Promise<void>((resolve) => silent.listen(0, '127.0.0.1', resolve));
    const { port } = silent.address() as AddressInfo;
    const storage = openStorage({ ...house.env.s3, endpoint: `http://127.0.0.1:${port}` });
    const begun = Date.now();
    expect((await ready({ storage })).status).toBe(503);
    expect(Date.now() - begun).toBeLessThan(5 * 2_000);
    storage.close();
    silent.closeAllConnections();
    silent.close();
  });
});

describe('an orderly end', () => {
  let house: TestApp;
  beforeAll(async () => {
    house = await buildApp();
  });
  afterAll(() => house.close());

  async function open(options: { drainMs?: number; cleanUps?: CleanUp[] } = {}) {
    const app = express();
    const readiness = { accepting: true };
    app.get('/slow', (_req, res) => {
      setTimeout(() => res.json({ slow: true }), 1_000);
    });
    app.get('/stuck', () => undefined);
    app.use(healthRoutes(house.deps, readiness));
    const server = createServer(app);
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    const { port } = server.address() as AddressInfo;
    const codes: number[] = [];
    const end = orderlyEnd({
      server,
      readiness,
      drainMs: options.drainMs ?? 0,
      cleanUps: options.cleanUps ?? [],
      log: house.deps.log,
      exit: (code) => void codes.push(code),
    });
    return { end, codes, at: (path: string) => `http://127.0.0.1:${port}${path}` };
  }

  /** The status of an answer over a connection that is kept open, or the code of the failure. */
  const ask = (url: string, agent?: Agent) =>
    new Promise<number | string>((resolve) => {
      get(url, { ...(agent && { agent }) }, (res) => {
        res.resume();
        resolve(res.statusCode ?? 0);
      }).on('error', (err: NodeJS.ErrnoException) => resolve(err.code ?? err.message));
    });

  test('is not ready at once, answers what is under way, and takes nothing new', async () => {
    const { end, codes, at } = await open({ drainMs: 300 });
    const slow = ask(at('/slow'));
    await wait(50);
    const ended = end();
    expect(await ask(at('/health/ready'))).toBe(503);
    await wait(400);
    expect(await ask(at('/health/live'))).toBe('ECONNREFUSED');
    expect(await slow).toBe(200);
    await ended;
    expect(codes).toEqual([0]);
  });

  test('closes connections that are only kept open', async () => {
    const { end, codes, at } = await open();
    const agent = new Agent({ keepAlive: true });
    expect(await ask(at('/health/live'), agent)).toBe(200);
    await end();
    expect(codes).toEqual([0]);
    agent.destroy();
  });

  test('cuts a request that is stuck', async () => {
    const { end, codes, at } = await open();
    const stuck = ask(at('/stuck'));
    await wait(50);
    await end();
    expect(await stuck).toBe('ECONNRESET');
    expect(codes).toEqual([0]);
  });

  test('does every clean-up though one fails, tells it by its code, and is not disturbed by a second signal', async () => {
    const done: string[] = [];
    const cleanUps: CleanUp[] = [
      { name: 'first', run: () => Promise.resolve(void done.push('first')) },
      { name: 'broken', run: () => Promise.reject(new Error('broken')) },
      { name: 'last', run: () => Promise.resolve(void done.push('last')) },
    ];
    const { end, codes } = await open({ cleanUps });
    await Promise.all([end(), end()]);
    expect(done).toEqual(['first', 'last']);
    expect(codes).toEqual([1]);
  });
});

describe('the server as a process', () => {
  /** Starts it from the sources and gathers what it prints. */
  function start(variables: Record<string, string>) {
    const child = spawn(process.execPath, ['--import', 'tsx', 'api/server.ts'], {
      cwd: PROJECT_ROOT,
      env: { ...process.env, ...variables },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    const printed = { text: '' };
    for (const stream of [child.stdout, child.stderr]) {
      stream.setEncoding('utf8').on('data', (text: string) => (printed.text += text));
    }
    const ended = new Promise<number | null>((resolve) => child.once('exit', resolve));
    return { child, printed, ended };
  }

  test('listens, says so in JSON, and ends in order on SIGTERM', async () => {
    const house = await buildApp();
    const port = await anyFreePort();
    const variables = testVariables(house.url, `t-${randomUUID()}`, { ROUNDELAY_PORT: String(port) });
    const { child, printed, ended } = start(variables);
    await expect.poll(() => printed.text, { timeout: 15_000 }).toContain('"msg":"listening"');
    expect((await fetch(`http://127.0.0.1:${port}/health/ready`)).status).toBe(200);
    child.kill('SIGTERM');
    child.kill('SIGTERM');
    expect(await ended).toBe(0);
    for (const line of printed.text.trim().split('\n')) expect(() => JSON.parse(line) as unknown).not.toThrow();
    await house.close();
  });

  test('does not start in production without its secrets, and says which', async () => {
    const { printed, ended } = start({ NODE_ENV: 'production' });
    expect(await ended).toBe(1);
    expect(printed.text).toContain('ROUNDELAY_SECRET: must be set in production');
    expect(printed.text).not.toContain('    at ');
  });

  test('does not start on a database that a later version has changed', async () => {
    const house = await buildApp();
    await house.db('knex_migrations').insert({ name: '29991231000000_later', batch: 9, migration_time: new Date() });
    const { printed, ended } = start(testVariables(house.url, 'none'));
    expect(await ended).toBe(1);
    expect(printed.text).toMatch(
      /the database is at 29991231000000_later, this version of Roundelay knows only up to \d{14}_/,
    );
    await house.close();
  });
});
