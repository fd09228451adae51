import request from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { buildApp, type TestApp } from '../support/app.ts';
import { buildHouse, buildPattern, buildPerson, buildRecording, type Household } from '../support/builders.ts';

const SAID = `WEBVTT

00:00.500 --> 00:04.000
Let's make the body. Begin with a magic ring.

00:04.500 --> 00:09.000
Round one, six single crochet into the ring. Six stitches.

00:10.000 --> 00:15.000
Round two, increase in every stitch around. Twelve stitches.

00:16.000 --> 00:22.000
Round three, single crochet, increase, repeat six times. Eighteen stitches.
`;

/** The same, and so long that nobody waits for it. */
const LONG = `${SAID}
00:24.000 --> 30:00.000
${'and a little more yarn over, as before, '.repeat(900)}
`;

describe('a transcript', () => {
  let at: TestApp;
  let house: Household;
  let creator: Awaited<ReturnType<TestApp['as']>>;

  beforeAll(async () => {
    at = await buildApp();
    house = await buildHouse(at.db);
    creator = await at.as(house.creator);
  });
  beforeEach(() => at.clock.advance(61_000));
  afterAll(() => at.close());

  const setOut = async () => {
    const pattern = await buildPattern(at.db, { studio_id: house.studio.id });
    const recording = await buildRecording(at.db, { pattern_id: pattern.id });
    return { patternId: pattern.id, recordingId: recording.id };
  };
  const send = (id: string, text: string | Buffer, filename: string, contentType = 'text/plain', who = creator) =>
    request(at.app)
      .post(`/api/recordings/${id}/transcripts`)
      .set(who)
      .attach('file', Buffer.isBuffer(text) ? text : Buffer.from(text), { filename, contentType });
  const list = async (patternId: string) =>
    (await request(at.app).get(`/api/patterns/${patternId}/recordings`).set(creator)).body.recordings as {
      id: string;
      number: number;
      transcript: Record<string, unknown>;
    }[];
  const bench = async (patternId: string) =>
    (await request(at.app).get(`/api/patterns/${patternId}`).set(creator)).body as {
      state: string;
      version: number;
      lines: { id: string; label: string; text: string; version: number }[];
      marks: { startMs: number }[];
    };

  test('that is short is read while its sender waits', async () => {
    const { patternId, recordingId } = await setOut();
    const sent = await send(recordingId, SAID, 'harvest-mouse.vtt', 'text/vtt');
    expect(sent.body.reading).toMatchObject({ state: 'done', summary: { taken: true } });
    expect((await bench(patternId)).state).toBe('drafting');
  });

  test('sent twice with one key is kept once; with another file the key is refused', async () => {
    const { recordingId } = await setOut();
    const once = { ...creator, 'Idempotency-Key': 'one-choice' };
    const first = await send(recordingId, SAID, 'harvest-mouse.vtt', 'text/vtt', once);
    const second = await send(recordingId, SAID, 'harvest-mouse.vtt', 'text/vtt', once);
    expect([second.status, second.body]).toEqual([201, first.body]);
    expect(await at.db('transcripts').where({ recording_id: recordingId })).toHaveLength(1);
    const other = await send(recordingId, `${SAID}\n`, 'harvest-mouse.vtt', 'text/vtt', once);
    expect(other.status).toBe(422);
  });

  test('that is long is read by a job, and the empty pattern takes the draft with words and moments', async () => {
    const { patternId, recordingId } = await setOut();
    const sent = await send(recordingId, LONG, 'harvest-mouse.vtt', 'text/vtt');
    expect(sent.status).toBe(201);
    expect(sent.body).toMatchObject({
      format: 'vtt',
      captions: 5,
      number: 1,
      reading: { state: 'waiting', summary: null },
    });
    expect((await bench(patternId)).state).toBe('reading');
    await at.workAll();

    const [recording] = await list(patternId);
    expect(recording?.transcript).toMatchObject({
      lastMs: 1_800_000,
      reading: { state: 'done', summary: { terms: 'US', taken: true, toLook: 0, verdicts: { agrees: 3 } } },
    });
    const pattern = await bench(patternId);
    expect(pattern.state).toBe('drafting');
    expect(pattern.lines.length).toBeGreaterThanOrEqual(3);
    expect(pattern.marks.some(({ startMs }) => startMs >= 10_000 && startMs < 16_000)).toBe(true);
  });

  test('lists what was mended by line, and keeps the file as it came', async () => {
    const { recordingId } = await setOut();
    const odd = SAID.replace('00:10.000 --> 00:15.000', '00:10,000 --> 00:09.000');
    const sent = await send(recordingId, odd, 'odd.vtt');
    expect(sent.status).toBe(201);
    expect(sent.body.problems.length).toBeGreaterThan(0);
    expect(sent.body.problems[0]).toMatchObject({
      line: expect.any(Number),
      what: expect.any(String),
      done: expect.any(String),
    });
    const got = await request(at.app).get(`/api/transcripts/${sent.body.id}`).set(creator);
    expect(got.body.sourceText).toBe(odd);
  });

  test('without times, is told so with an example of what holds them, and nothing is kept', async () => {
    const { recordingId } = await setOut();
    const sent = await send(recordingId, 'Round one is six single crochet.\nRound two is twelve.', 'notes.txt');
    expect(sent.status).toBe(422);
    expect(sent.body.detail).toMatch(/\[1:04\]/);
    expect(sent.body.problems.length).toBeGreaterThan(0);
    expect(await at.db('transcripts').where({ recording_id: recordingId })).toEqual([]);
  });

  test.each([
    ['harvest.srt', 'video/mp4', Buffer.from('1\n00:00:01,000 --> 00:00:02,000\nRound one\n')],
    ['harvest.srt', 'text/plain', Buffer.from('PK\x03\x04rest of an archive')],
    ['harvest.vtt', 'text/vtt', Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from('ftypmp42 and so on')])],
    ['harvest.pdf', 'application/pdf', Buffer.from('1:04 Round one')],
    ['harvest.txt', 'text/plain', Buffer.from(Array.from({ length: 400 }, (_, n) => (n * 7) % 256))],
    ['../../a"\r\n.exe', 'text/plain', Buffer.from('1:04 Round one')],
  ])('name, kind and inside have to agree: %s as %s', async (name, type, bytes) => {
    const { recordingId } = await setOut();
    const sent = await send(recordingId, bytes, name, type);
    expect(sent.status).toBe(415);
    expect(sent.body).toMatchObject({ type: '/problems/unsupported' });
  });

  test('of five megabytes is taken, of one byte more is not, and nothing stays behind', async () => {
    const { recordingId } = await setOut();
    const line = '1:04 Round one is six single crochet into the ring, as so often before.\n\n';
    const full = line.repeat(Math.ceil(5_000_000 / line.length)).slice(0, 5_000_000);
    const over = await send(recordingId, `${full}x`, 'long.txt');
    expect(over.status).toBe(413);
    expect(await at.db('transcripts').where({ recording_id: recordingId })).toEqual([]);
    expect((await send(recordingId, full, 'long.txt')).status).toBe(201);
    await at.db.raw('delete from graphile_worker._private_jobs');
  });

  test('in another alphabet and with zero characters, is kept whole', async () => {
    const { recordingId } = await setOut();
    const sent = await send(recordingId, '1:04 Größe ‘zwölf’ 😀\u0000 runde eins', 'größe-Ñ.txt');
    expect(sent.status).toBe(201);
    expect(sent.body.fileName).toBe('größe-Ñ.txt');
    const { body } = await request(at.app).get(`/api/transcripts/${sent.body.id}/cues`).set(creator);
    expect(body.cues[0].heard).toContain('Größe ‘zwölf’ 😀');
  });

  test('a better one never writes over lines: it waits until somebody takes what is new', async () => {
    const { patternId, recordingId } = await setOut();
    await send(recordingId, SAID, 'first.vtt');
    await at.workAll();
    const before = await bench(patternId);
    const line = before.lines.find(({ text }) => text.includes('inc'))!;
    const edited = await request(at.app)
      .patch(`/api/lines/${line.id}`)
      .set(creator)
      .set('If-Match', `"${line.version}"`)
      .send({ text: 'my own words (12)' });
    expect(edited.status).toBe(200);

    const more = `${SAID}\n00:23.000 --> 00:30.000\nRound four, single crochet in every stitch around. Eighteen stitches.\n`;
    const second = await send(recordingId, more, 'second.vtt');
    expect(second.body.number).toBe(2);
    await at.workAll();
    expect((await bench(patternId)).lines).toHaveLength(before.lines.length);
    const summary = (await list(patternId))[0]?.transcript.reading as { summary: { id: string; taken: boolean } };
    expect(summary.summary.taken).toBe(false);

    const taken = await request(at.app)
      .post(`/api/patterns/${patternId}/readings/${summary.summary.id}/take`)
      .set(creator);
    expect(taken.status).toBe(200);
    expect(taken.body).toEqual({ pieces: 0, lines: 1 });
    const after = await bench(patternId);
    expect(after.lines.find(({ id }) => id === line.id)?.text).toContain('my own words');
    expect(after.lines).toHaveLength(before.lines.length + 1);
  });

  test('a caption is corrected beside what was heard, and a second person is not written over', async () => {
    const { recordingId } = await setOut();
    const sent = await send(recordingId, SAID, 'captions.vtt');
    const cues = async () =>
      (await request(at.app).get(`/api/transcripts/${sent.body.id}/cues`).set(creator)).body.cues as {
        id: string;
        heard: string;
        corrected: string | null;
        version: number;
      }[];
    const first = (await cues())[0]!;
    const correct = (version: number | null, corrected: string | null, who = creator) => {
      const asked = request(at.app).patch(`/api/cues/${first.id}`).set(who);
      return (version === null ? asked : asked.set('If-Match', `"${version}"`)).send({ corrected });
    };
    expect((await correct(null, 'x')).status).toBe(428);
    const editor = await at.as(house.editor);
    expect((await correct(first.version, 'Let us make the body.', editor)).status).toBe(200);
    const stale = await correct(first.version, 'Something else');
    expect(stale.status).toBe(412);
    expect(stale.body.present).toMatchObject({ corrected: 'Let us make the body.', version: 2 });
    expect((await cues())[0]).toMatchObject({ heard: first.heard, corrected: 'Let us make the body.' });
    expect((await correct(2, null)).body).toMatchObject({ corrected: null, version: 3 });
  });

  test('that cannot be read after the last try says so, and may be read again', async () => {
    const { patternId, recordingId } = await setOut();
    const sent = await send(recordingId, LONG, 'fails.vtt');
    await at.db.raw('delete from graphile_worker._private_jobs');
    const { readTranscriptJob } = await import('../../api/features/recordings/readings.service.ts');
    await at.db.raw('alter table readings rename to readings_away');
    const job = readTranscriptJob(at.deps, { transcriptId: sent.body.id }, { attempt: 5 });
    await expect(job).rejects.toThrow();
    await at.db.raw('alter table readings_away rename to readings');
    expect((await list(patternId))[0]?.transcript.reading).toMatchObject({ state: 'failed' });
    expect((await bench(patternId)).state).toBe('drafting');
    const again = await request(at.app).post(`/api/transcripts/${sent.body.id}/readings`).set(creator);
    expect(again.status).toBe(202);
    await at.workAll();
    expect((await list(patternId))[0]?.transcript.reading).toMatchObject({ state: 'done' });
  });

  test('of another studio is not there', async () => {
    const { recordingId } = await setOut();
    const { body } = await send(recordingId, SAID, 'ours.vtt');
    const cue = await at.db('cues').where({ transcript_id: body.id }).first<{ id: string }>('id');
    const stranger = await at.as(await buildPerson(at.db));
    const gets = [`/api/transcripts/${body.id}`, `/api/transcripts/${body.id}/cues`];
    for (const path of gets) expect((await request(at.app).get(path).set(stranger)).status).toBe(404);
    expect((await send(recordingId, SAID, 'theirs.vtt', 'text/vtt', stranger)).status).toBe(404);
    const patch = request(at.app).patch(`/api/cues/${cue.id}`).set(stranger).set('If-Match', '"1"');
    expect((await patch.send({ corrected: 'x' })).status).toBe(404);
    expect((await send(recordingId, SAID, 'editor.vtt', 'text/vtt', await at.as(house.editor))).status).toBe(403);
  });
});
