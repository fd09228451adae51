import request from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type { CaptionCorrections, ReadingDifferences } from '#contract/readings';
import type { Pattern } from '#contract/patterns';
import type { RecordingList } from '#contract/recordings';
import { buildApp, type TestApp } from '../support/app.ts';
import { buildHouse, buildPattern, buildRecording, type Household } from '../support/builders.ts';
import { talkTo, type Sent } from './patterns/talk.ts';

interface Caption {
  readonly at: number;
  readonly says: string;
}
const caption = (at: number, says: string): Caption => ({ at, says });

/** Captions four seconds long, all of them later by so many seconds. */
const srt = (captions: readonly Caption[], later = 0) => {
  const time = (s: number) =>
    `00:${String(Math.floor(s / 60)).padStart(2, '0')}:${String(s % 60).padStart(2, '0')},000`;
  return captions
    .map(({ at, says }, n) => `${n + 1}\n${time(at + later)} --> ${time(at + later + 4)}\n${says}\n`)
    .join('\n');
};

const PEAR = [
  caption(1, 'Let us make the body of a small pear.'),
  caption(10, 'Round one. Six single crochet in a magic ring. That is six.'),
  caption(20, 'Round two is an increase in every stitch, twelve.'),
  caption(30, 'Round three: one single, then an increase, six times. Eighteen stitches.'),
  caption(40, 'And that is all of the body. Next comes the leaf.'),
  caption(45, 'Round one. Five single crotchet in a magic ring. That is five.'),
];
const instead = (at: number, says: string) => PEAR.map((one) => (one.at === at ? caption(at, says) : one));

let at: TestApp;
let house: Household;
beforeAll(async () => {
  at = await buildApp();
  house = await buildHouse(at.db);
});
beforeEach(() => at.clock.advance(61_000));
afterAll(() => at.close());

const call = (method: 'get' | 'post' | 'patch' | 'delete', path: string, sent: Sent = {}) =>
  talkTo(at)(house.creator, method, path, sent);

async function send(recordingId: string, text: string): Promise<string> {
  at.clock.advance(3_000);
  const res = await request(at.app)
    .post(`/api/recordings/${recordingId}/transcripts`)
    .set(await at.as(house.creator))
    .attach('file', Buffer.from(text), { filename: 'pear.srt', contentType: 'text/plain' });
  expect(res.status).toBe(201);
  return (res.body as { id: string }).id;
}

/** A pattern drafted from a transcript. */
async function setOut(captions: readonly Caption[] = PEAR) {
  const { id } = await buildPattern(at.db, { studio_id: house.studio.id });
  const recording = await buildRecording(at.db, { pattern_id: id });
  return { id, recordingId: recording.id, transcriptId: await send(recording.id, srt(captions)) };
}
const look = async (id: string) => (await call('get', `patterns/${id}`)).body as Pattern;
const summary = async (id: string) =>
  ((await call('get', `patterns/${id}/recordings`)).body as RecordingList).recordings[0]!.transcript!.reading.summary!;
async function differences(id: string) {
  const url = `patterns/${id}/readings/${(await summary(id)).id}`;
  return { url, told: (await call('get', `${url}/differences`)).body as ReadingDifferences };
}
const lineOf = (pattern: Pattern, label: string, piece = 0) =>
  pattern.lines.find((one) => one.label === label && one.pieceId === pattern.pieces[piece]?.id)!;
const shown = ({ pieces, gone }: ReadingDifferences) => [
  ...pieces.flatMap(({ lines }) =>
    lines.map(({ change, touched, is, would }) => [change, touched, is?.text ?? null, would?.text ?? null]),
  ),
  ...gone.map(({ change, touched, is }) => [change, touched, is?.text ?? null, null]),
];

