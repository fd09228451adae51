import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { buildApp, type TestApp } from '../../support/app.ts';
import { buildHouse, buildLine, buildPerson } from '../../support/builders.ts';
import { buildMouse, type MousePattern } from '../../support/mouse-pattern.ts';

let house: TestApp;
beforeAll(async () => {
  house = await buildApp();
});
afterAll(() => house.close());

interface Told {
  readonly number: number;
  readonly label: string;
  readonly reason: string;
  readonly place: string;
  readonly weight: string;
}
/** Entries of a list in an answer, as far as these tests look at them. */
const listed = (list: unknown) => list as readonly Told[];

const get = async (path: string, who?: { id: string }) =>
  request(house.app)
    .get(path)
    .set(who ? await house.as(who) : {});

async function desk(mouse: MousePattern, who = mouse.house.creator) {
  const answer = await get(`/api/patterns/${mouse.patternId}/next-edition`, who);
  expect(answer.status).toBe(200);
  return answer;
}

async function publish(mouse: MousePattern, body: object = { visibility: 'unlisted' }, who = mouse.house.creator) {
  const { headers } = await desk(mouse, who);
  return request(house.app)
    .post(`/api/patterns/${mouse.patternId}/editions`)
    .set(await house.as(who))
    .set('If-Match', headers.etag ?? '')
    .send(body);
}

/** Writes a line as its studio would, so that it is in the change log. */
async function rewrite(mouse: MousePattern, lineId: string, fields: object) {
  const row = await house.db('lines').where({ id: lineId }).first('version');
  const saved = await request(house.app)
    .patch(`/api/lines/${lineId}`)
    .set(await house.as(mouse.house.creator))
    .set('If-Match', `"${row.version}"`)
    .send(fields);
  expect(saved.status).toBe(200);
}

