/**
 * A clip on its way up, as a pure state and the events that move it. What does the sending listens to `partsToBegin`
 * and `waitMs`; what shows it reads `progressOf`. Times are milliseconds of any steady clock.
 */

export type Phase =
  /** Its codec is looked at and its first bytes are digested; nothing is sent yet. */
  | 'looking'
  | 'starting'
  | 'sending'
  | 'paused'
  /** The connection was lost; it tries again by itself at `retryAt`. */
  | 'waiting'
  /** All of it has arrived; the server looks at what it is. */
  | 'finishing'
  | 'ready'
  /** It will not be taken, and `reason` says why and what to do. */
  | 'refused'
  | 'cancelled';

export interface Part {
  readonly n: number;
  readonly sentBytes: number;
}

interface Sample {
  readonly at: number;
  readonly bytes: number;
}

export interface UploadState {
  readonly phase: Phase;
  readonly size: number;
  readonly uploadId: string | null;
  readonly partSize: number;
  readonly have: readonly number[];
  readonly underWay: readonly Part[];
  /** Failures in a row. */
  readonly failures: number;
  readonly retryAt: number | null;
  /** Of `refused`, and of `waiting` where there is more to say. */
  readonly reason: string | null;
  /** It went on with what had arrived before. */
  readonly isResumed: boolean;
  /** A part took long: fewer are sent at once, so that each arrives before it is given up. */
  readonly isSlow: boolean;
  readonly samples: readonly Sample[];
}

export type UploadEvent =
  | { readonly type: 'looked' }
  | { readonly type: 'started'; readonly uploadId: string; readonly partSize: number; readonly have: readonly number[] }
  | { readonly type: 'part-began'; readonly n: number }
  | { readonly type: 'part-moved'; readonly n: number; readonly sentBytes: number; readonly at: number }
  | { readonly type: 'part-arrived'; readonly n: number; readonly at: number; readonly tookMs: number }
  | { readonly type: 'lost'; readonly at: number; readonly reason?: string }
  | { readonly type: 'try-again' }
  | { readonly type: 'missing'; readonly parts: readonly number[] }
  | { readonly type: 'finishing' }
  | { readonly type: 'ready' }
  | { readonly type: 'refused'; readonly reason: string }
  | { readonly type: 'pause' }
  | { readonly type: 'go-on' }
  | { readonly type: 'cancel' };

/** Under way at a time; fewer while a bench is open in this browser, since the clip plays over the same few connections. */
export const PARTS_AT_ONCE = 3;
export const PARTS_BESIDE_BENCH = 2;
const SLOW_MS = 90_000;
const SPEED_WINDOW_MS = 12_000;
const FIRST_WAIT_MS = 1_000;
const LONGEST_WAIT_MS = 30_000;

/** How long to wait after so many failures in a row: one second, doubled each time, half a minute at most. */
export const waitMs = (failures: number): number => Math.min(LONGEST_WAIT_MS, FIRST_WAIT_MS * 2 ** (failures - 1));

export const begin = (size: number): UploadState => ({
  phase: 'looking',
  size,
  uploadId: null,
  partSize: 0,
  have: [],
  underWay: [],
  failures: 0,
  retryAt: null,
  reason: null,
  isResumed: false,
  isSlow: false,
  samples: [],
});

const ENDED: ReadonlySet<Phase> = new Set(['ready', 'refused', 'cancelled']);
export const hasEnded = ({ phase }: UploadState): boolean => ENDED.has(phase);

export const partCount = ({ size, partSize }: UploadState): number => (partSize === 0 ? 0 : Math.ceil(size / partSize));

/** Bytes of part `n`; the last is shorter. */
export const bytesOfPart = ({ size, partSize }: UploadState, n: number): number =>
  Math.min(partSize, size - partSize * (n - 1));

/** Bytes that the server has said it keeps. */
export const arrivedBytes = (state: UploadState): number =>
  state.have.reduce((sum, n) => sum + bytesOfPart(state, n), 0);

const sentBytes = (state: UploadState): number =>
  arrivedBytes(state) + state.underWay.reduce((sum, part) => sum + part.sentBytes, 0);

export const isComplete = (state: UploadState): boolean => state.partSize > 0 && state.have.length === partCount(state);

function sampled(state: UploadState, at: number): UploadState {
  const samples = [...state.samples, { at, bytes: sentBytes(state) }];
  return { ...state, samples: samples.filter((one) => at - one.at <= SPEED_WINDOW_MS) };
}

const stopped = { underWay: [], samples: [] } as const;

