import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type DraftLine, readTranscript, spellWork } from '#crochet';
import { talk } from './talk.ts';

function lines(text: string): readonly DraftLine[] {
  return readTranscript(talk(text)).pieces.flatMap((piece) => piece.lines);
}

const START = 'Round one, six single crochet in a magic ring. | ';
const brief = (line: DraftLine | undefined) => [
  line?.from,
  line?.to,
  spellWork(line?.units ?? []).length,
  line?.said?.sts?.[0] ?? null,
  line?.verdict,
];

describe('a maker who talks', () => {
  test('gets a round with its work, its total and the words it came from', () => {
    const line = lines(`${START}Round two, increase in every stitch, and that's twelve.`)[1]!;
    expect(line.label).toBe('R2');
    expect(line.text).toBe('inc in each st around');
    expect(line.said).toEqual({ sts: [12] });
    expect(line.verdict).toBe('agrees');
    expect(line.evidence.map((one) => one.role)).toEqual(['announcement', 'work', 'total']);
    expect(line.evidence[2]!.words).toBe('twelve.');
  });

  test.each([
    ['On to round two. Two in each. Twelve.', [2, 2, 6, 12, 'agrees']],
    ['Next round, increase all the way around, twelve.', [2, 2, 6, 12, 'agrees']],
    ['The second round is two single crochet in every stitch, so twelve stitches.', [2, 2, 6, 12, 'agrees']],
    ['Two, two in each, twelve.', [2, 2, 6, 12, 'agrees']],
    ['For the next three rounds, so two, three and four, single crochet in each stitch, six.', [2, 4, 6, 6, 'agrees']],
    ['Rounds two through five are plain, six every time.', [2, 5, 6, 6, 'agrees']],
    ['Round two, single, increase, three times, for nine.', [2, 2, 6, 9, 'agrees']],
    ['Round two, decrease three times, and you have three.', [2, 2, 3, 3, 'agrees']],
  ])('may announce and count in many ways: %s', (said, expected) => {
    expect(brief(lines(START + said)[1])).toEqual(expected);
  });

  test('who counts wrong is shown what is wrong, not smoothed over', () => {
    expect(lines(`${START}Round two, increase in every stitch, that gives you thirteen.`)[1]!.verdict).toBe('differs');
    expect(lines(`${START}Round two, two single crochet and a decrease, four times, that's twelve.`)[1]!.verdict).toBe(
      'does-not-fit',
    );
  });

  test('who takes a number back is believed the second time', () => {
    const line = lines(`${START}Round two, increase in every stitch, that's eleven, no, twelve.`)[1]!;
    expect(line.said).toEqual({ sts: [12] });
  });

  test('who looks back at a round or counts aloud announces nothing', () => {
    const read = lines(
      `${START}Round two, increase in every stitch, twelve. | So that was round two. Before we go on, one, two, three, four, five, six, seven.`,
    );
    expect(read.filter((line) => line.kind !== 'step')).toHaveLength(2);
  });

  test('in UK terms is read in UK terms, with the reason', () => {
    const draft = readTranscript(
      talk(
        'Round one, six double crochet in a magic ring. | Round two, half treble in each stitch, miss none. | Round three, a treble in each stitch.',
      ),
    );
    expect(draft.terms).toBe('UK');
    expect(draft.termsReason).toContain('half treble');
    expect(draft.pieces[0]!.lines.map((line) => spellWork(line.units)[0])).toEqual(['sc', 'hdc', 'dc']);
  });

  test('through a recogniser that hears crow shay is still understood, and shown what was heard', () => {
    const draft = readTranscript(
      talk(
        'um okay round one six single crow shay in a magic ring | round to is an in crease in every stitch so twelve',
      ),
    );
    expect(draft.pieces[0]!.lines.map((line) => line.said?.sts?.[0] ?? null)).toEqual([null, 12]);
    expect(draft.corrections.map((one) => [one.heard, one.meant])).toContainEqual([
      'single crow shay',
      'single crochet',
    ]);
  });

  test('who says something that cannot be worked out gets those words quoted', () => {
    const line = lines(`${START}Round two, and so on, tapering as you like.`)[1]!;
    expect(line.verdict).toBe('unread');
    expect(line.unread?.quote).toContain('tapering as you like');
    expect(line.confidence).toBe('ask');
  });

  test('of two ears gets a piece to make twice', () => {
    const draft = readTranscript(
      talk(`${START}Fasten off. | Now for the ears, make two. Round one, five single crochet in a magic ring.`),
    );
    expect(draft.pieces.map((piece) => [piece.name, piece.make])).toEqual([
      [expect.any(String), 1],
      ['Ear', 2],
    ]);
  });

  test('in another language is told so, and nothing is invented', () => {
    const draft = readTranscript(talk('Wir häkeln heute eine kleine Maus, ganz in Ruhe und mit viel Liebe.'));
    expect(draft.pieces).toEqual([]);
    expect(draft.notice).toContain('by hand');
  });
});

describe('whatever is said', () => {
  const WORDS =
    'round row two three to for single crochet double increase decrease chain skip times around that is six twelve in each next same corner no sorry and then , . magic ring loops back together'.split(
      ' ',
    );

  test('the reader answers, with words and times that exist', () => {
    fc.assert(
      fc.property(fc.array(fc.constantFrom(...WORDS), { maxLength: 120 }), (words) => {
        const cues = talk(words.join(' '));
        const count = cues.flatMap((cue) => cue.text.split(/\s+/).filter((word) => /\p{L}|\p{N}/u.test(word))).length;
        for (const line of readTranscript(cues).pieces.flatMap((piece) => piece.lines)) {
          expect(line.startMs).toBeLessThanOrEqual(line.endMs);
          for (const one of line.evidence) {
            expect(one.firstWord).toBeGreaterThanOrEqual(0);
            expect(one.lastWord).toBeLessThan(count);
          }
        }
      }),
      { numRuns: 150 },
    );
  });

  test('strange cues never throw', () => {
    fc.assert(
      fc.property(
        fc.array(
          fc.record({
            startMs: fc.integer({ min: 0, max: 9_000_000 }),
            endMs: fc.integer({ min: 0, max: 9_000_000 }),
            text: fc.string({ unit: 'binary', maxLength: 60 }),
          }),
          { maxLength: 30 },
        ),
        (cues) => {
          expect(readTranscript(cues).pieces).toBeInstanceOf(Array);
        },
      ),
      { numRuns: 150 },
    );
  });
});
