import { ask, atRest, moveOn, type PlayerRequest, type PlayerState } from './player-state.ts';

/** A player: state to read, requests to send. It plays the attached `<video>`, or lets the time run without one. */
export interface Player {
  getState: () => PlayerState;
  subscribe: (tell: () => void) => () => void;
  request: (request: PlayerRequest) => void;
  /** Give it the `<video>` that shows the clip; null when it goes. */
  attach: (video: HTMLVideoElement | null) => void;
  /** How long the recording is when no clip says so (the end of the transcript). */
  setDuration: (durationMs: number) => void;
}

/** Seeking by less than this is what playing does by itself. */
const SAME_PLACE_MS = 60;

/** @param durationMs length of the recording as far as it is known; 0 where it is not */
export function createPlayer(durationMs = 0): Player {
  let state = atRest(durationMs);
  let video: HTMLVideoElement | null = null;
  let frame = 0;
  let tickedAt = 0;
  let release: () => void = () => undefined;
  const listeners = new Set<() => void>();

  const set = (next: PlayerState) => {
    if (next === state) return;
    const before = state;
    state = next;
    drive(before);
    for (const tell of listeners) tell();
  };

  /** Makes the `<video>` do what the state says. */
  function drive(before: PlayerState) {
    if (state.isPlaying !== before.isPlaying) {
      cancelAnimationFrame(frame);
      if (state.isPlaying) {
        tickedAt = performance.now();
        frame = requestAnimationFrame(tick);
      }
    }
    if (!video || state.media === 'failed') return;
    if (video.playbackRate !== state.speed) video.playbackRate = state.speed;
    if (Math.abs(video.currentTime * 1000 - state.positionMs) > SAME_PLACE_MS)
      video.currentTime = state.positionMs / 1000;
    if (state.isPlaying && video.paused) {
      // A browser may refuse to start before the first click: then the state goes back to what is so.
      video.play().catch(() => set({ ...state, isPlaying: false }));
    }
    if (!state.isPlaying && !video.paused) video.pause();
  }

  function tick(now: number) {
    const passed = (now - tickedAt) * state.speed;
    tickedAt = now;
    const isShown = video && state.media === 'ready';
    set(moveOn(state, isShown ? video!.currentTime * 1000 : state.positionMs + passed));
    if (state.isPlaying) frame = requestAnimationFrame(tick);
  }

  function attach(next: HTMLVideoElement | null) {
    release();
    video = next;
    if (!video) {
      set({ ...state, media: 'none', isPlaying: false });
      return;
    }
    set({ ...state, media: video.error ? 'failed' : video.readyState > 0 ? 'ready' : 'loading' });
    release = listenTo(video, {
      loadedmetadata: (clip) => {
        const length = Number.isFinite(clip.duration) ? clip.duration * 1000 : state.durationMs;
        clip.preservesPitch = true;
        clip.currentTime = state.positionMs / 1000;
        set({ ...state, media: 'ready', durationMs: length });
      },
      error: () => set({ ...state, media: 'failed', isPlaying: false }),
      pause: (clip) => !clip.ended && clip.readyState > 0 && state.isPlaying && set({ ...state, isPlaying: false }),
      ended: () => set({ ...state, isPlaying: false, positionMs: state.durationMs }),
    });
  }

  return {
    getState: () => state,
    subscribe: (tell) => {
      listeners.add(tell);
      return () => listeners.delete(tell);
    },
    request: (request) => set(ask(state, request)),
    attach,
    setDuration: (length) => {
      if (state.media !== 'ready' && length !== state.durationMs) set({ ...state, durationMs: length });
    },
  };
}

function listenTo(video: HTMLVideoElement, on: Record<string, (video: HTMLVideoElement) => unknown>): () => void {
  const pairs = Object.entries(on).map(([name, act]) => [name, () => void act(video)] as const);
  for (const [name, act] of pairs) video.addEventListener(name, act);
  return () => {
    for (const [name, act] of pairs) video.removeEventListener(name, act);
  };
}
