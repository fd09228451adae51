import { randomUUID } from 'node:crypto';
import { describe, expect, test } from 'vitest';
import type { Draft, DraftLine, DraftPiece } from '#crochet';
import type { Pattern } from '#contract/patterns';
import { takeDraft } from '../../../api/features/patterns/take-draft.service.ts';
import { buildPattern, buildRecording } from '../../support/builders.ts';
import { settleIn } from './at-home.ts';

const home = settleIn();
const { call } = home;

const round = (n: number, text: string, said: number | null, startMs = n * 10_000): DraftLine => ({
  kind: 'round',
  label: `R${n}`,
  from: n,
  to: n,
  text,
  said: said === null ? null : { sts: [said] },
  startMs,
  endMs: startMs + 4_000,
  evidence: [
    {
      role: 'announcement',
      firstWord: n * 10,
      lastWord: n * 10 + 1,
      startMs,
      endMs: startMs + 900,
      words: `round ${n}`,
    },
    {
      role: 'work',
      firstWord: n * 10 + 2,
      lastWord: n * 10 + 6,
      startMs: startMs + 900,
      endMs: startMs + 3_000,
      words: text,
    },
  ],
  unread: null,
  confidence: 'sure',
  verdict: 'agrees',
  count: said,
  loops: 'both',
  units: [],
  topic: null,
});
const body = (...lines: DraftLine[]): DraftPiece => ({ name: 'Body', make: 1, worked: 'spiral', lines });
const draftOf = (pieces: DraftPiece[], suggestions: Draft['suggestions'] = []): Draft => ({
  terms: 'UK',
  termsReason: 'She says treble.',
  pieces,
  suggestions,
  corrections: [],
  notice: null,
});

/** A recording in the pattern with a transcript whose reading is this draft. */
async function read(
  patternId: string,
  draft: Draft,
  recordingId?: string,
): Promise<{ readingId: string; recordingId: string }> {
  const recording = recordingId ?? (await buildRecording(home.server.db, { pattern_id: patternId })).id;
  const numbers = await home.server.db('transcripts').where({ recording_id: recording }).pluck('number');
  const [transcript] = await home.server
    .db('transcripts')
    .insert({
      recording_id: recording,
      number: numbers.length + 1,
      file_name: 'a.srt',
      source_text: '',
      encoding: 'utf-8',
      format: 'srt',
    })
    .returning<{ id: string }[]>('id');
  const [reading] = await home.server
    .db('readings')
    .insert({ transcript_id: transcript!.id, engine_version: '1', terms: draft.terms, terms_reason: '', draft })
    .returning<{ id: string }[]>('id');
  return { readingId: reading!.id, recordingId: recording };
}
const take = (patternId: string, readingId: string, draft: Draft, personId: string | null = null) =>
  home.server.db.transaction((trx) =>
    takeDraft(trx, { id: randomUUID(), patternId, personId, at: home.server.clock.now() }, readingId, draft),
  );
const aPattern = async (over = {}) =>
  (await buildPattern(home.server.db, { studio_id: home.house.studio.id, ...over })).id;
const look = async (id: string) => (await call(home.house.creator, 'get', `patterns/${id}`)).body as Pattern;

describe('a first reading', () => {
  test('makes pieces and lines with their moments and the words they were heard in', async () => {
    const id = await aPattern({ state: 'reading' });
    const draft = draftOf([body(round(1, '6 sc in a magic ring', 6), round(2, 'inc around', 12))]);
    const { readingId, recordingId } = await read(id, draft);
    expect(await take(id, readingId, draft)).toEqual({ pieces: 1, lines: 2 });

    const pattern = await look(id);
    expect(pattern).toMatchObject({ state: 'drafting', terms: 'UK', mayUndo: false });
    expect(pattern.pieces).toMatchObject([{ name: 'Body', worked: 'spiral' }]);
    expect(pattern.lines).toMatchObject([
      { label: 'R1', text: '6 sc in a magic ring', said: { sts: [6] }, heardTotal: { sts: [6] } },
      { label: 'R2', text: 'inc around', said: { sts: [12] } },
    ]);
    expect(pattern.marks).toMatchObject([
      { lineId: pattern.lines[0]?.id, recordingId, startMs: 10_000, main: true, madeBy: 'reading' },
      { lineId: pattern.lines[1]?.id, recordingId, startMs: 20_000, main: true, madeBy: 'reading' },
    ]);
    expect(pattern.evidence.map(({ role, words }) => [role, words])).toEqual([
      ['announcement', 'round 1'],
      ['work', '6 sc in a magic ring'],
      ['announcement', 'round 2'],
      ['work', 'inc around'],
    ]);
  });

  test('lists what was named once, and a caution in the usual words unless a material brings it', async () => {
    const id = await aPattern();
    const draft = draftOf(
      [body(round(1, '6 sc in a magic ring', 6))],
      [
        { kind: 'hook', text: '3.5 mm hook', atMs: 1_000 },
        { kind: 'notion', text: 'Safety eyes, 9 mm', atMs: 2_000 },
        { kind: 'notion', text: 'safety eyes, 9 mm', atMs: 3_000 },
        { kind: 'notion', text: 'Toy stuffing', atMs: 4_000 },
        { kind: 'caution', text: 'careful, the eyes can come off: safety eyes', atMs: 5_000 },
        { kind: 'caution', text: 'mind the hot glue', atMs: 6_000 },
        { kind: 'gauge', text: '20 stitches to 10 cm', atMs: 7_000 },
      ],
    );
    await take(id, (await read(id, draft)).readingId, draft);
    const { materials, cautions, details } = await look(id);
    expect(materials.map(({ kind, name }) => [kind, name])).toEqual([
      ['hook', '3.5 mm hook'],
      ['notion', 'Safety eyes, 9 mm'],
      ['filling', 'Toy stuffing'],
    ]);
    expect(materials[0]?.details).toEqual({ heard: '3.5 mm hook', heardAtMs: 1_000 });
    expect(cautions.map(({ kind, broughtBy }) => [kind, broughtBy])).toEqual([
      ['small-parts', ['Safety eyes, 9 mm']],
      ['flame', []],
    ]);
    expect(details.gauge).toBe('20 stitches to 10 cm');
  });

  test('is the machine’s deed: nobody undoes it, and history says so', async () => {
    const id = await aPattern();
    const draft = draftOf([body(round(1, '6 sc in a magic ring', 6))]);
    await take(id, (await read(id, draft)).readingId, draft);
    expect((await call(home.house.creator, 'post', `patterns/${id}/undo`)).status).toBe(409);
    const { changes } = (await call(home.house.creator, 'get', `patterns/${id}/changes`)).body as {
      changes: { person: unknown }[];
    };
    expect(new Set(changes.map(({ person }) => person))).toEqual(new Set([null]));
  });
});

