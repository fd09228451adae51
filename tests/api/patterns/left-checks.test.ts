import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import type { CheckList } from '#contract/checks';
import { buildApp, type TestApp } from '../../support/app.ts';
import { buildMouse, type MousePattern } from '../../support/mouse-pattern.ts';
import { talkTo } from './talk.ts';

let server: TestApp;
let mouse: MousePattern;
beforeAll(async () => {
  server = await buildApp();
});
afterAll(() => server.close());
beforeEach(async () => {
  mouse = await buildMouse(server.db);
});

const call = (...args: Parameters<ReturnType<typeof talkTo>>) => talkTo(server)(...args);
const readChecks = async () =>
  (await call(mouse.house.editor, 'get', `patterns/${mouse.patternId}/checks`)).body as unknown as CheckList;
const kinds = (list: readonly { kind: string }[]) => list.map(({ kind }) => kind);

/** Leaves the finding of this kind, as the bench does. */
async function leave(kind: string, reason: string) {
  const check = (await readChecks()).open.find((one) => one.kind === kind)!;
  const { subject, says } = check;
  const sent = await call(mouse.house.editor, 'post', `patterns/${mouse.patternId}/left-checks`, {
    body: { kind, subject, says, reason },
  });
  expect(sent.status).toBe(201);
}

test('the server finds what the bench finds', async () => {
  const { open, left } = await readChecks();
  expect(kinds(open)).toEqual(['material-missing', 'hook-missing', 'weight-missing', 'size-missing']);
  expect(left).toEqual([]);
});

test('a check that is left keeps its reason, and undo opens it again', async () => {
  await leave('hook-missing', 'Any hook that suits the yarn.');
  const after = await readChecks();
  expect(kinds(after.open)).not.toContain('hook-missing');
  expect(after.left).toMatchObject([{ kind: 'hook-missing', leftBecause: 'Any hook that suits the yarn.' }]);

  expect((await call(mouse.house.editor, 'post', `patterns/${mouse.patternId}/undo`)).status).toBe(200);
  expect(kinds((await readChecks()).open)).toContain('hook-missing');
});

test('it comes back when what it says has changed', async () => {
  await leave('material-missing', 'Scraps of yarn will do.');
  expect(kinds((await readChecks()).open)).not.toContain('material-missing');
  const body = { pieceId: await pieceOf(), kind: 'step', text: 'Top up with wadding.' };
  await call(mouse.house.creator, 'post', `patterns/${mouse.patternId}/lines`, { body });
  expect(kinds((await readChecks()).open)).toContain('material-missing');
});

const pieceOf = async () =>
  (await server.db('pieces').where({ pattern_id: mouse.patternId }).first<{ id: string }>('id')).id;

test('whoever publishes reads the same list, and none of it holds the edition back', async () => {
  await leave('hook-missing', 'Any hook that suits the yarn.');
  const desk = await call(mouse.house.creator, 'get', `patterns/${mouse.patternId}/next-edition`);
  const { checks, blocks } = desk.body as { checks: { kind: string }[]; blocks: unknown[] };
  expect(kinds(checks)).toEqual(kinds((await readChecks()).open));
  expect(kinds(checks)).not.toContain('hook-missing');
  expect(blocks).toEqual([]);
});

test.each([
  ['without a reason', { kind: 'hook-missing', says: '0123456789abcdef', reason: ' ' }],
  ['of a kind that there is not', { kind: 'moon', says: '0123456789abcdef', reason: 'So.' }],
  ['that says nothing', { kind: 'hook-missing', says: '', reason: 'So.' }],
])('a check %s is not left', async (_what, body) => {
  const sent = await call(mouse.house.editor, 'post', `patterns/${mouse.patternId}/left-checks`, { body });
  expect(sent.status).toBe(422);
  expect(await server.db('left_checks').where({ pattern_id: mouse.patternId })).toEqual([]);
});
