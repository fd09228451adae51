import request from 'supertest';
import { describe, expect, test } from 'vitest';
import type { HeldAgainst, NewCut } from '#contract/held';
import type { Pattern } from '#contract/patterns';
import { buildLine, buildMark, buildPattern, buildPiece, buildRecording } from '../../support/builders.ts';
import { settleIn } from './at-home.ts';

const home = settleIn();
const { call } = home;

const clock = (ms: number) => new Date(ms).toISOString().slice(11, 23);
const vtt = (cues: readonly (readonly [startMs: number, text: string])[]) =>
  `WEBVTT\n\n${cues.map(([at, text]) => `${clock(at)} --> ${clock(at + 5_000)}\n${text}\n`).join('\n')}`;

const TALK = [
  [1_000, 'Hello and welcome, today we are making a small bell for the window.'],
  [10_000, 'Round one. Six single crochet in a magic ring. That is six.'],
  [20_000, 'Round two. Increase in every stitch around, so twelve.'],
  [30_000, 'Round three. Two single, then an increase, four times. That makes sixteen.'],
  [40_000, 'Round four. One single crochet in every stitch around. Still eighteen.'],
  [50_000, 'Round six. One single and a decrease, six times. Twelve stitches.'],
] as const;

async function send(recordingId: string, cues: readonly (readonly [number, string])[]) {
  const sent = await request(home.server.app)
    .post(`/api/recordings/${recordingId}/transcripts`)
    .set(await home.server.as(home.house.creator))
    .attach('file', Buffer.from(vtt(cues)), { filename: 'bell.vtt', contentType: 'text/vtt' });
  expect(sent.status).toBe(201);
  await home.server.workAll();
  return (sent.body as { id: string }).id;
}

/** A bell that was written before it was filmed. */
async function aBell() {
  const pattern = await buildPattern(home.server.db, { studio_id: home.house.studio.id });
  const piece = await buildPiece(home.server.db, { pattern_id: pattern.id, name: 'Bell' });
  const texts = [
    '6 sc in magic ring (6)',
    'inc × 6 (12)',
    '(sc, inc) × 6 (18)',
    'sc around (18)',
    '(2 sc, inc) × 6 (24)',
  ];
  const lines: string[] = [];
  for (const text of texts) lines.push((await buildLine(home.server.db, { piece_id: piece.id, text })).id);
  const recording = await buildRecording(home.server.db, { pattern_id: pattern.id });
  const at = `patterns/${pattern.id}/recordings/${recording.id}`;
  return { patternId: pattern.id, recordingId: recording.id, lines, at };
}
const look = async (id: string) => (await call(home.house.creator, 'get', `patterns/${id}`)).body as Pattern;
const heldAt = async (at: string) => (await call(home.house.creator, 'get', `${at}/held`)).body as HeldAgainst;
const cutAt = async (at: string) => (await call(home.house.creator, 'get', `${at}/cut`)).body as NewCut;

describe('a pattern that was written before its recording came', () => {
  test('is held against it both ways: as written, said otherwise, never said, not written', async () => {
    const bell = await aBell();
    expect((await heldAt(bell.at)).readingId).toBeNull();
    await send(bell.recordingId, TALK);
    const held = await heldAt(bell.at);
    expect(held.pieces[0]!.lines.map(({ name, state, unlike }) => [name, state, unlike])).toEqual([
      ['R1', 'as-written', []],
      ['R2', 'as-written', []],
      ['R3', 'differently', ['instruction', 'total']],
      ['R4', 'as-written', []],
      ['R6', 'not-written', []],
      ['R5', 'never-said', []],
    ]);
    const third = held.pieces[0]!.lines[2]!;
    expect(third.said).toMatchObject({
      total: { sts: [16] },
      name: 'R3',
      words: expect.stringContaining('four times'),
    });
    expect(third.written).toMatchObject({ text: '(sc, inc) × 6 (18)', total: { sts: [18] }, count: 18 });
  });

  test('takes moments, words and said totals as one step, changes nothing written, and gives it all back in one', async () => {
    const bell = await aBell();
    await send(bell.recordingId, TALK);
    const { lastChange } = await heldAt(bell.at);
    const taken = await call(home.house.editor, 'post', `${bell.at}/held`, { body: { lastChange } });
    expect([taken.status, taken.body.taken]).toEqual([200, 4]);
    const after = await look(bell.patternId);
    expect(after.lines.map(({ text, said }) => [text, said?.sts?.[0] ?? null])).toEqual([
      ['6 sc in magic ring (6)', 6],
      ['inc × 6 (12)', 12],
      ['(sc, inc) × 6 (18)', 16],
      ['sc around (18)', 18],
      ['(2 sc, inc) × 6 (24)', null],
    ]);
    expect(after.marks.map(({ lineId, startMs }) => [lineId, Math.round(startMs / 10_000)])).toEqual(
      bell.lines.slice(0, 4).map((id, i) => [id, i + 1]),
    );
    expect(new Set(after.evidence.map(({ lineId }) => lineId)).size).toBe(4);
    expect((await heldAt(bell.at)).pieces[0]!.lines.filter(({ isTaken }) => isTaken)).toHaveLength(4);

    expect((await call(home.house.editor, 'post', `patterns/${bell.patternId}/undo`)).status).toBe(200);
    const before = await look(bell.patternId);
    expect([before.marks, before.evidence]).toEqual([[], []]);
    expect(before.lines.every(({ said }) => said === null)).toBe(true);
  });

  test('takes one line alone, and nothing of a pattern that somebody changed meanwhile', async () => {
    const bell = await aBell();
    await send(bell.recordingId, TALK);
    const { lastChange } = await heldAt(bell.at);
    const body = { lastChange, lineIds: [bell.lines[1]!] };
    expect((await call(home.house.creator, 'post', `${bell.at}/held`, { body })).body.taken).toBe(1);
    expect((await look(bell.patternId)).marks.map(({ lineId }) => lineId)).toEqual([bell.lines[1]]);
    expect((await call(home.house.creator, 'post', `${bell.at}/held`, { body })).status).toBe(412);
  });

  test('a line that is not to be filmed is not missed', async () => {
    const bell = await aBell();
    await send(bell.recordingId, TALK);
    const [last] = (await heldAt(bell.at)).pieces[0]!.lines.slice(-1);
    await call(home.house.creator, 'patch', `lines/${last!.lineId!}`, {
      version: last!.version,
      body: { filmed: false },
    });
    expect((await heldAt(bell.at)).pieces[0]!.lines.at(-1)!.state).toBe('not-filmed');
  });
});

