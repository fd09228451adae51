import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  alignWords,
  followWords,
  inHeardNumbers,
  matchLines,
  matchPieces,
  placeCorrections,
  readStretch,
  readTranscript,
  wordsAsHeard,
  wordsOf,
} from '#crochet';

const word = fc.constantFrom('round', 'single', 'then', 'two', 'increase', 'and', 'six', 'times', 'so', 'loop');
const talk = fc.array(word, { maxLength: 60 });
const sentence = (n: number) => ['Round', String(n), 'is', `word${n}`, 'then', `other${n}`, 'around'];

describe('words of two transcripts', () => {
  test('are found in order, each once, and only where they are the same', () => {
    fc.assert(
      fc.property(talk, talk, (a, b) => {
        const found = alignWords(a, b);
        const hits = found.filter((at) => at >= 0);
        expect(found).toHaveLength(b.length);
        expect(hits.every((at, n) => n === 0 || at > hits[n - 1]!)).toBe(true);
        found.forEach((at, n) => at >= 0 && expect(a[at]).toBe(b[n]));
      }),
    );
  });

  test('of the same transcript are each their own, however long it is', () => {
    const long = Array.from({ length: 3_000 }, (_, n) => sentence(n)).flat();
    expect(alignWords(long, long)).toEqual(long.map((_, n) => n));
  });

  test('are found again in a long transcript of which a tenth is said otherwise', () => {
    const a = Array.from({ length: 2_000 }, (_, n) => sentence(n)).flat();
    const b = a.map((text, n) => (n % 10 === 3 ? `x${n}` : text));
    const found = alignWords(a, b);
    expect(found.filter((at, n) => at === n).length).toBeGreaterThan(b.length * 0.89);
  });

  test('take their moments along when the new transcript begins later, and jump over what was put in between', () => {
    const cues = Array.from({ length: 40 }, (_, n) => ({
      startMs: n * 5_000,
      endMs: n * 5_000 + 3_000,
      text: sentence(n).join(' '),
    }));
    const later = cues.map((cue, n) => {
      const by = n < 20 ? 7_000 : 19_000;
      return { ...cue, startMs: cue.startMs + by, endMs: cue.endMs + by };
    });
    const follow = followWords(wordsOf(cues), wordsOf(later));
    expect([follow(0), follow(50_400), follow(150_000)]).toEqual([7_000, 57_400, 169_000]);
    expect(followWords(wordsOf(cues), wordsOf([]))(1_000)).toBeNull();
  });
});

describe('words of a corrected caption', () => {
  const cues = [
    { heard: 'Round two, single crow shay in each.', corrected: 'Round two, single crochet in each.' },
    { heard: 'That is twelve.', corrected: null },
  ];

  test('keep the numbers of the words they were heard as', () => {
    const [first, second] = wordsAsHeard(cues);
    expect(first!.map(({ text, first: a, last: b }) => `${text} ${a}-${b}`)).toEqual([
      'Round 0-0',
      'two, 1-1',
      'single 2-2',
      'crochet 3-4',
      'in 5-5',
      'each. 6-6',
    ]);
    expect(second!.map(({ first: a }) => a)).toEqual([7, 8, 9]);
  });

  test('have numbers that never fall and stay within their caption, whatever somebody wrote', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(talk, fc.option(talk, { nil: null })), { maxLength: 5 }), (rows) => {
        const given = rows.map(([heard, corrected]) => ({
          heard: heard.join(' '),
          corrected: corrected?.join(' ') ?? null,
        }));
        let start = 0;
        wordsAsHeard(given).forEach((words, n) => {
          const end = start + rows[n]![0].length;
          let last = start;
          for (const one of words) {
            expect(one.first).toBeGreaterThanOrEqual(last);
            expect(one.last).toBeGreaterThanOrEqual(one.first);
            if (end > start) expect(one.last).toBeLessThan(end);
            last = one.first;
          }
          start = end;
        });
      }),
    );
  });

  test('are told to the reading in the numbers of the file', () => {
    const text = (one: (typeof cues)[number]) => one.corrected ?? one.heard;
    const draft = readTranscript(
      cues.map((one, n) => ({ startMs: n * 5_000, endMs: n * 5_000 + 4_000, text: text(one) })),
    );
    const ends = inHeardNumbers(draft, cues).pieces.flatMap(({ lines }) =>
      lines.flatMap(({ evidence }) => evidence.map(({ role, lastWord }) => `${role} ${lastWord}`)),
    );
    expect(ends).toContain('work 6');
    expect(ends).toContain('total 9');
  });
});

