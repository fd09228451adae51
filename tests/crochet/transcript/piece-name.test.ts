import { describe, expect, test } from 'vitest';
import { readTranscript } from '#crochet';
import { talk } from './talk.ts';

const FIRST = 'Round one, six single crochet in a magic ring, six. |';
const named = (text: string) => readTranscript(talk(text)).pieces.map((piece) => [piece.name, piece.make]);

describe('the name of a piece', () => {
  test.each([
    ["Right then, kettle's on. Today it's a little lemon, in a light cotton, number three, in yellow.", ['Lemon', 1]],
    [
      'A light cotton in wheat, two millimetre hook, an end of twenty centimetres. We start with the body.',
      ['Body', 1],
    ],
    ["Let's start with the cap.", ['Cap', 1]],
    ['You want brown yarn and eyes of six millimetres. I use American terms and we work in a spiral.', ['Piece 1', 1]],
    ['The body goes first in all of these. Brown yarn.', ['Body', 1]],
    ['Two legs, so make two.', ['Leg', 2]],
  ])('comes from the words that name what is made: %s', (opening, expected) => {
    expect(named(`${opening} ${FIRST}`)).toEqual([expected]);
  });

  test.each([
    ['Now the ears, make two.', ['Ear', 2]],
    ['Now the leaf. Make two of those.', ['Leaf', 2]],
    ['Now for the wings, make two of these.', ['Wing', 2]],
    ['Last of all, the tail. Make one.', ['Tail', 1]],
    ['Leave an end of twenty-five centimetres. Change to the red yarn.', ['Piece 2', 1]],
    ['Next the green stalk.', ['Stalk', 1]],
    ['Arms, a pair of them.', ['Arm', 2]],
    ['Two leaves, in moss.', ['Leaf', 2]],
    ["Now the skirt. Find the front loops we left. There's fifteen of them.", ['Skirt', 1]],
  ])('of a later piece likewise: %s', (intro, expected) => {
    expect(
      named(
        `We start with the cap. ${FIRST} Round two, increase in every stitch, twelve. | Fasten off. ${intro} ${FIRST}`,
      ),
    ).toEqual([['Cap', 1], expected]);
  });
});
