import { type Suggestion } from './draft.ts';
import { type Word } from './words.ts';

/** What a sentence of the talk may suggest for the sheet's heading, by the words in it. */
const KINDS: readonly { readonly kind: Suggestion['kind']; readonly words: RegExp; readonly anywhere: boolean }[] = [
  {
    kind: 'caution',
    words:
      /\b(?:under three|toddlers?|bab(?:y|ies)|choke|hot (?:pan|skillet)|melts?|candles?|flame|swallow|safety|necks?|wires?|pebbles)\b/i,
    anywhere: true,
  },
  {
    kind: 'technique',
    words: /\b(?:whole video|another video|video (?:on|about|just)|other video)\b/i,
    anywhere: true,
  },
  { kind: 'hook', words: /\bhook\b/i, anywhere: false },
  { kind: 'gauge', words: /\b(?:gauge|tension)\b/i, anywhere: false },
  {
    kind: 'yarn',
    words: /\b(?:yarn|cotton|wool|acrylic|worsted|ply|aran|chunky|skeins?|double knitting|fingering)\b/i,
    anywhere: false,
  },
  {
    kind: 'notion',
    words: /\b(?:needle|scissors|marker|stuffing|filling|polyfill|safety eyes|eyes|buttons?|ribbon|clasp|washers)\b/i,
    anywhere: false,
  },
];
const LONGEST = 30;

/** Finds materials in the introduction, and cautions and pointers to other recordings anywhere. */
export function findSuggestions(words: readonly Word[], introEnd: number): readonly Suggestion[] {
  const out: Suggestion[] = [];
  for (let first = 0; first < words.length;) {
    let last = first;
    while (
      last < words.length - 1 &&
      words[last]!.mark !== '.' &&
      last - first < LONGEST - 1 &&
      words[last + 1]!.silenceMs < 1500
    )
      last += 1;
    const text = words
      .slice(first, last + 1)
      .map((word) => word.text)
      .join(' ');
    for (const { kind, words: pattern, anywhere } of KINDS) {
      if ((anywhere || last < introEnd) && pattern.test(text)) out.push({ kind, text, atMs: words[first]!.startMs });
    }
    first = last + 1;
  }
  return out;
}