describe('a second reading of the same recording', () => {
  test('changes what no person has written, and nothing that one has', async () => {
    const id = await aPattern();
    const first = draftOf([body(round(1, '6 sc in a magic ring', 6), round(2, 'inc around', 12))]);
    const { readingId, recordingId } = await read(id, first);
    await take(id, readingId, first);
    const before = await look(id);
    const [one] = before.lines;
    await call(home.house.creator, 'patch', `lines/${one!.id}`, { version: 1, body: { text: '6 sc in ring (6)' } });

    const second = draftOf([body(round(1, '7 sc in a magic ring', 7, 11_000), round(2, '(sc, inc) ×3', 12, 22_000))]);
    const again = await read(id, second, recordingId);
    expect(await take(id, again.readingId, second)).toEqual({ pieces: 0, lines: 0 });
    const after = await look(id);
    expect(after.lines).toMatchObject([
      { id: one?.id, shortId: one?.shortId, text: '6 sc in ring (6)', said: { sts: [7] } },
      { id: before.lines[1]?.id, text: '(sc, inc) ×3' },
    ]);
    expect(after.marks.map(({ startMs }) => startMs)).toEqual([11_000, 22_000]);
    expect(after.evidence).toHaveLength(4);
  });

  test('puts what is new in its place, and does not bring back what a person took away', async () => {
    const id = await aPattern();
    const [r1, r2, r3, r4] = [round(1, 'a', 6), round(2, 'b', 12), round(3, 'c', 18), round(4, 'd', 24)];
    const first = draftOf([body(r1, r2, r4)]);
    const { readingId, recordingId } = await read(id, first);
    await take(id, readingId, first);
    const { lines } = await look(id);
    await call(home.house.creator, 'delete', `lines/${lines[1]!.id}`, { version: 1 });

    const second = draftOf([body(r1, r2, r3, r4)]);
    const again = await read(id, second, recordingId);
    expect(await take(id, again.readingId, second)).toEqual({ pieces: 0, lines: 1 });
    expect((await look(id)).lines.map(({ label }) => label)).toEqual(['R1', 'R3', 'R4']);
  });

  test('a moment that a person moved stays where they put it', async () => {
    const id = await aPattern();
    const draft = draftOf([body(round(1, 'a', 6))]);
    const { readingId, recordingId } = await read(id, draft);
    await take(id, readingId, draft);
    const [mark] = (await look(id)).marks;
    const moved = await call(home.house.creator, 'patch', `marks/${mark!.id}`, {
      version: 1,
      body: { startMs: 12_340 },
    });
    expect(moved.body.madeBy).toBe('person');
    const again = await read(id, draft, recordingId);
    await take(id, again.readingId, draft);
    expect((await look(id)).marks).toMatchObject([{ startMs: 12_340 }]);
  });
});

describe('another recording', () => {
  test('adds its own piece, and to a line that is there already only another moment', async () => {
    const id = await aPattern();
    const first = draftOf([body(round(1, 'a', 6))]);
    await take(id, (await read(id, first)).readingId, first);
    const second = draftOf([
      body(round(1, 'otherwise', 9, 2_000)),
      { ...body(round(1, 'e', 6)), name: 'Ear', make: 2 },
    ]);
    const { readingId, recordingId } = await read(id, second);
    expect(await take(id, readingId, second)).toEqual({ pieces: 1, lines: 1 });
    const pattern = await look(id);
    expect(pattern.pieces.map(({ name, make }) => [name, make])).toEqual([
      ['Body', 1],
      ['Ear', 2],
    ]);
    expect(pattern.lines[0]).toMatchObject({ text: 'a', said: { sts: [6] } });
    expect(pattern.marks).toContainEqual(
      expect.objectContaining({ lineId: pattern.lines[0]?.id, recordingId, startMs: 2_000, main: false }),
    );
    expect(pattern.recordings.map(({ number }) => number)).toEqual([1, 2]);
  });
});
