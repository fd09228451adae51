import { type Sentences } from '../sentences.ts';
import { type Token } from '../tokens.ts';
import { bothEndsAt, endLetter, isAtEnd } from './ends.ts';
import { spokenProducts } from './products.ts';
import { endOfNamedChain, isSpokenOf } from './spoken-of.ts';

/** The tokens of an instruction without the little words, and one letter for each, so that patterns can run over it. */
export interface Letters {
  /** The whole row that they were taken from. */
  readonly source: readonly Token[];
  readonly text: string;
  readonly tokens: readonly Token[];
  /** Index of each in the whole row of tokens. */
  readonly at: readonly number[];
  readonly sentence: readonly number[];
}

const TAKES = new Set([
  'get',
  'gets',
  'takes',
  'take',
  'wants',
  'has',
  'receives',
  'asks for',
  'had',
  'receiving',
  'receive',
  'taking',
]);
const DROPPED = new Set<string>(['a', '~', '#']);

/** @param skipped tokens that are no instruction: the announcement's own numbers, demonstrations, recaps */
export function lettersOf(
  tokens: readonly Token[],
  from: number,
  to: number,
  sentences: Sentences,
  skipped: (index: number) => boolean,
): Letters {
  const kept: Token[] = [];
  const at: number[] = [];
  const sentence: number[] = [];
  let text = '';
  let isReason = false;
  const { factors, results } = spokenProducts(tokens, from, to);
  const add = (letter: string, i: number) => {
    kept.push(tokens[i]!);
    at.push(i);
    sentence.push(sentences.startOf[i]!);
    text += letter;
  };
  for (let i = from; i < to; i++) {
    const token = tokens[i]!;
    if (',.|'.includes(token.kind)) isReason = false;
    if (sentences.isPunctuated && /^(?:because|cause|although|unless)$/.test(token.text)) isReason = true;
    const isManner = token.kind === 'F' && text.endsWith('N') && tokens[i + 1]?.kind === 'S';
    if (skipped(i) || isReason || isManner || factors.has(i) || DROPPED.has(token.kind)) continue;
    // "three more trebles", "eight more, and two at the end"
    const isMore = token.kind === 'm' && text.endsWith('N') && 'SPDC,.|&'.includes(tokens[i + 1]?.kind ?? '.');
    if (isMore) continue;
    // a pause between a number and its stitch parts nothing
    if (token.kind === '|' && text.endsWith('N') && tokens[i + 1]?.kind === 'S') continue;
    // "along the side" tells a place; "along" alone means to the end
    const isPlace =
      token.kind === 'A' &&
      !token.text.includes(' ') &&
      tokens[i + 1]?.kind === 'a' &&
      'wCGZS'.includes(tokens[i + 2]?.kind ?? '.');
    const bothEnds = bothEndsAt(tokens, i, to);
    if (bothEnds !== null) {
      add('e', i);
      i = bothEnds - 1;
      continue;
    }
    // "into the top of the chain three" is where it goes
    const chainEnd = token.kind === 'C' ? endOfNamedChain(tokens, from, i) : null;
    if (chainEnd !== null) {
      i = chainEnd - 1;
      continue;
    }
    // "in a single stitch" names the place
    const isLonePlace = token.text === 'single stitch' && (text.endsWith('I') || text.endsWith('IE'));
    const isLeft = /^leav(?:e|ing)$/.test(token.text) && tokens[i + 1]?.kind === 'N';
    const isTalk = isPlace || isSpokenOf(tokens, from, i);
    const end = endLetter(tokens, i, text);
    const isAt = isAtEnd(tokens, i, text);
    const letter = isLeft ? 'K' : isTalk ? 'w' : isLonePlace ? 'M' : isAt ? 'I' : (end ?? letterOf(token));
    if (letter === '') continue;
    if (results.has(i) && !text.endsWith('=')) add('=', i - 1);
    add(letter, i);
  }
  return { source: tokens, text, tokens: kept, at, sentence };
}

function letterOf(token: Token): string {
  if (TAKES.has(token.text)) return 'g';
  if (token.kind === 'v') return '';
  if (token.kind === 'r' || token.kind === 'p') return 'p';
  return token.kind;
}