describe('publishing', () => {
  test('freezes the pattern: state, who sees it, edition and the job for its sheets, all at once', async () => {
    const mouse = await buildMouse(house.db);
    const answer = await publish(mouse, { visibility: 'listed' });

    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({
      code: mouse.code,
      visibility: 'listed',
      editions: [{ number: 1, isCurrent: true, lines: 4, moments: 3, captions: 2, errata: [], files: [] }],
    });
    const row = await house.db('patterns').where({ id: mouse.patternId }).first();
    expect(row).toMatchObject({ state: 'published', visibility: 'listed' });
    await house.workAll();
    const list = await get(`/api/patterns/${mouse.patternId}/editions`, mouse.house.editor);
    expect(list.body.editions[0].files).toMatchObject([
      { paper: 'A4', terms: 'US' },
      { paper: 'Letter', terms: 'US' },
    ]);
  });

  test('is refused where a line differs, does not fit or is not understood, and names each', async () => {
    const mouse = await buildMouse(house.db);
    await rewrite(mouse, mouse.lines[1]!, { text: 'inc × 6 (13)' });
    await rewrite(mouse, mouse.lines[2]!, { text: '3 sc, frobnicate 4, 2 sc (18)' });

    const answer = await publish(mouse);
    expect(answer.status).toBe(422);
    expect(answer.body.detail).toMatch(/Body, R2 differs.*Body, R3 is not understood/);
    expect(listed(answer.body.blocks).map((block) => [block.label, block.reason])).toEqual([
      ['R2', 'differs'],
      ['R3', 'unread'],
    ]);
    expect(await house.db('editions').where({ pattern_id: mouse.patternId })).toEqual([]);
    const row = await house.db('patterns').where({ id: mouse.patternId }).first();
    expect(row).toMatchObject({ state: 'drafting', visibility: 'private' });
  });

  test('goes through once somebody leaves the line as it is and says why, which stays in the studio', async () => {
    const mouse = await buildMouse(house.db);
    const secret = 'The clip says thirteen, mended in the next film';
    await rewrite(mouse, mouse.lines[1]!, { text: 'inc × 6 (13)', putAsideReason: secret });
    await rewrite(mouse, mouse.lines[2]!, { text: '(sc, inc) × 6, sc (19)', putAsideReason: secret });

    expect((await publish(mouse)).status).toBe(201);
    const page = await get(`/w/${mouse.code}`);
    expect(page.status).toBe(200);
    expect(page.text).not.toContain('mended in the next film');
    expect(page.text).not.toContain(mouse.lines[1]);
    const stored = await house.db('editions').where({ pattern_id: mouse.patternId }).first('document');
    expect(JSON.stringify(stored.document)).toContain(secret);
  });

  test('of two who looked before one of them changed a line, is refused to the one who has not seen it', async () => {
    const mouse = await buildMouse(house.db);
    const { headers } = await desk(mouse);
    await rewrite(mouse, mouse.lines[0]!, { note: 'Pull the ring shut.' });
    const answer = await request(house.app)
      .post(`/api/patterns/${mouse.patternId}/editions`)
      .set(await house.as(mouse.house.creator))
      .set('If-Match', headers.etag ?? '')
      .send({ visibility: 'unlisted' });
    expect(answer.status).toBe(412);
    expect(await house.db('editions').where({ pattern_id: mouse.patternId })).toEqual([]);
  });

  test('asks for If-Match, refuses unknown fields, and writes nothing either time', async () => {
    const mouse = await buildMouse(house.db);
    const { headers } = await desk(mouse);
    const send = async (extra: Record<string, string>, body: object) =>
      request(house.app)
        .post(`/api/patterns/${mouse.patternId}/editions`)
        .set(await house.as(mouse.house.owner))
        .set(extra)
        .send(body);
    expect((await send({}, { visibility: 'listed' })).status).toBe(428);
    expect((await send({ 'If-Match': headers.etag ?? '' }, { visibility: 'listed', number: 9 })).status).toBe(422);
    expect(await house.db('editions').where({ pattern_id: mouse.patternId })).toEqual([]);
  });

  test('is for the owner and creators; an editor reads the desk, a stranger finds nothing', async () => {
    const mouse = await buildMouse(house.db);
    const { creator: stranger } = await buildHouse(house.db);
    expect((await desk(mouse, mouse.house.editor)).body.mayPublish).toBe(false);
    expect((await publish(mouse, { visibility: 'listed' }, mouse.house.editor)).status).toBe(403);
    for (const path of ['next-edition', 'editions', 'sheet.pdf']) {
      expect((await get(`/api/patterns/${mouse.patternId}/${path}`, stranger)).status).toBe(404);
      expect((await get(`/api/patterns/${mouse.patternId}/${path}`)).status).toBe(401);
    }
  });

  test('of a pattern without a line is refused in words', async () => {
    const mouse = await buildMouse(house.db);
    await house.db('lines').where({ pattern_id: mouse.patternId }).update({ deleted_at: new Date() });
    const answer = await publish(mouse);
    expect([answer.status, answer.body.detail]).toEqual([422, expect.stringMatching(/no line/)]);
  });
});

