import { randomUUID } from 'node:crypto';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { PublicEdition } from '#contract/editions';
import { buildApp, type TestApp } from '../../support/app.ts';
import { buildHouse } from '../../support/builders.ts';
import { buildMouse, type MousePattern } from '../../support/mouse-pattern.ts';
import { pdfInfo, pdfText } from '../../support/read-pdf.ts';

const CLIP = Buffer.from(Array.from({ length: 500 }, (_, n) => n % 251));

let house: TestApp;
beforeAll(async () => {
  house = await buildApp();
});
afterAll(() => house.close());

const get = async (path: string, who?: { id: string }, headers: Record<string, string> = {}) =>
  request(house.app)
    .get(path)
    .set(who ? await house.as(who) : {})
    .set(headers);

/** The bytes of an answer, whatever its type says. */
const bytes = (path: string, headers: Record<string, string> = {}) =>
  request(house.app)
    .get(path)
    .set(headers)
    .buffer(true)
    .parse((res, done) => {
      const chunks: Buffer[] = [];
      res.on('data', (chunk: Buffer) => chunks.push(chunk));
      res.on('end', () => done(null, Buffer.concat(chunks)));
    });

async function giveClip(mouse: MousePattern): Promise<void> {
  const id = randomUUID();
  await house.deps.storage.put(id, CLIP, 'video/mp4');
  const about = { kind: 'clip', state: 'ready', bytes: CLIP.length, type: 'video/mp4' };
  await house.db('objects').insert({ id, key: id, studio_id: mouse.house.studio.id, ...about });
  await house.db('recordings').where({ id: mouse.recordingId }).update({ clip_object_id: id, duration_ms: 200_000 });
}

async function published(visibility: 'private' | 'unlisted' | 'listed', withClip = false): Promise<MousePattern> {
  const mouse = await buildMouse(house.db);
  if (withClip) await giveClip(mouse);
  const as = await house.as(mouse.house.creator);
  const desk = await request(house.app).get(`/api/patterns/${mouse.patternId}/next-edition`).set(as);
  const answer = await request(house.app)
    .post(`/api/patterns/${mouse.patternId}/editions`)
    .set(as)
    .set('If-Match', desk.headers.etag ?? '')
    .send({ visibility });
  expect(answer.status).toBe(201);
  return mouse;
}

describe('the page behind a printed address', () => {
  test('has every word of the pattern in its HTML: lines, totals, moments, cautions, the sheet', async () => {
    const { code } = await published('listed');
    const { text, status } = await get(`/w/${code}`);
    expect(status).toBe(200);
    for (const words of [
      'Harvest mouse',
      '6 sc in magic ring',
      '(sc, inc) × 6',
      '>18<',
      'href="?t=60"',
      'Stuff firmly.',
      'not a safety certificate',
      `/api/editions/${code}/1/sheet.pdf`,
    ]) {
      expect(text).toContain(words);
    }
    expect(text).not.toContain('noindex');
    expect(text).toContain(`<link rel="canonical" href="${house.env.publicUrl}/w/${code}"`);
  });

  test('carries a document that the contract knows, and no key beside it', async () => {
    const { code } = await published('unlisted');
    const { text } = await get(`/w/${code}`);
    const json = /<script type="application\/json" id="edition">(.*?)<\/script>/s.exec(text)?.[1] ?? '';
    const document: unknown = JSON.parse(json);
    expect(PublicEdition.strict().parse(document)).toEqual(document);
    expect(json).not.toMatch(/"(studioId|said|verdict|leftBecause|putAsideReason|evidence|personId|createdBy|email)"/);
  });

  test('asks search engines to stay away from an unlisted one, and from old editions', async () => {
    expect((await get(`/w/${(await published('unlisted')).code}`)).text).toContain('content="noindex"');
  });

  test('cannot be made to run what somebody wrote into a pattern', async () => {
    const mouse = await buildMouse(house.db);
    const evil = '</script><script>alert(1)</script><img src=x onerror=alert(2)>';
    await house.db('patterns').where({ id: mouse.patternId }).update({ title: evil });
    await house.db('lines').where({ id: mouse.lines[3] }).update({ text: evil });
    const as = await house.as(mouse.house.creator);
    const desk = await request(house.app).get(`/api/patterns/${mouse.patternId}/next-edition`).set(as);
    await request(house.app)
      .post(`/api/patterns/${mouse.patternId}/editions`)
      .set(as)
      .set('If-Match', desk.headers.etag ?? '')
      .send({ visibility: 'listed' });
    const { text, status } = await get(`/w/${mouse.code}`);
    expect(status).toBe(200);
    expect(text).not.toContain('<script>alert');
    expect(text).not.toContain('<img src=x');
    expect(text).toContain('&lt;img src=x');
  });

  test('is the same page for an unknown code, a private pattern, one never published and one in the bin', async () => {
    const secret = await published('private');
    const binned = await published('listed');
    await house.db('patterns').where({ id: binned.patternId }).update({ deleted_at: new Date() });
    const { code: unpublished } = await buildMouse(house.db);
    const stranger = (await buildHouse(house.db)).owner;
    const nothing = await get('/w/zzzzzzzz');
    expect(nothing.status).toBe(404);
    expect(nothing.type).toBe('text/html');
    for (const code of [secret.code, unpublished, binned.code]) {
      for (const path of [`/w/${code}`, `/w/${code}/1`]) {
        for (const who of [undefined, stranger]) {
          const answer = await get(path, who);
          expect([answer.status, answer.text]).toEqual([404, nothing.text]);
        }
      }
    }
    for (const path of ['/w/zzzzzzzz/1', `/w/${secret.code}/one`, `/w/${secret.code}/0`]) {
      expect((await get(path)).text).toBe(nothing.text);
    }
  });

  test('of a private pattern is shown to its studio, kept nowhere, and ends with the membership', async () => {
    const { code, house: studio } = await published('private');
    const answer = await get(`/w/${code}`, studio.editor);
    expect([answer.status, answer.headers['cache-control']]).toEqual([200, 'private, no-store']);
    await house.db('members').where({ person_id: studio.editor.id }).update({ left_at: new Date() });
    expect((await get(`/w/${code}`, studio.editor)).status).toBe(404);
  });
});

