import { randomUUID } from 'node:crypto';
import { afterAll, afterEach, beforeAll, describe, expect, test, vi } from 'vitest';
import type { LiveEvent } from '#contract/live';
import { createApp } from '../../../api/app.ts';
import { openNotices, type Notices } from '../../../api/platform/notices.ts';
import { buildApp, type TestApp } from '../../support/app.ts';
import { listen, type Listening } from '../../support/browser.ts';
import { addMember, buildHouse, buildPattern, buildPerson, type Household } from '../../support/builders.ts';
import { listenTo, type Stream } from '../../support/event-source.ts';
import { talkTo } from './talk.ts';

let server: TestApp;
let house: Household;
/** Two processes on one database, as far as notices go: each listens for itself. */
let first: Listening;
let second: Listening;
let secondNotices: Notices;
const open: Stream[] = [];

beforeAll(async () => {
  server = await buildApp();
  house = await buildHouse(server.db);
  secondNotices = openNotices(server.env.database, server.deps.log);
  first = await listen(server.app);
  second = await listen(createApp({ ...server.deps, notices: secondNotices }));
});
afterEach(() => {
  vi.useRealTimers();
  for (const stream of open.splice(0)) stream.close();
});
afterAll(async () => {
  await secondNotices.close();
  await Promise.all([first.close(), second.close()]);
  await server.close();
});

interface Who {
  readonly id: string;
}
const call = (...args: Parameters<ReturnType<typeof talkTo>>) => talkTo(server)(...args);
const aPattern = async () => (await buildPattern(server.db, { studio_id: house.studio.id })).id;

async function sit(who: Who, pattern: string, at: Listening, tab: string = randomUUID()): Promise<Stream> {
  const stream = await listenTo(`${at.url}/api/patterns/${pattern}/events?tab=${tab}`, await server.as(who));
  open.push(stream);
  return stream;
}
const isSaved = (event: LiveEvent) => event.kind === 'saved';
const seatOf = (who: Who) => (event: LiveEvent) => event.kind === 'seat' && event.seat.person.id === who.id;

describe('an open bench', () => {
  test('hears what somebody saves through another process, with its number', async () => {
    const pattern = await aPattern();
    const stream = await sit(house.creator, pattern, second);
    await stream.until<LiveEvent>(({ kind }) => kind === 'look');
    await call(house.editor, 'post', `patterns/${pattern}/pieces`, { body: { name: 'Body' } });
    const saved = await stream.until<LiveEvent>(isSaved);
    const { lastChange } = (await call(house.creator, 'get', `patterns/${pattern}`)).body as { lastChange: number };
    expect(saved).toEqual({ kind: 'saved', change: lastChange });
  });

  test('hears nothing of other patterns, and nothing that was not saved in the end', async () => {
    const pattern = await aPattern();
    const stream = await sit(house.creator, pattern, first);
    await stream.until<LiveEvent>(({ kind }) => kind === 'look');
    await call(house.editor, 'post', `patterns/${await aPattern()}/pieces`, { body: { name: 'Body' } });
    await call(house.editor, 'post', `patterns/${pattern}/pieces`, { body: { name: 7 } });
    await call(house.editor, 'post', `patterns/${pattern}/pieces`, { body: { name: 'Body' } });
    await stream.until<LiveEvent>(isSaved);
    expect(stream.heard.filter((event) => isSaved(event as LiveEvent))).toHaveLength(1);
  });

  test('shows who else is there and at which line, whoever came first and through whichever process', async () => {
    const pattern = await aPattern();
    const [mine, theirs, line] = [randomUUID(), randomUUID(), randomUUID()];
    const creator = await sit(house.creator, pattern, first, mine);
    const editor = await sit(house.editor, pattern, second, theirs);
    await creator.until<LiveEvent>(seatOf(house.editor));
    await editor.until<LiveEvent>(seatOf(house.creator));
    const moved = await call(house.editor, 'put', `patterns/${pattern}/seats/${theirs}`, { body: { lineId: line } });
    expect(moved.status).toBe(204);
    const seat = await creator.until<LiveEvent>((event) => event.kind === 'seat' && event.seat.lineId === line);
    expect(seat).toMatchObject({ seat: { tabId: theirs, person: { id: house.editor.id, name: house.editor.name } } });
    // Whoever comes later is told where the others are by now.
    const owner = await sit(house.owner, pattern, first);
    await owner.until<LiveEvent>((event) => event.kind === 'seat' && event.seat.lineId === line);
    editor.close();
    await creator.until<LiveEvent>((event) => event.kind === 'left' && event.tabId === theirs);
    expect(creator.heard.filter((event) => seatOf(house.creator)(event as LiveEvent))).toEqual([]);
  });

  test('is told to look for itself when the connection that listens was lost', async () => {
    const pattern = await aPattern();
    const stream = await sit(house.creator, pattern, second);
    await stream.until<LiveEvent>(({ kind }) => kind === 'look');
    await server.db.raw(
      `select pg_terminate_backend(pid) from pg_stat_activity
        where application_name = 'roundelay notices' and datname = current_database()`,
    );
    const looks = () => stream.heard.filter((event) => (event as LiveEvent).kind === 'look').length;
    await vi.waitUntil(() => looks() === 2, { timeout: 5_000 });
    await call(house.editor, 'post', `patterns/${pattern}/pieces`, { body: { name: 'Body' } });
    await stream.until<LiveEvent>(isSaved);
  });

  test('is closed to somebody who was removed, or whose session ended, by the next beat', async () => {
    const pattern = await aPattern();
    const leaving = await buildPerson(server.db);
    await addMember(server.db, house.studio.id, leaving.id, 'editor');
    vi.useFakeTimers({ toFake: ['setInterval', 'clearInterval'] });
    const removed = await sit(leaving, pattern, first);
    const signedOut = await sit(house.owner, pattern, first);
    const staying = await sit(house.creator, pattern, first);
    vi.advanceTimersByTime(15_000);
    await new Promise((resolve) => setTimeout(resolve, 300));
    expect([removed.ended, signedOut.ended, staying.ended]).toEqual([false, false, false]);

    await server.db('members').where({ person_id: leaving.id }).update({ left_at: server.clock.now() });
    await server.db('sessions').where({ person_id: house.owner.id }).delete();
    vi.advanceTimersByTime(15_000);
    await new Promise((resolve) => setTimeout(resolve, 500));
    expect([removed.ended, signedOut.ended, staying.ended]).toEqual([true, true, false]);
    expect((await sit(leaving, pattern, first)).status).toBe(404);
  });

  test('gives up its streams at once when the process ends', async () => {
    const pattern = await aPattern();
    const notices = openNotices(server.env.database, server.deps.log);
    const third = await listen(createApp({ ...server.deps, notices }));
    const stream = await sit(house.creator, pattern, third);
    await stream.until<LiveEvent>(({ kind }) => kind === 'look');
    await notices.close();
    await vi.waitUntil(() => stream.ended, { timeout: 2_000 });
    await third.close();
  });

  test('holds a dozen streams for one person, and refuses more with a sentence', async () => {
    const pattern = await aPattern();
    const statuses = [];
    for (let n = 0; n < 13; n += 1) statuses.push((await sit(house.owner, pattern, first)).status);
    expect(statuses).toEqual([...Array<number>(12).fill(200), 429]);
  });
});
