import { beforeEach, describe, expect, test } from 'vitest';
import { buildEdition, projectEdition } from '#crochet';
import type { PublicEdition } from '#contract/editions';
import { lineAt, momentIn, momentOf } from '../../web/watch/moments.ts';
import { placeText, stepAt, stepHash, stepName, stepsOf, stepTotal } from '../../web/watch/steps.ts';
import { currentStep, keep, moveOn, openAt, readKept, type WatchDeed } from '../../web/watch/watch-state.ts';
import { mouseSource } from '../support/mouse-source.ts';

const edition = projectEdition(buildEdition(mouseSource())) as unknown as PublicEdition;
const steps = stepsOf(edition);
const fresh = () => readKept(edition, localStorage);
const after = (...deeds: WatchDeed[]) => deeds.reduce((state, deed) => moveOn(steps, state, deed), fresh());
const here = (state = fresh()) => currentStep(steps, state)!;

beforeEach(() => localStorage.clear());

describe('what there is to work', () => {
  test('comes in working order: ranges round by round, a piece made twice comes twice', () => {
    expect(steps.map((step) => `${step.piece.name} ${step.copy} ${stepName(step)}`)).toEqual([
      ...['R1', 'R2', 'R3', 'R4', 'R5', 'R6', 'step', 'R7'].map((name) => `Body 1 ${name}`),
      ...['Ear 1 R1', 'Ear 1 R2', 'Ear 2 R1', 'Ear 2 R2', 'Tail 1 Row 1'],
    ]);
  });

  test('is named by its place', () => {
    expect(steps.map(placeText).filter((_, i) => [4, 6, 10, 12].includes(i))).toEqual([
      'Round 5 of 7, Body',
      'After R4–6, Body',
      'Round 1 of 2, Ear 2 of 2',
      'Row 1 of 1, Tail',
    ]);
    expect(stepTotal(steps[4]!, 'US')).toBe('18');
  });

  test('has addresses that lead back to it', () => {
    expect(steps.slice(0, 6).map(stepHash)).toEqual(['#mr1', '#mr2', '#mr3', '#mr46-4', '#mr46-5', '#mr46-6']);
    for (const step of steps.filter(({ copy }) => copy === 1)) expect(stepAt(steps, stepHash(step))).toBe(step);
    expect(stepAt(steps, '#mr46')).toBe(steps[3]);
    expect(stepAt(steps, '#mr46-99')).toBe(steps[3]);
    expect(stepAt(steps, '#nothing')).toBeUndefined();
  });
});

describe('ticking off', () => {
  test('goes on to the next that is not done', () => {
    const state = after({ kind: 'mark', keys: [steps[1]!.key], done: true }, { kind: 'tick' });
    expect(here(state)).toBe(steps[2]);
    expect(state.done).toEqual(new Set([steps[0]!.key, steps[1]!.key]));
  });

  test('goes round by round through a range, and copy by copy through a piece', () => {
    let state = fresh();
    const seen = steps.map(() => {
      const at = here(state);
      state = moveOn(steps, state, { kind: 'tick' });
      return at;
    });
    expect(seen).toEqual(steps);
    expect(state.done.size).toBe(steps.length);
    expect(here(state)).toBe(steps.at(-1));
  });

  test('can be taken back without moving', () => {
    const state = after({ kind: 'tick' }, { kind: 'mark', keys: [steps[0]!.key], done: false });
    expect(state.done.size).toBe(0);
    expect(here(state)).toBe(steps[1]);
  });

  test('before and next stop at the ends', () => {
    expect(here(after({ kind: 'before' }))).toBe(steps[0]);
    expect(here(after({ kind: 'go', key: steps.at(-1)!.key }, { kind: 'next' }))).toBe(steps.at(-1));
  });
});

describe('the place is kept', () => {
  test('in this browser, by pattern and edition', () => {
    const state = after({ kind: 'tick' }, { kind: 'tick' }, { kind: 'terms', terms: 'UK' }, { kind: 'mirror' });
    keep(edition, state, localStorage);
    expect(readKept(edition, localStorage)).toEqual(state);
    expect(readKept({ ...edition, edition: 2 }, localStorage).done.size).toBe(0);
  });

  test('without what a later edition no longer has, and without trusting what is stored', () => {
    localStorage.setItem(
      'roundelay.watch.h9m2k7p4.1',
      '{"at":"gone-1-1","done":["mr1-1-1",7,"gone-1-1"],"terms":"FR"}',
    );
    expect(fresh()).toEqual({ at: steps[0]!.key, done: new Set(['mr1-1-1']), terms: 'US', mirrored: false });
    localStorage.setItem('roundelay.watch.h9m2k7p4.1', 'not json');
    expect(here()).toBe(steps[0]);
  });

  test('and works in a browser that keeps nothing', () => {
    const broken = {
      getItem: () => {
        throw new Error('denied');
      },
      setItem: () => {
        throw new Error('denied');
      },
    };
    expect(readKept(edition, broken).at).toBe(steps[0]!.key);
    expect(() => keep(edition, fresh(), broken)).not.toThrow();
  });

  test('unless the address names a line', () => {
    const kept = after({ kind: 'tick' }, { kind: 'tick' });
    expect(here(openAt(edition, kept, '#mr46-5'))).toBe(steps[4]);
    expect(here(openAt(edition, kept, '#unknown'))).toBe(steps[2]);
    expect(here(openAt(edition, kept, ''))).toBe(steps[2]);
  });
});

describe('moments', () => {
  test('of a line run to the next line that is shown', () => {
    expect(momentOf(edition, steps[0]!.line)).toEqual({ recordingNumber: 1, startMs: 134_000, endMs: 245_000 });
    expect(momentOf(edition, steps.at(-1)!.line)).toEqual({ recordingNumber: 1, startMs: 1_660_000, endMs: 1_900_000 });
    expect(momentOf(edition, steps[6]!.line)).toBeNull();
  });

  test('are named in addresses by seconds, and by recording from the second on', () => {
    expect(momentIn('?t=90')).toEqual({ recordingNumber: 1, ms: 90_000 });
    expect(momentIn('?r=2&t=1.5')).toEqual({ recordingNumber: 2, ms: 1_500 });
    for (const search of ['', '?t=', '?t=x', '?t=-4', '?r=1.5&t=3'])
      expect(momentIn(search) ?? momentIn('?t=0')).not.toMatchObject({ ms: -4_000 });
    expect(momentIn('?t=x')).toBeNull();
  });

  test('lead back to their line', () => {
    expect(lineAt(edition, 1, 300_000)?.shortId).toBe('mr2');
    expect(lineAt(edition, 1, 0)).toBeUndefined();
    expect(lineAt(edition, 2, 300_000)).toBeUndefined();
  });
});
