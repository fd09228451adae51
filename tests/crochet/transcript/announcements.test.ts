import { describe, expect, test } from 'vitest';
import { type DraftLine, readTranscript } from '#crochet';
import { talk } from './talk.ts';

const named = (text: string): readonly (string | null)[][] =>
  readTranscript(talk(text))
    .pieces.flatMap((piece) => piece.lines)
    .filter((line: DraftLine) => line.kind !== 'step')
    .map((line) => [line.label]);

const RING = 'Round one, six single crochet in a magic ring. |';
const LABELS = (text: string) => named(`${RING} ${text}`).map(([label]) => label);

describe('a round is announced', () => {
  test.each([
    ['as a range told from one to another', 'From round two to round six, single crochet in each.', ['R1', 'R2–6']],
    ['by a total that comes before it', 'Six for every one of rounds two to four, plain.', ['R1', 'R2–4']],
    ['as the next time around', 'Next time around, single crochet in every stitch.', ['R1', 'R2']],
    ['as once around', 'Then you go once around in single crochet, one in each stitch.', ['R1', 'R2']],
    ['as one lap more', 'And then one lap more of single crochet, each stitch gets one.', ['R1', 'R2']],
    [
      'after lines that were never heard',
      'Round nine, single crochet in each, six. | Round ten, the same. | Round eleven, the same. | Round twelve, the same.',
      ['R1', 'R9', 'R10', 'R11', 'R12'],
    ],
    ['by a word that sounds like it', 'Brown two, single crochet in each stitch, six.', ['R1', 'R2']],
    [
      'by a number with a letter missing',
      'Rond two, single crochet in each. | Round thre, the same.',
      ['R1', 'R2', 'R3'],
    ],
  ])('%s', (_, said, labels) => {
    expect(LABELS(said)).toEqual(labels);
  });

  test('under new numbers where earlier rows are worked again', () => {
    const said =
      'Chain seven. Row one, single crochet in the second chain from the hook and in each chain, six. | Row two, single crochet across, six. | Rows one and two again, now they are three and four.';
    expect(named(said).map(([label]) => label)).toEqual(['Foundation', 'Row 1', 'Row 2', 'Row 3', 'Row 4']);
  });
});

describe('nothing is announced', () => {
  test.each([
    ['by a place between rounds', 'Sew it on between round two and round three.'],
    ['by going around something', 'Pull the yarn around two fingers.'],
  ])('%s', (_, said) => {
    expect(LABELS(said)).toEqual(['R1']);
  });

  test('by a chain that is spoken of again before anything stands on it', () => {
    const said = 'Chain twelve. | Okay, those are my twelve chains. | Row one, single crochet in each chain.';
    expect(named(said).map(([label]) => label)).toEqual(['Foundation', 'Row 1']);
  });
});
