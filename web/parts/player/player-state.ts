/**
 * What the player is doing, as plain values, and what may be asked of it. Nothing here touches a `<video>`: controls send
 * requests and draw state; `create-player.ts` alone turns one into the other.
 */

export interface Span {
  readonly startMs: number;
  readonly endMs: number;
}

export interface PlayerState {
  /** `none`: no clip, the time of the transcript runs by itself. `failed`: there is one, and it cannot be played here. */
  readonly media: 'none' | 'loading' | 'ready' | 'failed';
  readonly isPlaying: boolean;
  readonly positionMs: number;
  readonly durationMs: number;
  /** 1 is as filmed. The pitch is kept. */
  readonly speed: number;
  /** Played over and over while it is set. */
  readonly loop: Span | null;
  /** Where playing stops by itself: the end of a moment that somebody asked to hear. */
  readonly stopAtMs: number | null;
}

export const SPEEDS = [0.5, 0.75, 1, 1.25, 1.5] as const;

export const atRest = (durationMs: number): PlayerState => ({
  media: 'none',
  isPlaying: false,
  positionMs: 0,
  durationMs,
  speed: 1,
  loop: null,
  stopAtMs: null,
});

export type PlayerRequest =
  | { readonly kind: 'play' | 'pause' | 'toggle' | 'faster' | 'slower' }
  | { readonly kind: 'seek'; readonly toMs: number }
  | { readonly kind: 'step'; readonly byMs: number }
  | { readonly kind: 'hear'; readonly span: Span }
  | { readonly kind: 'speed'; readonly speed: number }
  | { readonly kind: 'loop'; readonly span: Span | null };

const within = (ms: number, state: PlayerState) =>
  Math.min(Math.max(0, ms), state.durationMs || Number.MAX_SAFE_INTEGER);

const nextSpeed = (speed: number, way: 1 | -1): number => {
  const at = SPEEDS.findIndex((one) => one >= speed);
  return SPEEDS[Math.min(SPEEDS.length - 1, Math.max(0, (at < 0 ? SPEEDS.length - 1 : at) + way))] ?? 1;
};

/**
 * The state that a request asks for. A moment asked for by hand ends the hearing of another; a jump out of the loop ends
 * the loop, since nobody jumps away to be pulled back.
 */
export function ask(state: PlayerState, request: PlayerRequest): PlayerState {
  switch (request.kind) {
    case 'play':
      return { ...state, isPlaying: true };
    case 'pause':
      return { ...state, isPlaying: false, stopAtMs: null };
    case 'toggle':
      return ask(state, { kind: state.isPlaying ? 'pause' : 'play' });
    case 'seek':
      return jump(state, request.toMs);
    case 'step':
      return jump(state, state.positionMs + request.byMs);
    case 'hear':
      return { ...jump(state, request.span.startMs), isPlaying: true, stopAtMs: request.span.endMs };
    case 'speed':
      return { ...state, speed: request.speed };
    case 'faster':
      return { ...state, speed: nextSpeed(state.speed, 1) };
    case 'slower':
      return { ...state, speed: nextSpeed(state.speed, -1) };
    case 'loop':
      return request.span
        ? { ...state, loop: request.span, stopAtMs: null, positionMs: intoSpan(state.positionMs, request.span) }
        : { ...state, loop: null };
  }
}

const intoSpan = (ms: number, { startMs, endMs }: Span) => (ms >= startMs && ms < endMs ? ms : startMs);

function jump(state: PlayerState, toMs: number): PlayerState {
  const positionMs = within(toMs, state);
  const staysInLoop = state.loop && positionMs >= state.loop.startMs && positionMs < state.loop.endMs;
  return { ...state, positionMs, stopAtMs: null, loop: staysInLoop ? state.loop : null };
}

/** The state after the clip has moved on by itself to `positionMs`: loops go round, a heard moment ends. */
export function moveOn(state: PlayerState, positionMs: number): PlayerState {
  if (!state.isPlaying) return { ...state, positionMs };
  if (state.loop && positionMs >= state.loop.endMs) return { ...state, positionMs: state.loop.startMs };
  if (state.stopAtMs !== null && positionMs >= state.stopAtMs) {
    return { ...state, positionMs: state.stopAtMs, isPlaying: false, stopAtMs: null };
  }
  if (state.durationMs > 0 && positionMs >= state.durationMs) {
    return { ...state, positionMs: state.durationMs, isPlaying: false, stopAtMs: null };
  }
  return { ...state, positionMs };
}
