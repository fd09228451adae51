import { randomUUID } from 'node:crypto';
import { describe, expect, test } from 'vitest';
import { buildHouse, buildPattern } from '../../support/builders.ts';
import { settleIn } from './at-home.ts';

const home = settleIn();
const { call } = home;

interface Who {
  readonly id: string;
}

const aPattern = async () => (await buildPattern(home.server.db, { studio_id: home.house.studio.id })).id;
const addPiece = async (who: Who, pattern: string, name = 'Body') =>
  (await call(who, 'post', `patterns/${pattern}/pieces`, { body: { name } })).body as { id: string };
const addLine = async (who: Who, pattern: string, pieceId: string, text: string, deed?: string) =>
  (
    await call(who, 'post', `patterns/${pattern}/lines`, {
      body: { pieceId, kind: 'round', text },
      ...(deed && { deed }),
    })
  ).body as { id: string };
const textOf = async (pattern: string) =>
  ((await call(home.house.creator, 'get', `patterns/${pattern}`)).body.lines as { text: string }[]).map(
    ({ text }) => text,
  );
const undo = (who: Who, pattern: string) => call(who, 'post', `patterns/${pattern}/undo`);
const redo = (who: Who, pattern: string) => call(who, 'post', `patterns/${pattern}/redo`);

describe('undo and redo', () => {
  test('steps go back one by one and come again in the same order', async () => {
    const pattern = await aPattern();
    const piece = await addPiece(home.house.creator, pattern);
    const line = await addLine(home.house.creator, pattern, piece.id, 'one');
    await call(home.house.creator, 'patch', `lines/${line.id}`, { version: 1, body: { text: 'two' } });
    await call(home.house.creator, 'patch', `lines/${line.id}`, { version: 2, body: { text: 'three' } });

    const seen = [];
    for (const step of [undo, undo, redo, undo, undo, redo, redo, redo]) {
      expect((await step(home.house.creator, pattern)).status).toBe(200);
      seen.push(await textOf(pattern));
    }
    expect(seen).toEqual([['two'], ['one'], ['two'], ['one'], [], ['one'], ['two'], ['three']]);
    expect((await redo(home.house.creator, pattern)).status).toBe(409);
  });

  test('what was done after an undo leaves nothing to redo', async () => {
    const pattern = await aPattern();
    const piece = await addPiece(home.house.creator, pattern);
    const line = await addLine(home.house.creator, pattern, piece.id, 'one');
    await call(home.house.creator, 'patch', `lines/${line.id}`, { version: 1, body: { text: 'two' } });
    await undo(home.house.creator, pattern);
    await call(home.house.creator, 'patch', `lines/${line.id}`, { version: 3, body: { note: 'new' } });
    expect((await redo(home.house.creator, pattern)).status).toBe(409);
    expect(await textOf(pattern)).toEqual(['one']);
  });

  test('several changes in one deed go back together', async () => {
    const pattern = await aPattern();
    const piece = await addPiece(home.house.creator, pattern);
    const deed = randomUUID();
    for (const text of ['one', 'two', 'three']) await addLine(home.house.creator, pattern, piece.id, text, deed);
    const answer = await undo(home.house.creator, pattern);
    expect(answer.body).toMatchObject({ undoesDeedId: deed });
    expect(answer.body.rows).toHaveLength(3);
    expect(await textOf(pattern)).toEqual([]);
  });

  test('everybody undoes their own: the other’s last step stays', async () => {
    const pattern = await aPattern();
    const piece = await addPiece(home.house.creator, pattern);
    await addLine(home.house.creator, pattern, piece.id, 'mine');
    await addLine(home.house.editor, pattern, piece.id, 'theirs');
    await undo(home.house.creator, pattern);
    expect(await textOf(pattern)).toEqual(['theirs']);
  });

  test('where somebody else has changed the same row since, it is refused with their name and nothing changes', async () => {
    const pattern = await aPattern();
    const piece = await addPiece(home.house.creator, pattern);
    const line = await addLine(home.house.creator, pattern, piece.id, 'one');
    await call(home.house.creator, 'patch', `lines/${line.id}`, { version: 1, body: { text: 'two' } });
    await call(home.house.editor, 'patch', `lines/${line.id}`, { version: 2, body: { note: 'firmly' } });
    const refused = await undo(home.house.creator, pattern);
    expect(refused.status).toBe(409);
    expect(refused.body.detail).toContain(home.house.editor.name);
    expect(await textOf(pattern)).toEqual(['two']);
  });

  test('a piece into which somebody put a line is not undone from under it', async () => {
    const pattern = await aPattern();
    const piece = await addPiece(home.house.creator, pattern);
    await addLine(home.house.editor, pattern, piece.id, 'theirs');
    expect((await undo(home.house.creator, pattern)).status).toBe(409);
    expect(await textOf(pattern)).toEqual(['theirs']);
  });

  test('a line taken away comes back to its place with its short id, also past one put there meanwhile', async () => {
    const pattern = await aPattern();
    const piece = await addPiece(home.house.creator, pattern);
    const [a, b, c] = [
      await addLine(home.house.creator, pattern, piece.id, 'a'),
      await addLine(home.house.creator, pattern, piece.id, 'b'),
      await addLine(home.house.creator, pattern, piece.id, 'c'),
    ];
    const before = (await home.server.db('lines').where({ id: b.id }).first()).short_id;
    await call(home.house.creator, 'delete', `lines/${b.id}`, { version: 1 });
    await call(home.house.editor, 'post', `patterns/${pattern}/lines`, {
      body: { pieceId: piece.id, kind: 'round', text: 'x', after: a.id },
    });
    await undo(home.house.creator, pattern);
    const lines = (await call(home.house.creator, 'get', `patterns/${pattern}`)).body.lines as {
      id: string;
      shortId: string;
    }[];
    expect(lines).toHaveLength(4);
    expect(lines.map(({ id }) => id).filter((id) => [a.id, b.id, c.id].includes(id))).toEqual([a.id, b.id, c.id]);
    expect(lines.find(({ id }) => id === b.id)?.shortId).toBe(before);
  });

  test('a move taken back never shares a place with what was put there meanwhile', async () => {
    const pattern = await aPattern();
    const piece = await addPiece(home.house.creator, pattern);
    const lines = [];
    for (const text of ['a', 'b', 'c']) lines.push(await addLine(home.house.creator, pattern, piece.id, text));
    await call(home.house.creator, 'patch', `lines/${lines[1]!.id}`, { version: 1, body: { after: lines[2]!.id } });
    await call(home.house.editor, 'post', `patterns/${pattern}/lines`, {
      body: { pieceId: piece.id, kind: 'round', text: 'x', after: lines[0]!.id },
    });
    expect((await undo(home.house.creator, pattern)).status).toBe(200);
    const keys = await home.server.db('lines').where({ piece_id: piece.id }).whereNull('deleted_at').pluck('order_key');
    expect(new Set(keys).size).toBe(4);
    expect(await textOf(pattern)).toEqual(['a', 'x', 'b', 'c']);
  });

  test('undo is not for binning and archiving: those have ways back of their own', async () => {
    const pattern = await aPattern();
    await call(home.house.creator, 'post', `patterns/${pattern}/archive`, { version: 1 });
    expect((await undo(home.house.creator, pattern)).status).toBe(409);
    expect((await home.server.db('patterns').where({ id: pattern }).first()).archived_at).not.toBeNull();
  });

  test('two tabs that undo at once take back two steps, never one twice', async () => {
    const pattern = await aPattern();
    const piece = await addPiece(home.house.creator, pattern);
    for (const text of ['a', 'b', 'c']) await addLine(home.house.creator, pattern, piece.id, text);
    const answers = await Promise.all([undo(home.house.creator, pattern), undo(home.house.creator, pattern)]);
    expect(answers.map((a) => a.status)).toEqual([200, 200]);
    expect(await textOf(pattern)).toEqual(['a']);
  });

  test('the bench says whether there is something to take back', async () => {
    const pattern = await aPattern();
    const look = async () => {
      const { mayUndo, mayRedo } = (await call(home.house.creator, 'get', `patterns/${pattern}`)).body as Record<
        string,
        boolean
      >;
      return [mayUndo, mayRedo];
    };
    expect(await look()).toEqual([false, false]);
    await addPiece(home.house.creator, pattern);
    expect(await look()).toEqual([true, false]);
    await undo(home.house.creator, pattern);
    expect(await look()).toEqual([false, true]);
  });
});