describe('a draft', () => {
  test('is summed up with a ring map a piece, what was said of materials and what was mis-heard', async () => {
    const { id } = await setOut();
    const told = await summary(id);
    expect(told).toMatchObject({ taken: true, corrections: 1, termsReason: expect.any(String) as string });
    expect(told.pieces.map(({ rings }) => rings.map(({ label, counts }) => [label, counts]))).toEqual([
      [
        ['1', [6]],
        ['2', [12]],
        ['3', [18]],
      ],
      [['1', [5]]],
    ]);
  });

  test('whose pieces were left out is taken again piece by piece, each one step back', async () => {
    const { id } = await setOut();
    const { pieces } = await look(id);
    for (const piece of pieces) await call('delete', `pieces/${piece.id}`, { version: piece.version });
    const { url, told } = await differences(id);
    expect(told.pieces.map(({ piece, lines }) => [piece, lines.length])).toEqual([
      [null, 3],
      [null, 1],
    ]);

    await call('post', `${url}/take`, { body: { pieces: [1], lastChange: told.lastChange } });
    expect((await look(id)).lines.map(({ text }) => text)).toEqual(['5 sc in magic ring']);
    const after = (await differences(id)).told;
    expect(after.pieces.map(({ piece, lines }) => [piece !== null, lines.length])).toEqual([
      [false, 3],
      [true, 0],
    ]);
    await call('post', `patterns/${id}/undo`);
    expect((await look(id)).pieces).toEqual([]);
    await call('post', `${url}/take`, { body: {} });
    const again = await look(id);
    expect([again.pieces.length, again.lines.length, again.evidence.length > 0]).toEqual([2, 4, true]);
  });
});

describe('reading again', () => {
  test('shows line by line what would change with its count, and takes what was chosen in one step', async () => {
    const { id, recordingId } = await setOut();
    const before = await look(id);
    await send(
      recordingId,
      srt(instead(30, 'Round three: two single, then an increase, four times. Sixteen stitches.')),
    );
    const { url, told } = await differences(id);
    expect(shown(told)).toEqual([['changed', false, '(sc, inc) × 6', '(2 sc, inc) × 4']]);
    const [line] = told.pieces[0]!.lines;
    expect([line?.is, line?.would]).toMatchObject([
      { said: { sts: [18] }, count: 18, verdict: 'agrees' },
      { said: { sts: [16] }, count: 16, verdict: 'agrees' },
    ]);

    await call('post', `${url}/take`, { body: { lines: [line!.key], lastChange: told.lastChange } });
    const after = await look(id);
    expect(lineOf(after, 'R3')).toMatchObject({ text: '(2 sc, inc) × 4', said: { sts: [16] } });
    expect(after.evidence.find(({ words }) => words.includes('two single'))).toBeDefined();
    await call('post', `patterns/${id}/undo`);
    const back = await look(id);
    expect(back.lines.map(({ text, said }) => [text, said])).toEqual(
      before.lines.map(({ text, said }) => [text, said]),
    );
    expect(back.evidence).toEqual(before.evidence);
    expect(back.marks.map(({ startMs }) => startMs)).toEqual(before.marks.map(({ startMs }) => startMs));
  });

  test('says whose line a person wrote, and never takes it unasked', async () => {
    const { id, recordingId } = await setOut();
    const mine = lineOf(await look(id), 'R3');
    await call('patch', `lines/${mine.id}`, { version: mine.version, body: { text: '(sc, inc) around' } });
    await send(
      recordingId,
      srt(instead(30, 'Round three: two single, then an increase, four times. Sixteen stitches.')),
    );
    const { url, told } = await differences(id);
    expect(shown(told)).toEqual([['changed', true, '(sc, inc) around', '(2 sc, inc) × 4']]);
    await call('post', `${url}/take`, { body: {} });
    expect(lineOf(await look(id), 'R3').text).toBe('(sc, inc) around');
    await call('post', `${url}/take`, { body: { lines: [told.pieces[0]!.lines[0]!.key] } });
    expect(lineOf(await look(id), 'R3').text).toBe('(2 sc, inc) × 4');
  });

  test('shows lines that are new, gone, or were deleted by somebody; only those that were chosen come and go', async () => {
    const { id, recordingId } = await setOut();
    const two = lineOf(await look(id), 'R2');
    await call('delete', `lines/${two.id}`, { version: two.version });
    const more = [
      ...PEAR.slice(0, 3),
      caption(34, 'Round four. One single crochet in every stitch. Eighteen.'),
      ...PEAR.slice(4),
    ];
    await send(recordingId, srt(more));
    const { url, told } = await differences(id);
    expect(shown(told).map(([change]) => change)).toEqual(['taken-away', 'new', 'gone']);
    const keys = [...told.pieces.flatMap(({ lines }) => lines), ...told.gone].map(({ key }) => key);
    await call('post', `${url}/take`, { body: {} });
    expect((await look(id)).lines.map(({ label }) => label)).toEqual(['R1', 'R4', 'R3', 'R1']);
    await call('post', `patterns/${id}/undo`);
    await call('post', `${url}/take`, { body: { lines: keys } });
    expect((await look(id)).lines.map(({ label }) => label)).toEqual(['R1', 'R2', 'R4', 'R1']);
  });

  test('is refused where the pattern has changed since its differences were told', async () => {
    const { id } = await setOut();
    const { url, told } = await differences(id);
    const mine = lineOf(await look(id), 'R3');
    await call('patch', `lines/${mine.id}`, { version: mine.version, body: { note: 'Loosely.' } });
    expect((await call('post', `${url}/take`, { body: { lastChange: told.lastChange } })).status).toBe(412);
  });

  test('finds a piece that somebody renamed, and leaves its name alone', async () => {
    const { id, transcriptId } = await setOut();
    const [piece] = (await look(id)).pieces;
    await call('patch', `pieces/${piece!.id}`, { version: piece!.version, body: { name: 'Fruit' } });
    await call('post', `transcripts/${transcriptId}/readings`);
    const { told } = await differences(id);
    expect(told.pieces[0]).toMatchObject({ piece: { name: 'Fruit' }, same: 3, lines: [] });
    expect(shown(told)).toEqual([]);
  });

  test('in terms that a person overruled, reads the same words as other stitches until they are inferred again', async () => {
    const { id, transcriptId } = await setOut();
    const again = await call('post', `transcripts/${transcriptId}/readings`, { body: { terms: 'UK' } });
    expect(again.body.reading.summary).toMatchObject({ terms: 'UK', termsReason: 'Chosen by hand.' });
    expect((await look(id)).recordings[0]?.spokenTerms).toBe('UK');
    const inferred = await call('post', `transcripts/${transcriptId}/readings`, { body: { terms: null } });
    expect(inferred.body.reading.summary).toMatchObject({ terms: 'US' });
    expect(shown((await differences(id)).told)).toEqual([]);
  });
});