describe('a new cut of a recording', () => {
  /** The bell with a moment at each sentence, then a cut without the greeting, with a pause, and without round four. */
  async function cutAnew() {
    const bell = await aBell();
    const marks: string[] = [];
    await send(bell.recordingId, TALK);
    for (const [i, startMs] of [10_000, 20_000, 30_000, 40_000].entries()) {
      const of = { pattern_id: bell.patternId, recording_id: bell.recordingId, line_id: bell.lines[i] };
      marks.push((await buildMark(home.server.db, { ...of, start_ms: startMs })).id);
    }
    const newer = [
      [3_000, TALK[1][1]],
      [13_000, TALK[2][1]],
      [40_000, TALK[3][1]],
      [55_000, TALK[5][1]],
    ] as const;
    await send(bell.recordingId, newer);
    return { ...bell, marks };
  }
  const momentsOf = async (id: string) => (await look(id)).marks.map(({ startMs }) => startMs);

  test('tells how far each part moved and what was cut out, takes it as one step, and gives it back', async () => {
    const bell = await cutAnew();
    const cut = await cutAt(bell.at);
    expect(cut.parts).toHaveLength(1);
    expect(cut.parts[0]!.shifts.map(({ byMs }) => byMs)).toEqual([-7_000, 10_000, 5_000]);
    expect(cut.parts[0]!.moments.map(({ name, isMs, wouldMs }) => [name, isMs, wouldMs])).toEqual([
      ['R1', 10_000, 3_000],
      ['R2', 20_000, 13_000],
      ['R3', 30_000, 40_000],
      ['R4', 40_000, null],
    ]);
    const body = { how: 'words', lastChange: cut.lastChange, removeCutOut: true };
    const taken = await call(home.house.creator, 'post', `${bell.at}/cut`, { body });
    expect([taken.status, taken.body.taken]).toEqual([200, 4]);
    expect(await momentsOf(bell.patternId)).toEqual([3_000, 13_000, 40_000]);
    expect((await cutAt(bell.at)).parts).toEqual([]);
    await call(home.house.creator, 'post', `patterns/${bell.patternId}/undo`);
    expect(await momentsOf(bell.patternId)).toEqual([10_000, 20_000, 30_000, 40_000]);
    expect((await cutAt(bell.at)).parts).toHaveLength(1);
  });

  test('moves by an offset that was typed, from a moment on, and never before the start', async () => {
    const bell = await cutAnew();
    const { lastChange } = await cutAt(bell.at);
    const body = { how: 'hand', lastChange, byMs: -12_500, fromMs: 15_000 };
    expect((await call(home.house.creator, 'post', `${bell.at}/cut`, { body })).body.taken).toBe(3);
    expect(await momentsOf(bell.patternId)).toEqual([7_500, 10_000, 17_500, 27_500]);
    const again = { how: 'hand', lastChange: (await cutAt(bell.at)).lastChange, byMs: -8_000, fromMs: 0 };
    await call(home.house.creator, 'post', `${bell.at}/cut`, { body: again });
    expect((await momentsOf(bell.patternId))[0]).toBe(0);
  });

  test('is not told again once somebody says that the moments stand right', async () => {
    const bell = await cutAnew();
    const body = { how: 'stand', lastChange: (await cutAt(bell.at)).lastChange };
    expect((await call(home.house.creator, 'post', `${bell.at}/cut`, { body })).body.taken).toBe(4);
    expect(await momentsOf(bell.patternId)).toEqual([10_000, 20_000, 30_000, 40_000]);
    expect((await cutAt(bell.at)).parts).toEqual([]);
  });

  test('part two only adds: the moments of part one stay its own', async () => {
    const bell = await aBell();
    await send(bell.recordingId, TALK.slice(0, 3));
    const two = await buildRecording(home.server.db, { pattern_id: bell.patternId });
    await send(two.id, TALK.slice(3));
    for (const id of [bell.recordingId, two.id]) {
      const at = `patterns/${bell.patternId}/recordings/${id}`;
      const { lastChange } = await heldAt(at);
      await call(home.house.creator, 'post', `${at}/held`, { body: { lastChange } });
    }
    const { marks } = await look(bell.patternId);
    const of = (lineId: string | undefined) => marks.filter((mark) => mark.lineId === lineId).map((m) => m.recordingId);
    expect(bell.lines.slice(0, 4).map(of)).toEqual([[bell.recordingId], [bell.recordingId], [two.id], [two.id]]);
    expect((await heldAt(bell.at)).pieces[0]!.recordings).toEqual([1, 2]);
  });
});
