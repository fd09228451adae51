import { randomUUID } from 'node:crypto';
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
import type { Shelf } from '../../../api/contract/shelf.ts';
import { settleIn } from './at-home.ts';

const home = settleIn();
const { call } = home;

interface Who {
  readonly id: string;
}
const shelf = async (who: Who, part: string, studioId: string) =>
  (await call(who, 'get', `patterns?studioId=${studioId}&part=${part}`)).body as Shelf;

describe('a new pattern', () => {
  test('is made with a code that is short, plain and its own', async () => {
    const made = await call(home.house.creator, 'post', 'patterns', {
      body: { studioId: home.house.studio.id, title: '  Harvest mouse ' },
    });
    expect(made.status).toBe(201);
    expect(made.body).toMatchObject({ title: 'Harvest mouse', state: 'drafting', visibility: 'private', version: 1 });
    expect(made.body.code).toMatch(/^[2-9a-z]{8}$/);
    expect(made.headers.location).toBe(`/api/patterns/${made.body.id as string}`);
  });

  test('sent twice it is made once, by its id or by an Idempotency-Key', async () => {
    const id = randomUUID();
    const body = { id, studioId: home.house.studio.id, title: 'Kettle holder' };
    await call(home.house.creator, 'post', 'patterns', { body });
    const again = await call(home.house.creator, 'post', 'patterns', { body });
    expect(again.body.id).toBe(id);
    const headers = { 'Idempotency-Key': randomUUID() };
    const flat = { studioId: home.house.studio.id, title: 'Flat scarf' };
    const first = await call(home.house.creator, 'post', 'patterns', { body: flat, headers });
    const second = await call(home.house.creator, 'post', 'patterns', { body: flat, headers });
    expect(second.body).toEqual(first.body);
    expect(await home.server.db('patterns').where({ title: 'Flat scarf' })).toHaveLength(1);
  });

  test('is for creators and owners: an editor may not, a stranger finds no studio', async () => {
    const body = { studioId: home.house.studio.id, title: 'Oval basket' };
    expect((await call(home.house.editor, 'post', 'patterns', { body })).status).toBe(403);
    expect((await call(await buildPerson(home.server.db), 'post', 'patterns', { body })).status).toBe(404);
    expect((await call(home.house.owner, 'post', 'patterns', { body: { ...body, code: 'mine' } })).status).toBe(422);
    expect((await call(home.house.owner, 'post', 'patterns', { body: { ...body, title: ' ' } })).status).toBe(422);
  });
});

describe('what a pattern says of itself', () => {
  test('details are changed part by part', async () => {
    const { id } = await buildPattern(home.server.db, { studio_id: home.house.studio.id });
    const one = await call(home.house.editor, 'patch', `patterns/${id}`, {
      version: 1,
      body: { details: { care: 'By hand.' } },
    });
    const two = await call(home.house.creator, 'patch', `patterns/${id}`, {
      version: 2,
      body: { details: { gauge: '20 sts' } },
    });
    expect([one.status, two.status]).toEqual([200, 200]);
    expect(two.body.details).toMatchObject({ care: 'By hand.', gauge: '20 sts', level: null });
  });

  test('who sees it is the creator’s to say, and a stale save shows the present', async () => {
    const { id } = await buildPattern(home.server.db, { studio_id: home.house.studio.id });
    const body = { visibility: 'listed' };
    expect((await call(home.house.editor, 'patch', `patterns/${id}`, { version: 1, body })).status).toBe(403);
    expect((await call(home.house.creator, 'patch', `patterns/${id}`, { version: 1, body })).status).toBe(200);
    const stale = await call(home.house.editor, 'patch', `patterns/${id}`, { version: 1, body: { title: 'Other' } });
    expect(stale.status).toBe(412);
    expect(stale.body.present).toMatchObject({ id, visibility: 'listed', version: 2 });
    expect((await call(home.house.editor, 'patch', `patterns/${id}`, { body: { title: 'Other' } })).status).toBe(428);
  });
});