describe('a mis-heard word', () => {
  const heard = (...texts: string[]) => texts.map((text) => ({ heard: text, corrected: null }));
  const correction = { firstWord: 2, lastWord: 4, heard: 'single crow shay', meant: 'single crochet', atMs: 900 };

  test('is shown among its neighbours, and written with its capital and its full stop', () => {
    const [one] = placeCorrections(heard('Now we Single crow shay. And turn'), [correction]);
    expect(one).toMatchObject({ cue: 0, isTaken: false, before: 'Now we', after: 'And turn' });
    expect(one!.changes).toEqual([{ cue: 0, text: 'Now we Single crochet. And turn' }]);
  });

  test('over the border of two captions changes both', () => {
    const [one] = placeCorrections(heard('Now we single', 'crow shay around'), [correction]);
    expect(one!.changes).toEqual([
      { cue: 0, text: 'Now we single' },
      { cue: 1, text: 'crochet around' },
    ]);
  });

  test('is done with once the caption says what was meant, and others in it are still found', () => {
    const cues = [{ heard: 'a b single crow shay c crow shay', corrected: 'a b single crochet c crow shay' }];
    const second = { firstWord: 6, lastWord: 7, heard: 'crow shay', meant: 'crochet', atMs: 2_000 };
    const [first, next] = placeCorrections(cues, [correction, second]);
    expect(first).toMatchObject({ isTaken: true, changes: [] });
    expect(next!.changes).toEqual([{ cue: 0, text: 'a b single crochet c crochet' }]);
  });
});

const kind = fc.constantFrom('round', 'row', 'step', 'foundation');
const line = fc.record({
  kind,
  label: fc.constant(''),
  from: fc.nat(6),
  to: fc.nat(6),
  text: talk.map((t) => t.join(' ')),
});
const lines = fc.array(line, { maxLength: 12 });

describe('an old draft and a new one', () => {
  test('give every line one partner at most, and a draft held against itself is found whole', () => {
    fc.assert(
      fc.property(lines, lines, (a, b) => {
        const hits = matchLines(a, b).filter((at) => at >= 0);
        expect(new Set(hits).size).toBe(hits.length);
        expect(hits.every((at) => at < b.length)).toBe(true);
        expect(matchLines(a, a)).not.toContain(-1);
      }),
    );
  });

  test('pieces that somebody renamed are found by what they are made of', () => {
    const round = (from: number, text: string) => ({ kind: 'round', label: '', from, to: from, text });
    const body = [round(1, '6 sc in magic ring'), round(2, 'inc around'), round(3, '(sc, inc) ×6')];
    const tail = [round(1, 'ch 30'), round(2, 'sl st in each')];
    const drafts = [
      { name: 'Body', lines: body },
      { name: 'Tail', lines: tail },
    ];
    const known = [
      { name: 'tail', lines: [] },
      { name: 'Head', lines: body },
    ];
    expect(matchPieces(drafts, known)).toEqual([1, 0]);
    expect(matchPieces(drafts, known, () => false)).toEqual([-1, 0]);
  });

  test('a step said in slightly other words between the same rounds is the same step', () => {
    const step = (text: string) => ({ kind: 'step', label: '', from: null, to: null, text });
    const round = (from: number) => ({ kind: 'round', label: '', from, to: from, text: 'sc around' });
    expect(
      matchLines(
        [round(1), step('Stuff the body firmly now.'), round(2)],
        [round(1), step('Stuff the body firmly.'), round(2)],
      ),
    ).toEqual([0, 1, 2]);
  });
});

describe('words that somebody chose', () => {
  const cues = [
    {
      startMs: 0,
      endMs: 4_000,
      corrected: null,
      heard: 'Now here we go, two single crochet and an increase, six times around.',
    },
    { startMs: 5_000, endMs: 7_000, corrected: null, heard: 'That makes twenty four.' },
  ];
  const setting = { unit: 'round', written: 'US' } as const;

  test('are read as a reading of the whole would read them', () => {
    expect(readStretch(cues, { ...setting, firstWord: 4, lastWord: 16, base: 18 })).toMatchObject({
      text: '(2 sc, inc) × 6',
      said: 24,
      verdict: 'agrees',
      from: null,
    });
  });

  test('are read as a total where they are nothing else, and as a sentence for a step', () => {
    expect(readStretch(cues, { ...setting, firstWord: 13, lastWord: 16, base: null })).toMatchObject({
      said: 24,
      startMs: 5_000,
      step: 'That makes twenty four.',
    });
  });

  test('name their round themselves', () => {
    const named = [
      {
        startMs: 0,
        endMs: 4_000,
        heard: 'Round for, one single in every stitch.',
        corrected: 'Round four, one single in every stitch.',
      },
    ];
    expect(readStretch(named, { ...setting, firstWord: 0, lastWord: 6, base: 24 })).toMatchObject({
      from: 4,
      to: 4,
      text: 'sc in each st around',
    });
  });

  test('never stop the reader, whichever they are', () => {
    fc.assert(
      fc.property(talk, fc.nat(70), fc.nat(70), (text, a, b) => {
        const spoken = [{ startMs: 0, endMs: 9_000, heard: text.join(' '), corrected: null }];
        const read = readStretch(spoken, { ...setting, firstWord: Math.min(a, b), lastWord: Math.max(a, b), base: 12 });
        expect(read === null).toBe(Math.min(a, b) >= text.length);
      }),
    );
  });
});
