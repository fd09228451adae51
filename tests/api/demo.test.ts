import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { PROJECT_ROOT } from '../../api/platform/project-root.ts';
import { HARVEST_MOUSE } from '../../seeds/film/harvest-mouse.ts';
import { KETTLE_HOLDER } from '../../seeds/film/kettle-holder.ts';
import { seed, SIGN_INS } from '../../seeds/index.ts';
import { HARVEST_MOUSE as MOUSE } from '../../seeds/patterns/harvest-mouse.ts';
import { buildApp, FROM_OUR_PAGE, type TestApp } from '../support/app.ts';

interface ShelfPattern {
  title: string;
  state: string;
  edition: number | null;
  lines: number;
  needs: { verdict: string; label: string }[];
}

describe('the demo', () => {
  let house: TestApp;
  let ismay: { Cookie: string };

  beforeAll(async () => {
    house = await buildApp();
    await seed(house.deps);
    const [person] = await house.db('people').where({ email: SIGN_INS[0]!.email }).select<{ id: string }[]>('id');
    ismay = await house.as(person!);
  }, 180_000);
  afterAll(() => house.close());

  const get = (url: string) => request(house.app).get(`/api${url}`).set(ismay);

  async function shelf(part = 'shelf'): Promise<ShelfPattern[]> {
    const studio = (await get('/studios')).body as { id: string }[];
    const res = await get(`/patterns?studioId=${studio[0]!.id}&part=${part}`);
    return (res.body as { patterns: ShelfPattern[] }).patterns;
  }

  async function rowCounts(): Promise<Record<string, number>> {
    const { rows } = await house.db.raw<{ rows: { name: string }[] }>(
      `select relname as name from pg_class where relnamespace = 'public'::regnamespace and relkind = 'r' order by 1`,
    );
    const counts: Record<string, number> = {};
    for (const { name } of rows) {
      counts[name] = Number((await house.db(name).count<{ n: string }[]>('* as n'))[0]!.n);
    }
    return counts;
  }

  test('put in twice, changes nothing', { timeout: 60_000 }, async () => {
    const before = await rowCounts();
    await seed(house.deps);
    expect(await rowCounts()).toEqual(before);
  });

  test('everybody told of can sign in', async () => {
    for (const { email, password, name } of SIGN_INS) {
      const res = await request(house.app).post('/api/session').set(FROM_OUR_PAGE).send({ email, password });
      expect([res.status, (res.body as { name: string }).name]).toEqual([200, name]);
    }
  });

  test('the shelf holds every state, and the mouse waits with one of each verdict to look at', async () => {
    const patterns = await shelf();
    const stateOf = Object.fromEntries(patterns.map(({ title, state, edition }) => [title, [state, edition]]));
    expect(stateOf).toMatchObject({
      'Harvest mouse': ['drafting', 1],
      'Kettle holder': ['published', 2],
      'Oval basket': ['in-proof', null],
      'Flat scarf': ['drafting', null],
      'Plum pincushion': ['published', 1],
    });
    const mouse = patterns.find(({ title }) => title === 'Harvest mouse')!;
    expect(mouse.needs.map(({ verdict, label }) => `${label} ${verdict}`).sort()).toEqual([
      'R11 differs',
      'R14 does-not-fit',
      'R9 unread',
    ]);
    for (const { title, needs } of patterns) if (title !== 'Harvest mouse') expect([title, needs]).toEqual([title, []]);
    expect(await shelf('archive')).toHaveLength(1);
    expect(await shelf('bin')).toHaveLength(1);
  });

  test('every line of the filmed mouse has its moment, and what is knotted inside comes before the body is closed', async () => {
    const { lines, marks, pieces } = (await get(`/patterns/${MOUSE.id}`)).body as {
      lines: { id: string; pieceId: string; text: string; label: string }[];
      marks: { lineId: string; main: boolean }[];
      pieces: { id: string; name: string }[];
    };
    const marked = new Set(marks.filter((mark) => mark.main).map((mark) => mark.lineId));
    expect(lines.filter((line) => !marked.has(line.id))).toEqual([]);
    const body = lines.filter((line) => line.pieceId === pieces.find(({ name }) => name === 'Body')!.id);
    const place = (begins: string) => body.findIndex((line) => line.text.includes(begins) || line.label === begins);
    expect(place('Knot its ends inside')).toBeGreaterThan(place('safety eyes'));
    expect(place('Knot its ends inside')).toBeLessThan(place('R16'));
    expect(place('Top up the filling')).toBeLessThan(place('R18'));
    expect(place('Gather the last 6')).toBe(body.length - 1);
  });

  test('the second edition of the kettle holder says what it puts right and why', async () => {
    const id = (await house
      .db<{ id: string }>('patterns')
      .where({ title: 'Kettle holder' } as never)
      .first())!.id;
    const { editions } = (await get(`/patterns/${id}/editions`)).body as {
      editions: { number: number; errata: { now: string; why: string }[] }[];
    };
    expect(editions.map(({ number }) => number)).toEqual([2, 1]);
    expect(editions[0]!.errata.map(({ why }) => why)).toEqual([
      'It could be read two ways.',
      'Ten chains are too short for a peg.',
    ]);
    expect(editions[0]!.errata[1]!.now).toContain('ch 12');
  });

  test('its clips play through the server, in ranges', async () => {
    const { recordings } = (await get(`/patterns/${MOUSE.id}/recordings`)).body as {
      recordings: { clip: { url: string; type: string; bytes: number } | null; durationMs: number }[];
    };
    const { clip, durationMs } = recordings[0]!;
    expect(clip).toMatchObject({ type: 'video/mp4' });
    expect(durationMs).toBeGreaterThan(240_000);
    const part = await request(house.app)
      .get(clip!.url)
      .set({ ...ismay, Range: 'bytes=0-1' });
    expect([part.status, part.get('Content-Range')]).toEqual([206, `bytes 0-1/${clip!.bytes}`]);
  });
});

describe.each([HARVEST_MOUSE, KETTLE_HOLDER])('the film of the $name', ({ name, shots }) => {
  const file = (ending: string) => path.join(PROJECT_ROOT, 'seeds/clips', `${name}.${ending}`);
  const cues = [...readFileSync(file('vtt'), 'utf8').matchAll(/(\d\d):(\d\d):(\d\d\.\d{3}) --> .*\n(.*)/gu)].map(
    ([, h, m, s, text]) => ({ start: Number(h) * 3600 + Number(m) * 60 + Number(s), text }),
  );

  test('says its transcript word for word and weighs no more than three megabytes', () => {
    expect(cues.map(({ text }) => text)).toEqual(shots.map(({ say }) => say));
    expect(readFileSync(file('mp4')).length).toBeLessThan(3_000_000);
  });

  test('begins to speak each caption within a tenth of a second of its time', { timeout: 60_000 }, () => {
    const RATE = 8_000;
    const sound = execFileSync(
      'ffmpeg',
      ['-loglevel', 'error', '-i', file('mp4'), '-f', 's16le', '-ac', '1', '-ar', String(RATE), '-'],
      { maxBuffer: 200_000_000 },
    );
    const loud = (from: number, to: number) => {
      let peak = 0;
      for (let i = Math.round(from * RATE); i < Math.round(to * RATE); i += 1) {
        peak = Math.max(peak, Math.abs(sound.readInt16LE(2 * i)));
      }
      return peak > 1_000;
    };
    for (const { start, text } of cues) {
      expect([text, loud(start - 0.12, start - 0.1), loud(start, start + 0.1)]).toEqual([text, false, true]);
    }
  });
});