describe('what the page plays', () => {
  test('is the clip in ranges to anybody with the link, by the edition it belongs to', async () => {
    const { code } = await published('unlisted', true);
    const part = await bytes(`/api/editions/${code}/1/clips/1`, { Range: 'bytes=10-19' });
    expect(part.status).toBe(206);
    expect(part.headers).toMatchObject({ 'content-range': 'bytes 10-19/500', 'content-type': 'video/mp4' });
    expect(part.body).toEqual(CLIP.subarray(10, 20));
    expect((await bytes(`/api/editions/${code}/1/clips/1`, { Range: 'bytes=900-' })).status).toBe(416);
    for (const path of ['1/clips/2', '2/clips/1', '1/clips/x']) {
      expect((await get(`/api/editions/${code}/${path}`)).status).toBe(404);
    }
  });

  test('is not the clip of a private pattern, which answers as an unknown code does', async () => {
    const { code } = await published('private', true);
    const [mine, unknown] = await Promise.all([
      get(`/api/editions/${code}/1/clips/1`),
      get('/api/editions/zzzzzzzz/1/clips/1'),
    ]);
    const plain = (body: object) => ({ ...body, instance: '' });
    expect(mine.status).toBe(404);
    expect(plain(mine.body)).toEqual(plain(unknown.body));
  });

  test('is captions as corrected, escaped as WebVTT wants them', async () => {
    const { code } = await published('unlisted');
    const { text, type } = await get(`/api/editions/${code}/1/captions/1`);
    expect(type).toBe('text/vtt');
    expect(text).toBe(
      'WEBVTT\n\n00:01:00.000 --> 00:01:03.000\nSix single &amp; one ring\n\n00:02:00.000 --> 00:02:03.000\nNow &lt;two&gt; in each\n',
    );
    expect((await get(`/api/editions/${code}/1/captions/2`)).status).toBe(404);
  });
});

const editionOf = async (patternId: string): Promise<string> => {
  const row = await house.db('editions').where({ pattern_id: patternId }).first<{ id: string }>('id');
  return row.id;
};

describe('the sheet of an edition', () => {
  test('comes from the store once made, and drawn on the spot before that and in the other terms', async () => {
    const { code, patternId } = await published('listed');
    const before = await bytes(`/api/editions/${code}/1/sheet.pdf`);
    await house.work('make-sheets', { editionId: await editionOf(patternId) });
    const kept = await bytes(`/api/editions/${code}/1/sheet.pdf`);
    expect(kept.headers).toMatchObject({
      'content-type': 'application/pdf',
      'content-disposition': 'inline; filename="harvest-mouse-edition-1-A4-US.pdf"',
    });
    expect(pdfText(kept.body as Buffer)).toBe(pdfText(before.body as Buffer));
    expect(pdfText((await bytes(`/api/editions/${code}/1/sheet.pdf?terms=UK`)).body as Buffer)).toContain(
      '6 dc in magic ring',
    );
    const letter = await bytes(`/api/editions/${code}/1/sheet.pdf?paper=Letter`);
    expect(pdfInfo(letter.body as Buffer)['Page size']).toContain('letter');
    expect((await get(`/api/editions/${code}/1/sheet.pdf?paper=A5`)).status).toBe(422);
  });

  test('is made once, however often its job runs, and its objects have an owner', async () => {
    const mouse = await published('listed');
    const editionId = await editionOf(mouse.patternId);
    await house.work('make-sheets', { editionId });
    const rows = () => house.db('objects').where({ studio_id: mouse.house.studio.id, kind: 'sheet' }).orderBy('id');
    const once = await rows();
    expect(once.map(({ state }: { state: string }) => state)).toEqual(['ready', 'ready']);
    await house.work('make-sheets', { editionId });
    expect(await rows()).toEqual(once);
  });

  test('of a draft is for the studio, and says it is one', async () => {
    const mouse = await buildMouse(house.db);
    const as = await house.as(mouse.house.editor);
    const answer = await bytes(`/api/patterns/${mouse.patternId}/sheet.pdf?paper=Letter`, as);
    expect(answer.headers['cache-control']).toBe('private, no-store');
    expect(pdfText(answer.body as Buffer)).toContain('Draft: not published');
  });
});