describe('a better transcript whose times have shifted', () => {
  test('takes the moments along, also those that a person set, and gives them back in one step', async () => {
    const { id, recordingId } = await setOut();
    const before = await look(id);
    const mark = before.marks.find(({ lineId }) => lineId === lineOf(before, 'R2').id)!;
    await call('patch', `marks/${mark.id}`, { version: mark.version, body: { startMs: 20_500 } });
    await send(recordingId, srt(PEAR, 7));
    const { url, told } = await differences(id);
    expect(told.moments).toMatchObject([{ markId: mark.id, isMs: 20_500, wouldMs: 27_500 }]);
    await call('post', `${url}/take`, { body: {} });
    const moved = (await look(id)).marks.find((one) => one.id === mark.id);
    expect(moved).toMatchObject({ startMs: 27_500, madeBy: 'person' });
    expect((await differences(id)).told.moments).toEqual([]);
    await call('post', `patterns/${id}/undo`);
    expect((await look(id)).marks.find((one) => one.id === mark.id)?.startMs).toBe(20_500);
    expect((await differences(id)).told.moments).toHaveLength(1);
  });
});

describe('words that somebody chose', () => {
  const HEARD = { firstWord: 32, lastWord: 40 };

  test('become a line at its place in time, with their moment and as its evidence, in one step', async () => {
    const { id, transcriptId } = await setOut([
      ...PEAR.slice(0, 3),
      caption(25, 'And then a single with an increase after it six times over'),
      ...PEAR.slice(4),
    ]);
    const before = await look(id);
    const words = { transcriptId, firstWord: 33, lastWord: 41, as: 'line' };
    const made = await call('post', `patterns/${id}/heard-words`, { body: words });
    expect(made.status).toBe(201);
    const after = await look(id);
    expect(lineOf(after, 'R3')).toMatchObject({ id: made.body.id, kind: 'round', from: 3, text: '(sc, inc) × 6' });
    expect(after.lines.map(({ label }) => label)).toEqual(['R1', 'R2', 'R3', 'R1']);
    expect(after.evidence.find(({ lineId }) => lineId === made.body.id)).toMatchObject({ firstWord: 33, lastWord: 41 });
    expect(after.marks.find(({ lineId }) => lineId === made.body.id)?.startMs).toBeGreaterThan(24_999);
    await call('post', `patterns/${id}/undo`);
    expect((await look(id)).lines).toEqual(before.lines);
  });

  test('are what a line is read as from now on, and no later reading writes over it', async () => {
    const { id, transcriptId } = await setOut();
    const line = lineOf(await look(id), 'R2');
    const read = await call('post', `patterns/${id}/heard-words`, {
      body: { transcriptId, ...HEARD, as: 'again', lineId: line.id },
    });
    const after = await look(id);
    expect(after.lines.find((one) => one.id === line.id)?.text).toBe(read.body.text);
    expect(after.evidence.filter(({ lineId }) => lineId === line.id)).toMatchObject([HEARD]);
    const { url, told } = await differences(id);
    expect(told.pieces[0]?.lines[0]).toMatchObject({ change: 'changed', touched: true });
    await call('post', `${url}/take`, { body: {} });
    expect((await look(id)).lines.find((one) => one.id === line.id)?.text).toBe(read.body.text);
  });

  test('give a line its total, or are refused where there is none in them', async () => {
    const { id, transcriptId } = await setOut();
    const line = lineOf(await look(id), 'R2');
    const total = { transcriptId, as: 'total', lineId: line.id };
    const ask = (firstWord: number, lastWord: number) =>
      call('post', `patterns/${id}/heard-words`, { body: { ...total, firstWord, lastWord } });
    expect((await ask(0, 2)).status).toBe(422);
    expect((await ask(39, 40)).body).toMatchObject({ text: '18' });
    expect(lineOf(await look(id), 'R2').said).toEqual({ sts: [18] });
  });

  test.each([
    ['step', 'Let us make the body.'],
    ['note', 'Let us make the body'],
  ])('become a %s', async (as, text) => {
    const { id, transcriptId } = await setOut();
    const made = await call('post', `patterns/${id}/heard-words`, {
      body: { transcriptId, firstWord: 0, lastWord: 4, as },
    });
    expect((await look(id)).lines[0]).toMatchObject({ id: made.body.id, kind: as, text });
  });

  test('become a material, with the moment it was heard at', async () => {
    const { id, transcriptId } = await setOut([caption(2, 'I use a moss green wool yarn.'), ...PEAR.slice(1)]);
    const had = (await look(id)).materials.length;
    await call('post', `patterns/${id}/heard-words`, {
      body: { transcriptId, firstWord: 3, lastWord: 6, as: 'material' },
    });
    const { materials } = await look(id);
    expect(materials).toHaveLength(had + 1);
    expect(materials.at(-1)).toMatchObject({ kind: 'yarn', name: 'Moss green wool yarn' });
  });
});

