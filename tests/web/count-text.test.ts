// @vitest-environment node
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fromFragment, toFragment } from '../../web/count/share/share-link.ts';
import { redo, startHistory, undo, write } from '../../web/count/text/history.ts';
import { applyChanges, applyPatch, moveSpan, patchBetween, reversed } from '../../web/count/text/patch.ts';
import { Counter } from '../../web/count/worker/counter.ts';
import { keepIds } from '../../web/count/worker/keep-ids.ts';
import { readTextBytes } from '../../web/lib/text-file.ts';

const CAP = 'R1: 6 sc in magic ring (6)\nR2: inc x 6 (12)\nR3: (sc, inc) x 6 (18)\n';
const onwards = () => Promise.resolve(true);

describe('what is typed', () => {
  test('is kept as the smallest change, which leads there and back', () => {
    fc.assert(
      fc.property(fc.string(), fc.string(), fc.string(), (a, b, c) => {
        const [before, after] = [a + b, a + c + b];
        const patch = patchBetween(before, after);
        if (!patch) return before === after;
        return applyPatch(before, patch) === after && applyPatch(after, reversed(patch)) === before;
      }),
    );
  });

  test('moves what stands behind it and lets go of what it touches', () => {
    const patch = patchBetween('one two three', 'one 22 two three');
    expect(moveSpan({ start: 0, end: 3 }, patch)).toEqual({ start: 0, end: 3 });
    expect(moveSpan({ start: 8, end: 13 }, patch)).toEqual({ start: 11, end: 16 });
    expect(moveSpan({ start: 2, end: 8 }, patch)).toBeNull();
  });

  test('goes back letter by letter as it was typed, repairs by themselves, and comes again', () => {
    let history = startHistory('');
    for (const [i, text] of ['R', 'R1', 'R1:'].entries()) history = write(history, text, '', i * 100);
    history = write(history, 'R1: 6 sc', 'R1 mended', 400);
    const back = undo(history)!;
    expect([back.history.text, back.what]).toEqual(['R1:', 'R1 mended']);
    const first = undo(back.history)!;
    expect(first.history.text).toBe('');
    expect(undo(first.history)).toBeNull();
    expect(redo(redo(first.history)!.history)!.history.text).toBe('R1: 6 sc');
  });

  test('of many changes at once each stands where it was told', () => {
    const changes = [
      { span: { start: 4, end: 7 }, text: '2' },
      { span: { start: 0, end: 0 }, text: '>' },
    ];
    expect(applyChanges('one two three', changes)).toBe('>one 2 three');
  });
});

describe('a link', () => {
  test('carries any text there and back, with what was chosen', async () => {
    await fc.assert(
      fc.asyncProperty(fc.string({ unit: 'grapheme', minLength: 1 }), async (text) => {
        const shared = { text, terms: 'UK', base: 24 } as const;
        expect(await fromFragment(await toFragment(shared))).toEqual(shared);
      }),
      { numRuns: 40 },
    );
    expect((await toFragment({ text: CAP.repeat(20), terms: null, base: null })).length).toBeLessThan(200);
  });

  test('that was cut, or swells without end, is told from one that is whole; other fragments are none', async () => {
    const whole = await toFragment({ text: CAP.repeat(20), terms: null, base: null });
    expect(await fromFragment(whole.slice(0, 40))).toBe('broken');
    const bomb = await toFragment({ text: 'a'.repeat(3_000_001), terms: null, base: null });
    expect(bomb.length).toBeLessThan(10_000);
    expect(await fromFragment(bomb)).toBe('broken');
    expect(await fromFragment('#page')).toBeNull();
  });
});

describe('a text that is counted again and again', () => {
  test('keeps the id of every line but the one that is new', () => {
    const before = ['a', 'b', 'c'].map((of) => ({ id: of, of }));
    const same = (a: string, b: string) => a === b;
    expect(keepIds(before, ['a', 'x', 'b', 'c'], same, () => 'new')).toEqual(['a', 'new', 'b', 'c']);
    expect(keepIds(before, ['a', 'bb', 'c'], same, () => 'new')).toEqual(['a', 'b', 'c']);
    expect(keepIds(before, ['a', 'c'], same, () => 'new')).toEqual(['a', 'c']);
  });

  test('tells only the pieces that are not as before, and the same as a count from the start', async () => {
    const text = `A (make 1)\n${CAP}\nB (make 1)\n${CAP}`;
    const counter = new Counter();
    const ask = (words: string) => counter.count({ text: words, terms: null, base: null }, onwards);
    await ask(text);
    const mended = text.replace(/inc x 6 \(12\)(?![\s\S]*inc x 6)/, 'inc x 5 (12)');
    const again = (await ask(mended))!;
    expect(again.pieces.map(({ rows }) => rows !== null)).toEqual([false, true]);
    const fresh = (await new Counter().count({ text: mended, terms: null, base: null }, onwards))!;
    const verdicts = (counted: typeof fresh) => counted.pieces[1]!.rows!.rows.map(({ verdict }) => verdict);
    expect(verdicts(again)).toEqual(verdicts(fresh));
  });

  test('tells after a count that was broken off what that one had counted', async () => {
    const text = `A (make 1)\n${CAP}\nB (make 1)\n${CAP}`;
    const counter = new Counter();
    const asked = { text, terms: null, base: null };
    expect(await counter.count(asked, (done) => Promise.resolve(done === 0))).toBeNull();
    const whole = (await counter.count(asked, onwards))!;
    expect(whole.pieces.map(({ rows }) => rows?.rows.length)).toEqual([3, 3]);
  });

  test('offers house style only where the count stays as it is', async () => {
    const counter = new Counter();
    await counter.count({ text: CAP, terms: null, base: null }, onwards);
    const styled = applyChanges(CAP, counter.house());
    expect(styled).toContain('×');
    const after = (await new Counter().count({ text: styled, terms: null, base: null }, onwards))!;
    expect(after.pieces[0]!.rows!.rows.map(({ verdict }) => verdict)).toEqual(['agrees', 'agrees', 'agrees']);
  });
});

describe('a text file', () => {
  const bytes = (...all: number[]) => Uint8Array.from(all);
  test('is read in the encodings that people have', () => {
    expect(readTextBytes(new TextEncoder().encode('\uFEFF½ turn'))).toEqual({ text: '½ turn', encoding: 'UTF-8' });
    expect(readTextBytes(bytes(0x52, 0x31, 0x20, 0xe9, 0x20, 0xbd))).toEqual({
      text: 'R1 é ½',
      encoding: 'Windows-1252',
    });
    const wide = bytes(0xff, 0xfe, ...Array.from('R1: 6 sc').flatMap((c) => [c.charCodeAt(0), 0]));
    expect(readTextBytes(wide)).toEqual({ text: 'R1: 6 sc', encoding: 'UTF-16' });
  });
  test('that is empty, too large or no text is named as such', () => {
    expect(readTextBytes(bytes(0x20, 0x0a))).toEqual({ problem: 'empty' });
    expect(readTextBytes(new Uint8Array(1_000_001))).toEqual({ problem: 'too-large' });
    expect(readTextBytes(bytes(0x50, 0x4b, 0x03, 0x04, 0x00, 0x00, 0x08, 0x00))).toEqual({ problem: 'not-text' });
  });
});