describe('its life', () => {
  test('into the bin it cannot be written to, and comes back whole', async () => {
    const { id } = await buildPattern(home.server.db, { studio_id: home.house.studio.id });
    const piece = await buildPiece(home.server.db, { pattern_id: id });
    const line = await buildLine(home.server.db, { piece_id: piece.id });
    const binned = await call(home.house.creator, 'post', `patterns/${id}/bin`, { version: 1 });
    expect(binned.body.binnedAt).not.toBeNull();
    const refused = await call(home.house.creator, 'patch', `lines/${line.id}`, { version: 1, body: { text: 'x' } });
    expect(refused.status).toBe(410);
    expect(refused.body.detail).toContain('bin');
    expect((await call(home.house.creator, 'get', `patterns/${id}`)).body.mayEdit).toBe(false);
    const back = await call(home.house.creator, 'post', `patterns/${id}/restore`, { version: 2 });
    expect(back.body).toMatchObject({ binnedAt: null, version: 3 });
    expect((await call(home.house.creator, 'get', `patterns/${id}`)).body.lines).toHaveLength(1);
  });

  test('an editor sends it to proof and back, but does not bin it', async () => {
    const { id } = await buildPattern(home.server.db, { studio_id: home.house.studio.id });
    const sent = await call(home.house.editor, 'post', `patterns/${id}/state`, {
      version: 1,
      body: { state: 'in-proof' },
    });
    expect(sent.body.state).toBe('in-proof');
    expect((await call(home.house.editor, 'post', `patterns/${id}/bin`, { version: 2 })).status).toBe(403);
    const body = { state: 'published' };
    expect((await call(home.house.owner, 'post', `patterns/${id}/state`, { version: 2, body })).status).toBe(422);
    const back = await call(home.house.editor, 'post', `patterns/${id}/state`, {
      version: 2,
      body: { state: 'drafting' },
    });
    expect(back.body.state).toBe('drafting');
  });

  test('a copy has its own code, ids and log; short ids, marks and recordings go along', async () => {
    const { id } = await buildPattern(home.server.db, { studio_id: home.house.studio.id, title: 'Teasel' });
    const piece = await buildPiece(home.server.db, { pattern_id: id });
    const line = await buildLine(home.server.db, { piece_id: piece.id });
    const recording = await buildRecording(home.server.db, { pattern_id: id });
    await buildMark(home.server.db, { pattern_id: id, recording_id: recording.id, line_id: line.id, start_ms: 5_000 });
    await home.server.db('pieces').where({ id: piece.id }).update({ starts_on_line_id: line.id });

    const copy = await call(home.house.creator, 'post', `patterns/${id}/duplicate`);
    expect(copy.status).toBe(201);
    const doc = (await call(home.house.creator, 'get', `patterns/${copy.body.id as string}`)).body;
    expect(doc.title).toBe('Teasel, copy');
    expect(doc.code).not.toBe((await home.server.db('patterns').where({ id }).first()).code);
    expect(doc.lines).toMatchObject([{ shortId: line.short_id, pieceId: doc.pieces[0].id }]);
    expect(doc.lines[0].id).not.toBe(line.id);
    expect(doc.pieces[0].startsOnLineId).toBe(doc.lines[0].id);
    expect(doc.marks).toMatchObject([{ lineId: doc.lines[0].id, startMs: 5_000 }]);
    expect(doc.recordings).toMatchObject([{ id: recording.id, number: 1 }]);
    expect(doc.mayUndo).toBe(false);
  });
});