describe('a trade word that was mis-heard', () => {
  const list = async (id: string) => (await call('get', `transcripts/${id}/corrections`)).body as CaptionCorrections;
  const captionsOf = async (id: string) =>
    (await call('get', `transcripts/${id}/cues`)).body.cues as { heard: string; corrected: string | null }[];

  test('is listed with its time and neighbours, taken into the captions, and put back as it was', async () => {
    const { id, transcriptId } = await setOut();
    const { corrections, mayTake } = await list(transcriptId);
    expect([corrections.length, mayTake]).toEqual([1, true]);
    expect(corrections[0]).toMatchObject({
      isTaken: false,
      before: expect.stringMatching(/Round one\. Five/) as string,
    });
    const { heard, meant, key } = corrections[0]!;

    const took = await call('post', `transcripts/${transcriptId}/corrections`, { body: { take: [key] } });
    const told = took.body as CaptionCorrections;
    expect(told.corrections[0]).toMatchObject({ isTaken: true });
    const [last] = (await captionsOf(transcriptId)).slice(-1);
    expect(last?.heard).toContain(heard);
    expect(last?.corrected).toContain(meant);
    expect(last?.corrected).not.toContain(heard);

    await call('post', `transcripts/${transcriptId}/readings`);
    expect(shown((await differences(id)).told)).toEqual([]);
    await call('post', `transcripts/${transcriptId}/corrections`, { body: { putBack: told.was } });
    expect((await captionsOf(transcriptId)).every(({ corrected }) => corrected === null)).toBe(true);
  });

  test('twice in one caption is put right both times at once', async () => {
    const { transcriptId } = await setOut(
      instead(20, 'Round two is one single crotchet then a single crotchet, so twelve.'),
    );
    const keys = (await list(transcriptId)).corrections.map(({ key }) => key);
    await call('post', `transcripts/${transcriptId}/corrections`, { body: { take: keys } });
    expect((await captionsOf(transcriptId))[2]?.corrected?.match(/crochet/g)).toHaveLength(2);
    expect((await list(transcriptId)).corrections.every(({ isTaken }) => isTaken)).toBe(true);
  });
});
