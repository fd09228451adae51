import { randomUUID } from 'node:crypto';
import request from 'supertest';
import { describe, expect, test } from 'vitest';
import {
  buildHouse,
  buildLine,
  buildMark,
  buildPattern,
  buildPerson,
  buildPiece,
  buildRecording,
} from '../../support/builders.ts';
import { settleIn } from './at-home.ts';

const home = settleIn();
const { call } = home;

const aPiece = async () => {
  const pattern = await buildPattern(home.server.db, { studio_id: home.house.studio.id });
  return { pattern, piece: await buildPiece(home.server.db, { pattern_id: pattern.id }) };
};
const aLine = async (over: Record<string, unknown> = {}) => {
  const { pattern, piece } = await aPiece();
  return { pattern, piece, line: await buildLine(home.server.db, { piece_id: piece.id, ...over }) };
};
const patch = (who: { id: string }, path: string, version: number | null, body: object, deed?: string) =>
  call(who, 'patch', path, { version, body, ...(deed !== undefined && { deed }) });
const post = (who: { id: string }, path: string, body: object) => call(who, 'post', path, { body });
const changesOf = (patternId: string) => home.server.db('changes').where({ pattern_id: patternId }).orderBy('id');

describe('two people at one line', () => {
  test('of two who read version 1, one is saved and the other told to look again, fifty times', async () => {
    const { pattern, piece } = await aPiece();
    const lines = [];
    for (let i = 0; i < 50; i += 1) lines.push(await buildLine(home.server.db, { piece_id: piece.id }));
    const [creator, editor] = [await home.server.as(home.house.creator), await home.server.as(home.house.editor)];
    const save = (id: string, who: Record<string, string>, text: string) =>
      request(home.server.app).patch(`/api/lines/${id}`).set(who).set('If-Match', '"1"').send({ text });
    for (const { id } of lines) {
      home.server.clock.advance(2_000);
      const answers = await Promise.all([save(id, creator, '8 sc in ring'), save(id, editor, '7 sc in ring')]);
      expect(answers.map((a) => a.status).sort()).toEqual([200, 412]);
    }
    expect(await home.server.db('lines').where({ piece_id: piece.id, version: 2 })).toHaveLength(50);
    expect(await changesOf(pattern.id)).toHaveLength(50);
  }, 60_000);

  test('the one who came second is shown the row as it is now, and who saved it when', async () => {
    const { line } = await aLine();
    await patch(home.house.editor, `lines/${line.id}`, 1, { text: '7 sc in ring' });
    const refused = await patch(home.house.creator, `lines/${line.id}`, 1, { text: '8 sc in ring' });
    expect(refused.status).toBe(412);
    expect(refused.type).toBe('application/problem+json');
    expect(refused.body).toMatchObject({
      type: '/problems/stale-version',
      present: { id: line.id, text: '7 sc in ring', version: 2 },
      savedBy: home.house.editor.name,
    });
    expect(Date.parse(refused.body.savedAt as string)).not.toBeNaN();
    expect(refused.body.present).not.toHaveProperty('patternId');
  });

  test('different lines are saved beside each other, and nobody waits in vain', async () => {
    const { piece, line } = await aLine();
    const other = await buildLine(home.server.db, { piece_id: piece.id });
    const answers = await Promise.all([
      patch(home.house.creator, `lines/${line.id}`, 1, { text: 'sc around' }),
      patch(home.house.editor, `lines/${other.id}`, 1, { text: '(sc, inc) ×6' }),
    ]);
    expect(answers.map((a) => a.status)).toEqual([200, 200]);
  });
});