describe('the shelf', () => {
  test('shows what a count finds, in groups, with stitches and what wants a look', async () => {
    const { studio, creator, editor } = await buildHouse(home.server.db);
    const { id } = await buildPattern(home.server.db, { studio_id: studio.id });
    const piece = await buildPiece(home.server.db, { pattern_id: id, name: 'Body', make: 2 });
    const texts = ['6 sc in a magic ring (6)', '(inc) ×6 (12)', '(sc, inc) ×6 (20)', 'sc around'];
    for (const text of texts) await buildLine(home.server.db, { piece_id: piece.id, text });
    const seen = (await shelf(creator, 'shelf', studio.id)).patterns;
    expect(seen).toMatchObject([
      {
        id,
        group: 'waiting',
        pieces: [{ name: 'Body', make: 2 }],
        lines: 4,
        needs: [{ verdict: 'differs', label: 'Rnd 3', piece: 'Body' }],
        print: { form: 'rings' },
        edition: null,
      },
    ]);
    const totals = seen[0]?.print?.totals ?? [];
    expect(totals.slice(0, 3)).toEqual([6, 12, 18]);
    expect(seen[0]?.stitches).toBe(2 * totals.reduce((a, b) => a + b, 0));
    expect((await shelf(editor, 'shelf', studio.id)).patterns[0]?.group).toBe('in-hand');
  });

  test('tells after which line no moment is marked, where there is a recording', async () => {
    const { studio, creator } = await buildHouse(home.server.db);
    const { id } = await buildPattern(home.server.db, { studio_id: studio.id });
    const piece = await buildPiece(home.server.db, { pattern_id: id });
    const first = await buildLine(home.server.db, { piece_id: piece.id });
    await buildLine(home.server.db, { piece_id: piece.id, text: 'inc around (12)' });
    expect((await shelf(creator, 'shelf', studio.id)).patterns[0]).toMatchObject({ unmarked: 0, lastMarked: null });
    const recording = await buildRecording(home.server.db, { pattern_id: id });
    await buildMark(home.server.db, { pattern_id: id, recording_id: recording.id, line_id: first.id, start_ms: 10 });
    expect((await shelf(creator, 'shelf', studio.id)).patterns[0]).toMatchObject({ unmarked: 1, lastMarked: 'Rnd 1' });
  });

  test('keeps archive and bin apart, and counts them', async () => {
    const { studio, owner } = await buildHouse(home.server.db);
    const ids = [];
    for (let i = 0; i < 3; i += 1) ids.push((await buildPattern(home.server.db, { studio_id: studio.id })).id);
    await call(owner, 'post', `patterns/${ids[0]!}/archive`, { version: 1 });
    await call(owner, 'post', `patterns/${ids[1]!}/bin`, { version: 1 });
    const titlesOf = async (part: string) => (await shelf(owner, part, studio.id)).patterns.map(({ id }) => id);
    expect(await titlesOf('shelf')).toEqual([ids[2]]);
    expect(await titlesOf('archive')).toEqual([ids[0]]);
    expect(await titlesOf('bin')).toEqual([ids[1]]);
    expect(await shelf(owner, 'shelf', studio.id)).toMatchObject({ archived: 1, binned: 1, mayManage: true });
    await call(owner, 'post', `patterns/${ids[0]!}/unarchive`, { version: 2 });
    expect(await titlesOf('archive')).toEqual([]);
  });

  test('is not for others, and refuses what it does not know', async () => {
    const stranger = await buildPerson(home.server.db);
    expect((await call(stranger, 'get', `patterns?studioId=${home.house.studio.id}`)).status).toBe(404);
    expect((await call(home.house.owner, 'get', `patterns?studioId=${home.house.studio.id}&who=me`)).status).toBe(422);
    expect((await call(home.house.owner, 'get', 'patterns')).status).toBe(422);
  });
});

describe('cautions', () => {
  const cautionsOf = async (id: string) =>
    (await call(home.house.creator, 'get', `patterns/${id}`)).body.cautions as Record<string, unknown>[];
  const addMaterial = async (id: string, name: string) =>
    (await call(home.house.creator, 'post', `patterns/${id}/materials`, { body: { kind: 'notion', name } })).body as {
      id: string;
    };

  test('a material brings one, which goes when the material goes', async () => {
    const { id } = await buildPattern(home.server.db, { studio_id: home.house.studio.id });
    const eyes = await addMaterial(id, 'Safety eyes, 9 mm');
    expect(await cautionsOf(id)).toMatchObject([{ id: null, kind: 'small-parts', broughtBy: ['Safety eyes, 9 mm'] }]);
    await call(home.house.creator, 'delete', `materials/${eyes.id}`, { version: 1 });
    expect(await cautionsOf(id)).toEqual([]);
  });

  test('it can be put in other words, but not taken away', async () => {
    const { id } = await buildPattern(home.server.db, { studio_id: home.house.studio.id });
    await addMaterial(id, 'Two buttons');
    const text = 'The buttons come off: not for a child under three.';
    const worded = await call(home.house.creator, 'post', `patterns/${id}/cautions`, {
      body: { kind: 'small-parts', text },
    });
    expect(worded.status).toBe(201);
    expect(await cautionsOf(id)).toMatchObject([{ id: worded.body.id, text, broughtBy: ['Two buttons'] }]);
    const remove = async () =>
      call(home.house.creator, 'delete', `cautions/${worded.body.id as string}`, { version: 1 });
    const refused = await remove();
    expect(refused.status).toBe(403);
    expect(refused.body.detail).toContain('Two buttons');
    const empty = { version: 1, body: { text: ' ' } };
    expect((await call(home.house.creator, 'patch', `cautions/${worded.body.id as string}`, empty)).status).toBe(422);
    const twice = { body: { kind: 'small-parts', text: 'Other words.' } };
    expect((await call(home.house.creator, 'post', `patterns/${id}/cautions`, twice)).status).toBe(422);
  });

  test('one of the creator’s own is theirs to remove', async () => {
    const { id } = await buildPattern(home.server.db, { studio_id: home.house.studio.id });
    const own = await call(home.house.creator, 'post', `patterns/${id}/cautions`, {
      body: { text: 'Wash before use.' },
    });
    expect(await cautionsOf(id)).toMatchObject([{ kind: 'own', broughtBy: [] }]);
    const gone = await call(home.house.creator, 'delete', `cautions/${own.body.id as string}`, { version: 1 });
    expect(gone.status).toBe(204);
    expect(await cautionsOf(id)).toEqual([]);
  });
});
