import { createHash, randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import request from 'supertest';
import { PROJECT_ROOT } from '../../../api/platform/project-root.ts';
import type { TestApp } from '../../support/app.ts';
import { listen } from '../../support/browser.ts';
import { buildLine, buildMark, buildPattern, buildPiece, buildRecording } from '../../support/builders.ts';
import { listenTo } from '../../support/event-source.ts';
import type { Cast } from './people.ts';

export const CLIP = readFileSync(path.join(PROJECT_ROOT, 'seeds/clips/kettle-holder.mp4'));
export const sha256 = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex');
export const CLIP_START = {
  name: 'kettle-holder.mp4',
  size: CLIP.length,
  lastModified: 1_760_000_000_000,
  firstMiBSha256: sha256(CLIP.subarray(0, 1_048_576)),
};
const VTT = Buffer.from('WEBVTT\n\n00:01.000 --> 00:04.000\nRound one. Six single crochet in a magic ring.\n');

interface Row {
  id: string;
  version: number;
}

/** Fresh things of the loft for one call, made as its owner would make them. */
export class World {
  readonly at: TestApp;
  readonly cast: Cast;

  constructor(at: TestApp, cast: Cast) {
    this.at = at;
    this.cast = cast;
  }

  get studioId(): string {
    return this.cast.loft.studio.id;
  }

  /** Asks as the loft's owner, and insists on being answered well. */
  async owner(method: 'get' | 'post' | 'patch' | 'put' | 'delete', url: string, body?: object, version?: number) {
    const agent = request(this.at.app);
    const headers = {
      ...(await this.at.as(this.cast.loft.owner)),
      ...(version !== undefined && { 'If-Match': `"${version}"` }),
    };
    const res = await agent[method](`/api${url}`).set(headers).send(body);
    if (res.status >= 400) throw new Error(`${method} ${url}: ${res.status} ${JSON.stringify(res.body)}`);
    return res;
  }

  async pattern(over: object = {}): Promise<Row & { code: string }> {
    return buildPattern(this.at.db, { studio_id: this.studioId, ...over });
  }

  async line() {
    const pattern = await this.pattern();
    const piece = await buildPiece(this.at.db, { pattern_id: pattern.id });
    const line = await buildLine(this.at.db, { piece_id: piece.id });
    return { pattern, piece, line };
  }

  async recording() {
    const pattern = await this.pattern();
    return { pattern, recording: await buildRecording(this.at.db, { pattern_id: pattern.id }) };
  }

  async mark() {
    const { pattern, recording } = await this.recording();
    const mark = await buildMark(this.at.db, { pattern_id: pattern.id, recording_id: recording.id, start_ms: 1_000 });
    return { pattern, recording, mark };
  }

  /** A row of a pattern that has no builder, made through its own door. */
  async row(kind: string, body: object): Promise<Row> {
    const { id } = await this.pattern();
    return (await this.owner('post', `/patterns/${id}/${kind}`, body)).body as Row;
  }

  async upload(withPart = true): Promise<string> {
    // Somebody has at most a few clips on their way; those of the calls before are given up.
    await this.at.db('uploads').where({ state: 'arriving' }).update({ state: 'given-up' });
    const { recording } = await this.recording();
    const started = await this.owner('post', `/recordings/${recording.id}/clip`, CLIP_START);
    const { uploadId } = started.body as { uploadId: string };
    if (withPart) {
      const sent = await this.sendPart(uploadId, await this.at.as(this.cast.loft.owner));
      if (sent.status !== 200) throw new Error(`the part was refused: ${sent.status}`);
    }
    return uploadId;
  }

  async sendPart(uploadId: string, headers: Record<string, string>) {
    return request(this.at.app)
      .put(`/api/uploads/${uploadId}/parts/1`)
      .set(headers)
      .field('sha256', sha256(CLIP))
      .attach('part', CLIP, { filename: 'part', contentType: 'application/octet-stream' });
  }

  /** A recording with a whole clip. */
  async clip(): Promise<{ patternId: string; recordingId: string }> {
    const { pattern, recording } = await this.recording();
    await this.giveClip(recording.id);
    return { patternId: pattern.id, recordingId: recording.id };
  }

  private async giveClip(recordingId: string): Promise<void> {
    const key = randomUUID();
    await this.at.deps.storage.put(key, CLIP, 'video/mp4');
    const object = { id: key, studio_id: this.studioId, key, kind: 'clip', state: 'ready', type: 'video/mp4' };
    await this.at.db('objects').insert({ ...object, bytes: CLIP.length });
    await this.at.db('recordings').where({ id: recordingId }).update({ clip_object_id: key, duration_ms: 161_000 });
  }

  async sendTranscript(recordingId: string, headers: Record<string, string>) {
    return request(this.at.app)
      .post(`/api/recordings/${recordingId}/transcripts`)
      .set(headers)
      .attach('file', VTT, { filename: 'talk.vtt', contentType: 'text/vtt' });
  }

  /** Listens to a stream for as long as it takes to be let in. */
  async listen(url: string, headers: Record<string, string>): Promise<{ status: number }> {
    const server = await listen(this.at.app);
    const stream = await listenTo(server.url + url, headers);
    stream.close();
    await server.close();
    return stream;
  }

  /** A transcript that has been read, with its first caption. */
  async transcript() {
    const { pattern, recording } = await this.recording();
    const sent = await this.sendTranscript(recording.id, await this.at.as(this.cast.loft.owner));
    const { id } = sent.body as { id: string };
    await this.at.work('read-transcript', { transcriptId: id });
    const cue = await this.at
      .db<Row>('cues')
      .where({ transcript_id: id } as never)
      .first();
    const reading = await this.at
      .db<Row>('readings')
      .where({ transcript_id: id } as never)
      .first();
    return { patternId: pattern.id, transcriptId: id, cueId: cue!.id, readingId: reading!.id };
  }

  /** A pattern with one agreeing round, a clip with captions, and one edition out. */
  async edition(visibility: 'private' | 'unlisted' | 'listed' = 'unlisted') {
    const { patternId, recordingId } = await this.clip();
    await this.sendTranscript(recordingId, await this.at.as(this.cast.loft.owner));
    const piece = await buildPiece(this.at.db, { pattern_id: patternId });
    const line = await buildLine(this.at.db, { piece_id: piece.id });
    await buildMark(this.at.db, {
      pattern_id: patternId,
      recording_id: recordingId,
      line_id: line.id,
      start_ms: 30_000,
    });
    const desk = await this.owner('get', `/patterns/${patternId}/next-edition`);
    const version = (desk.body as { lastChange: number }).lastChange;
    await this.owner('post', `/patterns/${patternId}/editions`, { visibility }, version);
    const code = (await this.at
      .db<{ code: string }>('patterns')
      .where({ id: patternId } as never)
      .first())!.code;
    return { patternId, code, recordingId };
  }

  /** A pattern with one agreeing round that nobody has published, and the number its desk shows. */
  async publishable() {
    const { pattern } = await this.line();
    const desk = await this.owner('get', `/patterns/${pattern.id}/next-edition`);
    return { patternId: pattern.id, version: (desk.body as { lastChange: number }).lastChange };
  }

  /** The token of the letter that waits to go to an address. */
  async tokenTo(email: string): Promise<string> {
    const mail = await this.at
      .db<{ payload: { link: { url: string } } }>('mails')
      .where({ to_email: email } as never)
      .orderBy('created_at', 'desc')
      .first();
    return mail?.payload.link.url.split('#')[1] ?? '';
  }

  async invitation(email: string): Promise<string> {
    await this.owner('post', `/studios/${this.studioId}/invitations`, { email, role: 'editor' });
    return this.tokenTo(email);
  }
}