describe('what is refused, and then nothing is written', () => {
  test.each([
    ['no If-Match', null, { text: 'x' }, 428],
    ['a version that is none', -1, { text: 'x' }, 400],
    ['an unknown field', 1, { text: 'x', owner_id: 'me' }, 422],
    ['a field that only the server sets', 1, { version: 9 }, 422],
    ['nothing at all', 1, {}, 422],
    ['a total that is no count', 1, { written: { sts: [2.5] } }, 422],
    ['a piece of another pattern', 1, { pieceId: randomUUID() }, 422],
    ['a place after a line that is not there', 1, { after: randomUUID() }, 422],
  ])('%s', async (_what, version, body, status) => {
    const { pattern, line } = await aLine();
    const before = await home.server.db('lines').where({ id: line.id }).first();
    const answer = await patch(home.house.creator, `lines/${line.id}`, version, body);
    expect(answer.status).toBe(status);
    expect(await home.server.db('lines').where({ id: line.id }).first()).toEqual(before);
    expect(await changesOf(pattern.id)).toEqual([]);
  });

  test('a stranger and a viewer get the same answer for a real line as for a made-up one', async () => {
    const { line } = await aLine();
    const others = await buildHouse(home.server.db);
    for (const who of [others.owner, await buildPerson(home.server.db)]) {
      const real = await patch(who, `lines/${line.id}`, 1, { text: 'x' });
      const madeUp = await patch(who, `lines/${randomUUID()}`, 1, { text: 'x' });
      const noId = await patch(who, 'lines/17', 1, { text: 'x' });
      expect([real.status, madeUp.status, noId.status]).toEqual([404, 404, 404]);
      expect({ ...real.body, instance: '' }).toEqual({ ...madeUp.body, instance: '' });
    }
    const nobody = await request(home.server.app)
      .patch(`/api/lines/${line.id}`)
      .set({ 'Sec-Fetch-Site': 'same-origin', 'If-Match': '"1"' })
      .send({ text: 'x' });
    expect(nobody.status).toBe(401);
  });

  test('a member who has left is refused with the next request', async () => {
    const { line } = await aLine();
    const guest = await buildPerson(home.server.db);
    await home.server.db('members').insert({ studio_id: home.house.studio.id, person_id: guest.id, role: 'editor' });
    expect((await patch(guest, `lines/${line.id}`, 1, { text: 'x' })).status).toBe(200);
    await home.server.db('members').where({ person_id: guest.id }).update({ left_at: new Date() });
    expect((await patch(guest, `lines/${line.id}`, 2, { text: 'y' })).status).toBe(404);
  });
});

describe('lines', () => {
  test('a new line stands behind the one it follows, and only it is written', async () => {
    const { pattern, piece, line } = await aLine();
    const last = await buildLine(home.server.db, { piece_id: piece.id });
    const made = await post(home.house.creator, `patterns/${pattern.id}/lines`, {
      pieceId: piece.id,
      kind: 'step',
      text: 'Stuff firmly.',
      after: line.id,
    });
    expect(made.status).toBe(201);
    expect(made.headers.etag).toBe('"1"');
    const ids = await home.server.db('lines').where({ piece_id: piece.id }).orderBy('order_key').pluck('id');
    expect(ids).toEqual([line.id, made.body.id, last.id]);
    expect(await home.server.db('lines').where({ piece_id: piece.id }).whereNot({ version: 1 })).toEqual([]);
  });

  test('a line moved to the front leaves all others untouched', async () => {
    const { piece, line } = await aLine();
    const second = await buildLine(home.server.db, { piece_id: piece.id });
    const third = await buildLine(home.server.db, { piece_id: piece.id });
    expect((await patch(home.house.creator, `lines/${third.id}`, 1, { after: null })).status).toBe(200);
    const rows = await home.server
      .db('lines')
      .where({ piece_id: piece.id })
      .orderBy('order_key')
      .select('id', 'version');
    expect(rows).toEqual([
      { id: third.id, version: 2 },
      { id: line.id, version: 1 },
      { id: second.id, version: 1 },
    ]);
  });

  test('sent twice with an id of the caller’s, one line is made', async () => {
    const { pattern, piece } = await aPiece();
    const body = { id: randomUUID(), pieceId: piece.id, kind: 'round', text: 'sc around' };
    const first = await post(home.house.creator, `patterns/${pattern.id}/lines`, body);
    const again = await post(home.house.creator, `patterns/${pattern.id}/lines`, body);
    expect([first.status, again.status]).toEqual([201, 200]);
    expect(again.body).toEqual(first.body);
    expect(await home.server.db('lines').where({ piece_id: piece.id })).toHaveLength(1);
  });

  test('short ids have no hyphen, nothing that is taken for another, and are not given twice', async () => {
    const { pattern, piece } = await aPiece();
    const ids: string[] = [];
    for (let i = 0; i < 20; i += 1) {
      const { body } = await post(home.house.creator, `patterns/${pattern.id}/lines`, {
        pieceId: piece.id,
        kind: 'round',
      });
      ids.push(body.shortId as string);
    }
    expect(new Set(ids).size).toBe(20);
    for (const id of ids) expect(id).toMatch(/^[2-9a-hjkmnp-tw-z]{4}$/);
  });

  test('a line taken away is gone from the bench and its short id stays taken', async () => {
    const { pattern, line } = await aLine();
    const gone = await call(home.house.creator, 'delete', `lines/${line.id}`, { version: 1 });
    expect(gone.status).toBe(204);
    const { body } = await call(home.house.creator, 'get', `patterns/${pattern.id}`);
    expect(body.lines).toEqual([]);
    expect(await home.server.db('lines').where({ id: line.id }).pluck('short_id')).toEqual([line.short_id]);
    expect((await patch(home.house.creator, `lines/${line.id}`, 2, { text: 'x' })).status).toBe(404);
  });

  test('what a person writes is kept from a later reading', async () => {
    const { line } = await aLine();
    await patch(home.house.creator, `lines/${line.id}`, 1, { text: 'sc around', note: 'Use a marker.' });
    expect((await home.server.db('line_touched').where({ line_id: line.id }).pluck('field')).sort()).toEqual([
      'note',
      'text',
    ]);
  });
});

