import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { createPlayer } from '../../web/parts/player/create-player.ts';
import { ask, atRest, moveOn, type PlayerState } from '../../web/parts/player/player-state.ts';

const playing = (more: Partial<PlayerState> = {}): PlayerState => ({ ...atRest(60_000), isPlaying: true, ...more });

describe('what is asked of the player', () => {
  test('a step never leaves the recording', () => {
    expect(ask(atRest(60_000), { kind: 'step', byMs: -1000 }).positionMs).toBe(0);
    expect(ask(playing({ positionMs: 59_500 }), { kind: 'step', byMs: 5000 }).positionMs).toBe(60_000);
  });

  test('speed goes up and down by the five that there are, and stays at the ends', () => {
    const faster = (state: PlayerState) => ask(state, { kind: 'faster' });
    expect(faster(playing()).speed).toBe(1.25);
    expect(faster(faster(faster(playing()))).speed).toBe(1.5);
    expect(ask(playing({ speed: 0.5 }), { kind: 'slower' }).speed).toBe(0.5);
  });

  test('looping from elsewhere begins at the line, looping from inside goes on where it is', () => {
    const span = { startMs: 10_000, endMs: 20_000 };
    expect(ask(playing({ positionMs: 30_000 }), { kind: 'loop', span }).positionMs).toBe(10_000);
    expect(ask(playing({ positionMs: 12_000 }), { kind: 'loop', span }).positionMs).toBe(12_000);
  });

  test('somebody who jumps out of the loop is not pulled back', () => {
    const looping = playing({ positionMs: 12_000, loop: { startMs: 10_000, endMs: 20_000 } });
    expect(ask(looping, { kind: 'step', byMs: 1000 }).loop).not.toBeNull();
    expect(ask(looping, { kind: 'seek', toMs: 40_000 }).loop).toBeNull();
  });
});

describe('what happens by itself while it plays', () => {
  test('the loop goes round', () => {
    const looping = playing({ positionMs: 19_990, loop: { startMs: 10_000, endMs: 20_000 } });
    expect(moveOn(looping, 20_005)).toMatchObject({ positionMs: 10_000, isPlaying: true });
  });

  test('a moment that was asked for is heard to its end and no further', () => {
    const hearing = ask(atRest(60_000), { kind: 'hear', span: { startMs: 5000, endMs: 7000 } });
    expect(hearing).toMatchObject({ positionMs: 5000, isPlaying: true });
    expect(moveOn(hearing, 7010)).toMatchObject({ positionMs: 7000, isPlaying: false, stopAtMs: null });
  });

  test('it stops at the end of the recording', () => {
    expect(moveOn(playing(), 60_020)).toMatchObject({ positionMs: 60_000, isPlaying: false });
  });
});

describe('without a clip', () => {
  beforeEach(() => void vi.useFakeTimers({ toFake: ['requestAnimationFrame', 'cancelAnimationFrame', 'performance'] }));
  afterEach(() => void vi.useRealTimers());

  test('the time of the transcript runs, at the chosen speed', () => {
    const player = createPlayer(60_000);
    player.request({ kind: 'speed', speed: 0.5 });
    player.request({ kind: 'play' });
    vi.advanceTimersByTime(4000);
    expect(player.getState().positionMs).toBeGreaterThan(1900);
    expect(player.getState().positionMs).toBeLessThanOrEqual(2000);
    player.request({ kind: 'pause' });
    const stopped = player.getState().positionMs;
    vi.advanceTimersByTime(1000);
    expect(player.getState().positionMs).toBe(stopped);
  });
});

describe('with a clip', () => {
  /** A `<video>` of jsdom, which plays nothing but keeps what it is told. */
  function clip() {
    const video = document.createElement('video');
    const play = vi.spyOn(video, 'play').mockResolvedValue(undefined);
    const pause = vi.spyOn(video, 'pause').mockReturnValue(undefined);
    return { video, play, pause };
  }

  test('the clip is sought, slowed and played as the state says', () => {
    const player = createPlayer(60_000);
    const { video, play } = clip();
    player.attach(video);
    player.request({ kind: 'seek', toMs: 12_300 });
    player.request({ kind: 'speed', speed: 0.75 });
    player.request({ kind: 'play' });
    expect(video.currentTime).toBeCloseTo(12.3);
    expect(video.playbackRate).toBe(0.75);
    expect(play).toHaveBeenCalled();
    player.request({ kind: 'pause' });
  });

  test('a clip that cannot be played is said so, and the time goes on by the transcript', () => {
    const player = createPlayer(60_000);
    const { video } = clip();
    player.attach(video);
    video.dispatchEvent(new Event('error'));
    expect(player.getState()).toMatchObject({ media: 'failed', isPlaying: false, durationMs: 60_000 });
    player.request({ kind: 'seek', toMs: 9000 });
    expect(player.getState().positionMs).toBe(9000);
  });
});