describe('history', () => {
  test('tells who did what, newest first, in pages', async () => {
    const pattern = await aPattern();
    const piece = await addPiece(home.house.creator, pattern);
    await addLine(home.house.editor, pattern, piece.id, 'one');
    const first = await call(home.house.editor, 'get', `patterns/${pattern}/changes?limit=1`);
    expect(first.body).toMatchObject({
      more: true,
      changes: [{ entity: 'line', before: null, after: { text: 'one' }, person: { name: home.house.editor.name } }],
    });
    const id = first.body.changes[0].id as number;
    const rest = await call(home.house.editor, 'get', `patterns/${pattern}/changes?before=${id}`);
    expect(rest.body).toMatchObject({
      more: false,
      changes: [{ entity: 'piece', person: { id: home.house.creator.id } }],
    });
  });

  test('a line from the start shows every step with the whole line as it left it', async () => {
    const pattern = await aPattern();
    const piece = await addPiece(home.house.creator, pattern);
    const line = await addLine(home.house.creator, pattern, piece.id, 'one');
    await call(home.house.editor, 'patch', `lines/${line.id}`, { version: 1, body: { note: 'firmly' } });
    await call(home.house.creator, 'patch', `lines/${line.id}`, { version: 2, body: { text: 'two' } });
    await undo(home.house.creator, pattern);
    const { changes } = (await call(home.house.creator, 'get', `patterns/${pattern}/changes?entityId=${line.id}`))
      .body as {
      changes: { row: { text: string; note: string }; undoesDeedId: string | null }[];
    };
    expect(changes.map(({ row }) => [row.text, row.note])).toEqual([
      ['one', 'firmly'],
      ['two', 'firmly'],
      ['one', 'firmly'],
      ['one', ''],
    ]);
    expect(changes[0]?.undoesDeedId).not.toBeNull();
  });

  test('is not for strangers', async () => {
    const pattern = await aPattern();
    const { owner } = await buildHouse(home.server.db);
    expect((await call(owner, 'get', `patterns/${pattern}/changes`)).status).toBe(404);
    expect((await undo(owner, pattern)).status).toBe(404);
  });
});