describe('where a written total lives', () => {
  test('it goes into the text where one stands there', async () => {
    const { line } = await aLine({ text: '(sc, inc) ×6 (12)' });
    const { body } = await patch(home.house.creator, `lines/${line.id}`, 1, { written: { sts: [18] } });
    expect(body).toMatchObject({ text: '(sc, inc) ×6 (18)', written: null });
  });

  test('it is stored beside the text where none stands there', async () => {
    const { line } = await aLine({ text: '(sc, inc) ×6' });
    const { body } = await patch(home.house.creator, `lines/${line.id}`, 1, { written: { sts: [18] } });
    expect(body).toMatchObject({ text: '(sc, inc) ×6', written: { sts: [18] } });
  });

  test('typed into the text later, it is no longer stored beside it', async () => {
    const { line } = await aLine({ text: '(sc, inc) ×6', written: { sts: [18] } });
    const { body } = await patch(home.house.creator, `lines/${line.id}`, 1, { text: '(sc, inc) ×6 (20)' });
    expect(body).toMatchObject({ text: '(sc, inc) ×6 (20)', written: null });
  });

  test('taken out of the field, it goes from the text', async () => {
    const { line } = await aLine({ text: '(sc, inc) ×6 (12)' });
    const { body } = await patch(home.house.creator, `lines/${line.id}`, 1, { written: null });
    expect(body).toMatchObject({ text: '(sc, inc) ×6', written: null });
  });
});

describe('marks', () => {
  test('a line has one main mark: the newer takes its place', async () => {
    const { pattern, line } = await aLine();
    const recording = await buildRecording(home.server.db, { pattern_id: pattern.id });
    const at = { pattern_id: pattern.id, recording_id: recording.id };
    const old = await buildMark(home.server.db, { ...at, line_id: line.id, start_ms: 1_000 });
    const body = { recordingId: recording.id, lineId: line.id, startMs: 4_200 };
    const beside = await post(home.house.creator, `patterns/${pattern.id}/marks`, body);
    expect(beside.body).toMatchObject({ main: false, madeBy: 'person' });
    const saved = await patch(home.house.creator, `marks/${beside.body.id as string}`, 1, { main: true });
    expect(saved.body.main).toBe(true);
    expect((await home.server.db('marks').where({ id: old.id }).first<{ main: boolean }>()).main).toBe(false);
  });

  test.each([
    ['a recording of another pattern', (r: string) => ({ recordingId: r, startMs: 0 })],
    ['an end before its start', () => ({ recordingId: randomUUID(), startMs: 900, endMs: 800 })],
  ])('%s is refused', async (_what, body) => {
    const { pattern } = await aPiece();
    const elsewhere = await buildRecording(home.server.db, { studio_id: home.house.studio.id });
    expect((await post(home.house.creator, `patterns/${pattern.id}/marks`, body(elsewhere.id))).status).toBe(422);
  });

  test('moved behind its end it is refused', async () => {
    const { pattern } = await aPiece();
    const recording = await buildRecording(home.server.db, { pattern_id: pattern.id });
    const at = { pattern_id: pattern.id, recording_id: recording.id };
    const mark = await buildMark(home.server.db, { ...at, start_ms: 100, end_ms: 200 });
    expect((await patch(home.house.creator, `marks/${mark.id}`, 1, { startMs: 300 })).status).toBe(422);
  });
});

describe('deeds', () => {
  test('writes under one Deed-Id are one deed, and the answer names it', async () => {
    const { pattern, piece, line } = await aLine();
    const deed = randomUUID();
    const saved = await patch(home.house.creator, `lines/${line.id}`, 1, { text: 'sc around' }, deed);
    await patch(home.house.creator, `pieces/${piece.id}`, 1, { name: 'Body' }, deed);
    expect(saved.headers['deed-id']).toBe(deed);
    expect(await home.server.db('changes').where({ pattern_id: pattern.id }).pluck('deed_id')).toEqual([deed, deed]);
  });

  test('somebody else’s deed cannot be added to', async () => {
    const { pattern, line } = await aLine();
    const deed = randomUUID();
    await patch(home.house.creator, `lines/${line.id}`, 1, { text: 'sc around' }, deed);
    expect((await patch(home.house.editor, `lines/${line.id}`, 2, { text: 'x' }, deed)).status).toBe(409);
    expect(await changesOf(pattern.id)).toHaveLength(1);
  });

  test('a save that changes nothing leaves no trace', async () => {
    const { pattern, line } = await aLine();
    const saved = await patch(home.house.creator, `lines/${line.id}`, 1, { text: line.text });
    expect(saved.body.version).toBe(1);
    expect(await changesOf(pattern.id)).toEqual([]);
  });
});
