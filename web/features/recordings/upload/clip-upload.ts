import { Upload } from '#contract/recordings';
import { ClipStarted } from '#contract/uploads';
import * as z from 'zod';
import { ProblemError, send, UnreachableError } from '../../../lib/http.ts';
import { isBenchOpen } from './bench-open.ts';
import { digestOf, factsOf, whyNotSend } from './inspect-file.ts';
import { sendPart } from './send-part.ts';
import {
  begin,
  bytesOfPart,
  hasEnded,
  isComplete,
  move,
  PARTS_AT_ONCE,
  PARTS_BESIDE_BENCH,
  partsToBegin,
  type UploadEvent,
  type UploadState,
} from './upload-state.ts';

const LOOK_AGAIN_MS = 700;
const STATUS_OF_REFUSALS = new Set([400, 403, 404, 409, 410, 413, 415, 422]);
const SIGNED_OUT = 'You are signed out. What went up is kept: sign in again in another tab, and it goes on.';

/** One clip of one recording on its way up: does what the state says, and tells whoever listens. */
export class ClipUpload {
  readonly recordingId: string;
  readonly file: File;
  state: UploadState;
  readonly #changed: () => void;
  #cut = new AbortController();
  #timer: ReturnType<typeof setTimeout> | undefined;
  #damaged = 0;

  constructor(recordingId: string, file: File, changed: () => void) {
    this.recordingId = recordingId;
    this.file = file;
    this.state = begin(file.size);
    this.#changed = changed;
    void this.#look();
  }

  pause(): void {
    this.#stop({ type: 'pause' });
  }

  goOn(): void {
    this.#move({ type: 'go-on' });
    void this.#start();
  }

  /** Stops, and asks the server to let go of what had arrived. */
  async cancel(): Promise<void> {
    const { uploadId } = this.state;
    this.#stop({ type: 'cancel' });
    if (uploadId !== null) await send(z.undefined(), `/api/uploads/${uploadId}`, { method: 'DELETE' });
  }

  #move(event: UploadEvent): void {
    const next = move(this.state, event);
    if (next === this.state) return;
    this.state = next;
    this.#changed();
  }

  #stop(event: UploadEvent): void {
    clearTimeout(this.#timer);
    this.#move(event);
    this.#cut.abort();
    this.#cut = new AbortController();
  }

  async #look(): Promise<void> {
    const reason = await whyNotSend(this.file).catch(() => 'This file cannot be read. Choose it again.');
    if (hasEnded(this.state)) return;
    if (reason !== null) {
      this.#move({ type: 'refused', reason });
      return;
    }
    this.#move({ type: 'looked' });
    await this.#start();
  }

  async #start(): Promise<void> {
    if (this.state.phase !== 'starting') return;
    const { signal } = this.#cut;
    try {
      const body = await factsOf(this.file);
      const url = `/api/recordings/${this.recordingId}/clip`;
      const started = await send(ClipStarted, url, { method: 'POST', body, signal });
      if (signal.aborted) return;
      this.#move({ type: 'started', ...started });
      this.#fill();
    } catch (err) {
      if (!signal.aborted) this.#failed(err);
    }
  }

  #fill(): void {
    const atOnce = isBenchOpen() ? PARTS_BESIDE_BENCH : PARTS_AT_ONCE;
    for (const n of partsToBegin(this.state, atOnce)) void this.#sendPart(n);
    if (this.state.phase === 'sending' && isComplete(this.state)) void this.#complete();
  }

  async #sendPart(n: number): Promise<void> {
    const { signal } = this.#cut;
    const { uploadId, partSize } = this.state;
    this.#move({ type: 'part-began', n });
    const began = performance.now();
    try {
      const from = (n - 1) * partSize;
      const bytes = this.file.slice(from, from + bytesOfPart(this.state, n));
      const part = { sha256: await digestOf(bytes), bytes };
      await sendPart(`/api/uploads/${uploadId ?? ''}/parts/${n}`, part, signal, (sentBytes) => {
        if (!signal.aborted) this.#move({ type: 'part-moved', n, sentBytes, at: performance.now() });
      });
      this.#damaged = 0;
      this.#move({ type: 'part-arrived', n, at: performance.now(), tookMs: performance.now() - began });
      if (!signal.aborted) this.#fill();
    } catch (err) {
      if (!signal.aborted) this.#failed(err);
    }
  }

  async #complete(): Promise<void> {
    const { signal } = this.#cut;
    this.#move({ type: 'finishing' });
    try {
      const url = `/api/uploads/${this.state.uploadId ?? ''}/complete`;
      await this.#follow(await send(Upload, url, { method: 'POST', body: {}, signal }));
    } catch (err) {
      const missing = err instanceof ProblemError ? z.array(z.number()).safeParse(err.problem.missing) : null;
      if (missing?.success) {
        this.#move({ type: 'missing', parts: missing.data });
        this.#fill();
      } else if (!signal.aborted) this.#failed(err);
    }
  }

  /** Asks until the server has seen what it is. */
  async #follow(upload: Upload): Promise<void> {
    if (upload.state === 'ready') this.#move({ type: 'ready' });
    else if (upload.state !== 'completing') {
      this.#move({ type: 'refused', reason: upload.refusal ?? 'This clip was not taken. Choose the file again.' });
    } else {
      await new Promise((wait) => (this.#timer = setTimeout(wait, LOOK_AGAIN_MS)));
      await this.#follow(await send(Upload, `/api/uploads/${upload.id}`, { signal: this.#cut.signal }));
    }
  }

  /** What will not get better by itself ends it; everything else is tried again, with growing gaps. */
  #failed(err: unknown): void {
    const problem = err instanceof ProblemError ? err.problem : null;
    const isDamaged = problem?.status === 422 && problem.type.endsWith('/invalid') && this.state.uploadId !== null;
    if (isDamaged) this.#damaged += 1;
    const isFinal = problem !== null && STATUS_OF_REFUSALS.has(problem.status) && !(isDamaged && this.#damaged < 3);
    if (isFinal || (problem === null && !(err instanceof UnreachableError))) {
      const reason = problem?.detail ?? problem?.title ?? 'This file cannot be read any more. Choose it again.';
      this.#stop({ type: 'refused', reason });
      return;
    }
    const at = performance.now();
    this.#stop({ type: 'lost', at, ...(problem?.status === 401 && { reason: SIGNED_OUT }) });
    this.#timer = setTimeout(
      () => {
        this.#move({ type: 'try-again' });
        void this.#start();
      },
      Math.max(0, (this.state.retryAt ?? at) - at),
    );
  }
}