function whileRunning(state: UploadState, event: UploadEvent): UploadState {
  switch (event.type) {
    case 'looked':
      return { ...state, phase: 'starting' };
    case 'started': {
      const { uploadId, partSize, have } = event;
      return { ...state, phase: 'sending', uploadId, partSize, have, isResumed: have.length > 0, retryAt: null };
    }
    case 'part-began':
      return { ...state, underWay: [...state.underWay, { n: event.n, sentBytes: 0 }] };
    case 'part-moved': {
      const underWay = state.underWay.map((part) =>
        part.n === event.n ? { ...part, sentBytes: Math.min(event.sentBytes, bytesOfPart(state, part.n)) } : part,
      );
      return sampled({ ...state, underWay }, event.at);
    }
    case 'part-arrived': {
      const underWay = state.underWay.filter(({ n }) => n !== event.n);
      const have = state.have.includes(event.n) ? state.have : [...state.have, event.n].sort((a, b) => a - b);
      const isSlow = event.tookMs > SLOW_MS;
      return sampled({ ...state, underWay, have, isSlow, failures: 0, reason: null }, event.at);
    }
    case 'lost': {
      const failures = state.failures + 1;
      const retryAt = event.at + waitMs(failures);
      return { ...state, ...stopped, phase: 'waiting', failures, retryAt, reason: event.reason ?? null };
    }
    case 'try-again':
      return { ...state, phase: 'starting', retryAt: null };
    case 'missing':
      return { ...state, phase: 'sending', have: state.have.filter((n) => !event.parts.includes(n)) };
    case 'finishing':
      return { ...state, ...stopped, phase: 'finishing', failures: 0 };
    case 'ready':
      return { ...state, ...stopped, phase: 'ready', reason: null };
    case 'refused':
      return { ...state, ...stopped, phase: 'refused', reason: event.reason };
    case 'pause':
      return state.phase === 'finishing' ? state : { ...state, ...stopped, phase: 'paused', retryAt: null };
    case 'go-on':
      return { ...state, phase: 'starting', retryAt: null, failures: 0, reason: null };
    case 'cancel':
      return { ...state, ...stopped, phase: 'cancelled' };
  }
}

/** What a person may still do while it stands still; whatever else comes in late changes nothing. */
const WHILE_PAUSED: ReadonlySet<UploadEvent['type']> = new Set(['go-on', 'cancel', 'refused']);

/** The next state. An event that no longer fits (a part that arrives after the pause) leaves the state as it is. */
export function move(state: UploadState, event: UploadEvent): UploadState {
  if (hasEnded(state)) return state.phase === 'refused' && event.type === 'go-on' ? whileRunning(state, event) : state;
  if (state.phase === 'paused') {
    // A part that had arrived by then is kept all the same.
    if (event.type === 'part-arrived') return { ...whileRunning(state, event), samples: [] };
    return WHILE_PAUSED.has(event.type) ? whileRunning(state, event) : state;
  }
  return whileRunning(state, event);
}

/** Parts to begin now: the first that are neither here nor under way, so many that no more than `atOnce` are. */
export function partsToBegin(state: UploadState, atOnce: number): number[] {
  if (state.phase !== 'sending') return [];
  const room = (state.isSlow ? 1 : atOnce) - state.underWay.length;
  const taken = new Set([...state.have, ...state.underWay.map(({ n }) => n)]);
  const begun: number[] = [];
  for (let n = 1; n <= partCount(state) && begun.length < room; n += 1) if (!taken.has(n)) begun.push(n);
  return begun;
}

export interface Progress {
  readonly sentBytes: number;
  /** 0 to 1. */
  readonly share: number;
  /** Null until it can be told. */
  readonly bytesPerSecond: number | null;
  readonly secondsLeft: number | null;
}

/** How far it has come, how fast it goes and how long it will take. */
export function progressOf(state: UploadState): Progress {
  const sent = sentBytes(state);
  const [first, last] = [state.samples[0], state.samples.at(-1)];
  const spanMs = first && last ? last.at - first.at : 0;
  const speed = first && last && spanMs >= 1_000 ? ((last.bytes - first.bytes) / spanMs) * 1_000 : null;
  const bytesPerSecond = speed !== null && speed > 0 ? speed : null;
  return {
    sentBytes: sent,
    share: state.size === 0 ? 0 : sent / state.size,
    bytesPerSecond,
    secondsLeft: bytesPerSecond === null ? null : (state.size - sent) / bytesPerSecond,
  };
}
