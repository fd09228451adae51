import { describe, expect, test } from 'vitest';
import {
  arrivedBytes,
  begin,
  isComplete,
  move,
  partsToBegin,
  PARTS_AT_ONCE,
  progressOf,
  waitMs,
  type UploadEvent,
} from '../../web/features/recordings/upload/upload-state.ts';
import { aboutTime, ofBytes, uploadWords } from '../../web/features/recordings/upload/upload-words.ts';

const started = (have: readonly number[] = []): UploadEvent => ({
  type: 'started',
  uploadId: 'u',
  partSize: 100,
  have,
});
const after = (size: number, ...events: UploadEvent[]) => events.reduce(move, begin(size));
const LOOKED = { type: 'looked' } as const;
const began = (n: number): UploadEvent => ({ type: 'part-began', n });
const arrived = (n: number, at = 0, tookMs = 10): UploadEvent => ({ type: 'part-arrived', n, at, tookMs });

describe('a clip on its way up', () => {
  test('sends three parts at once, the first that are missing, and two beside an open bench', () => {
    const state = after(950, LOOKED, started([2]));
    expect(partsToBegin(state, PARTS_AT_ONCE)).toEqual([1, 3, 4]);
    expect(partsToBegin(state, 2)).toEqual([1, 3]);
    expect(partsToBegin([began(1), began(3)].reduce(move, state), 3)).toEqual([4]);
    expect(state.isResumed).toBe(true);
  });

  test('is complete with its last, shorter part', () => {
    const state = after(250, LOOKED, started([1, 2]), began(3), arrived(3));
    expect(isComplete(state)).toBe(true);
    expect(arrivedBytes(state)).toBe(250);
    expect(partsToBegin(state, 3)).toEqual([]);
  });

  test('waits longer after each failure, and begins anew after a part that arrived', () => {
    expect([1, 2, 3, 4, 5, 6, 7].map(waitMs)).toEqual([1_000, 2_000, 4_000, 8_000, 16_000, 30_000, 30_000]);
    const lost = after(950, LOOKED, started(), began(1), { type: 'lost', at: 5_000 });
    expect(lost).toMatchObject({ phase: 'waiting', underWay: [], failures: 1, retryAt: 6_000 });
    const again = [{ type: 'try-again' } as const, { type: 'lost', at: 9_000 } as const].reduce(move, lost);
    expect(again).toMatchObject({ failures: 2, retryAt: 11_000 });
    const on = [{ type: 'try-again' } as const, started(), began(1), arrived(1)].reduce(move, again);
    expect(on).toMatchObject({ phase: 'sending', failures: 0, have: [1] });
  });

  test('paused, stands still whatever comes in late, and keeps what had arrived', () => {
    const paused = after(950, LOOKED, started([1]), began(2), began(3), { type: 'pause' });
    expect(paused).toMatchObject({ phase: 'paused', underWay: [] });
    const late = [arrived(2), { type: 'lost', at: 1 } as const, { type: 'finishing' } as const].reduce(move, paused);
    expect(late).toMatchObject({ phase: 'paused', have: [1, 2] });
    expect(partsToBegin(late, 3)).toEqual([]);
    expect(move(late, { type: 'go-on' })).toMatchObject({ phase: 'starting', failures: 0 });
  });

  test('on a slow line sends one part at a time', () => {
    const state = after(950, LOOKED, started(), began(1), arrived(1, 0, 120_000));
    expect(partsToBegin(state, 3)).toEqual([2]);
    expect(partsToBegin([began(2), arrived(2)].reduce(move, state), 3)).toEqual([3, 4, 5]);
  });

  test('told that parts are missing after all, sends just those', () => {
    const state = after(300, LOOKED, started([1, 2, 3]), { type: 'finishing' }, { type: 'missing', parts: [2] });
    expect(state.phase).toBe('sending');
    expect(partsToBegin(state, 3)).toEqual([2]);
  });

  test('cancelled or whole, is at its end; refused, can be tried again', () => {
    const cancelled = after(300, LOOKED, started(), { type: 'cancel' });
    expect([{ type: 'go-on' } as const, arrived(1), started()].reduce(move, cancelled)).toBe(cancelled);
    const ready = after(300, LOOKED, started([1, 2, 3]), { type: 'finishing' }, { type: 'ready' });
    expect(move(ready, { type: 'pause' })).toBe(ready);
    const refused = after(300, { type: 'refused', reason: 'HEVC' });
    expect(refused).toMatchObject({ phase: 'refused', reason: 'HEVC' });
    expect(move(refused, { type: 'go-on' }).phase).toBe('starting');
  });

  test('tells how far, how fast and how long from the last seconds alone', () => {
    const state = [
      LOOKED,
      started([1]),
      began(2),
      { type: 'part-moved', n: 2, sentBytes: 10, at: 0 } as const,
      { type: 'part-moved', n: 2, sentBytes: 60, at: 5_000 } as const,
    ].reduce(move, begin(1_000));
    expect(progressOf(state)).toEqual({ sentBytes: 160, share: 0.16, bytesPerSecond: 10, secondsLeft: 84 });
    const stale = [{ type: 'part-moved', n: 2, sentBytes: 99, at: 60_000 } as const].reduce(move, state);
    expect(progressOf(stale).bytesPerSecond).toBeNull();
    // A form has a frame around the part: what is told never goes over the part itself.
    const over = move(state, { type: 'part-moved', n: 2, sentBytes: 400, at: 6_000 });
    expect(progressOf(over).sentBytes).toBe(200);
  });

  test('says so in words', () => {
    expect(aboutTime(20)).toBe('less than a minute');
    expect(aboutTime(230)).toBe('about 4 minutes');
    expect(aboutTime(7_000)).toBe('about 2 hours');
    expect(ofBytes(1_840_000_000, 2_960_000_000)).toBe('1.84 of 2.96 GB');
    expect(ofBytes(640_000, 2_960_000_000)).toBe('640 kB of 2.96 GB');
    const paused = after(200, LOOKED, started([1]), { type: 'pause' });
    expect(uploadWords(paused)).toBe('Paused. 50% up and kept.');
    expect(uploadWords(after(200, LOOKED, started([1]), { type: 'lost', at: 0 }))).toMatch(/goes on by itself/);
  });
});