describe('a second edition', () => {
  test('drafts errata from the difference; what is unticked is not told, and a reason stands by its line', async () => {
    const mouse = await buildMouse(house.db);
    await publish(mouse);
    await rewrite(mouse, mouse.lines[0]!, { text: '6 sc in a magic ring (6)' });
    await rewrite(mouse, mouse.lines[2]!, { text: '(sc, inc) × 5, 2 sc (17)' });

    const next = await desk(mouse);
    expect(next.body).toMatchObject({ number: 2, countsChanged: true });
    expect(listed(next.body.errata).map(({ place, weight }) => [place, weight])).toEqual([
      ['Body, R1', 'clearer'],
      ['Body, R3', 'correction'],
    ]);
    const answer = await publish(mouse, {
      visibility: 'unlisted',
      errata: [
        { index: 0, told: false },
        { index: 1, told: true, why: 'The clip shows five.' },
      ],
    });
    expect(listed(answer.body.editions).map(({ number }) => number)).toEqual([2, 1]);
    expect(answer.body.editions[0].errata).toEqual([
      {
        shortId: 'br3',
        place: 'Body, R3',
        weight: 'correction',
        was: '(sc, inc) × 6 (18)',
        now: '(sc, inc) × 5, 2 sc (17)',
        why: 'The clip shows five.',
      },
    ]);
    expect(
      await house
        .db('errata')
        .join('editions', 'editions.id', 'edition_id')
        .where({ pattern_id: mouse.patternId })
        .select('line_id', 'weight'),
    ).toEqual([{ line_id: mouse.lines[2], weight: 'correction' }]);
  });

  test('leaves the first readable at its own address, which leads on to the newer one', async () => {
    const mouse = await buildMouse(house.db);
    await publish(mouse);
    await rewrite(mouse, mouse.lines[0]!, { text: '6 sc in a magic ring (6)' });
    await publish(mouse);
    const first = await get(`/w/${mouse.code}/1`);
    expect(first.text).toContain('6 sc in magic ring');
    expect(first.text).toContain('Edition 2 is out');
    expect((await get(`/w/${mouse.code}`)).text).toContain('6 sc in a magic ring');
    expect((await get(`/w/${mouse.code}/3`)).status).toBe(404);
  });

  test('keeps short ids, so that a printed address still leads to its line', async () => {
    const mouse = await buildMouse(house.db);
    await publish(mouse);
    await buildLine(house.db, {
      piece_id: (await house.db('lines').where({ id: mouse.lines[0] }).first('piece_id')).piece_id,
      text: 'sc around (18)',
      from_no: 4,
      to_no: 4,
    });
    await publish(mouse);
    for (const number of [1, 2]) expect((await get(`/w/${mouse.code}/${number}`)).text).toContain('id="br2"');
  });
});

describe('withdrawing', () => {
  test('says so on the page with the reason, plays no clip there, and can be taken back', async () => {
    const mouse = await buildMouse(house.db);
    await publish(mouse);
    const path = `/api/patterns/${mouse.patternId}/editions/1/withdrawal`;
    const as = await house.as(mouse.house.owner);
    const answer = await request(house.app).put(path).set(as).send({ reason: 'R3 was a round short.' });
    expect(answer.body.editions[0]).toMatchObject({ withdrawnReason: 'R3 was a round short.', isCurrent: false });
    const page = await get(`/w/${mouse.code}/1`);
    expect(page.text).toContain('This edition was withdrawn.');
    expect(page.text).toContain('R3 was a round short.');
    expect(page.text).toContain('noindex');
    expect((await get(`/api/editions/${mouse.code}/1/clips/1`)).status).toBe(404);

    const back = await request(house.app).delete(path).set(as);
    expect(back.body.editions[0]).toMatchObject({ withdrawnAt: null, isCurrent: true });
    expect((await get(`/w/${mouse.code}/1`)).text).not.toContain('withdrawn');
  });

  test('wants a reason, an edition that is there, and somebody who may', async () => {
    const mouse = await buildMouse(house.db);
    await publish(mouse);
    const put = async (number: number | string, body: object, who: { id: string }) =>
      (
        await request(house.app)
          .put(`/api/patterns/${mouse.patternId}/editions/${number}/withdrawal`)
          .set(await house.as(who))
          .send(body)
      ).status;
    expect(await put(1, { reason: ' ' }, mouse.house.owner)).toBe(422);
    expect(await put(2, { reason: 'No.' }, mouse.house.owner)).toBe(404);
    expect(await put('1x', { reason: 'No.' }, mouse.house.owner)).toBe(404);
    expect(await put(1, { reason: 'No.' }, mouse.house.editor)).toBe(403);
    expect(await put(1, { reason: 'No.' }, await buildPerson(house.db))).toBe(404);
  });
});
