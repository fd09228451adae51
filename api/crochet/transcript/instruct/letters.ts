import { type Sentences } from '../sentences.ts';
import { type Token } from '../tokens.ts';
import { spokenProducts } from './products.ts';

/** The tokens of an instruction without the little words, and one letter for each, so that patterns can run over it. */
export interface Letters {
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
    // a pause between a number and its stitch parts nothing
    if (token.kind === '|' && text.endsWith('N') && tokens[i + 1]?.kind === 'S') continue;
    // "along the side" tells a place; "along" alone means to the end
    const isPlace =
      token.kind === 'A' &&
      !token.text.includes(' ') &&
      tokens[i + 1]?.kind === 'a' &&
      'wCGZS'.includes(tokens[i + 2]?.kind ?? '.');
    // "a row in single crochet," names the stitch and works none
    const isMention =
      token.kind === 'S' &&
      /^(?:in|of)$/.test(tokens[i - 1]?.text ?? '') &&
      ',.|&'.includes(tokens[i + 1]?.kind ?? '.');
    // "you know what an increase is": spoken of, not worked
    const isAsked =
      'SPD'.includes(token.kind) &&
      /^(?:is|are|was|means)$/.test(tokens[i + 1]?.text ?? '') &&
      tokens.slice(Math.max(from, i - 3), i).some((one) => one.text === 'what' || one.text === 'how');
    // "into the top of the chain three" is where it goes
    const chainEnd = token.kind === 'C' ? endOfNamedChain(tokens, from, i) : null;
    if (chainEnd !== null) {
      i = chainEnd - 1;
      continue;
    }
    // "in a single stitch" names the place
    const isLonePlace = token.text === 'single stitch' && (text.endsWith('I') || text.endsWith('IE'));
    const isLeft = /^leav(?:e|ing)$/.test(token.text) && tokens[i + 1]?.kind === 'N';
    const letter = isLeft ? 'K' : isPlace || isMention || isAsked ? 'w' : isLonePlace ? 'M' : letterOf(token);
    if (letter === '') continue;
    if (results.has(i) && !text.endsWith('=')) add('=', i - 1);
    add(letter, i);
  }
  return { text, tokens: kept, at, sentence };
}

const PART_OF =
  /\b(?:top|head|tip|start|end|side) (?:of )?(?:the|that|your|our|this|my)(?: (?:starting|turning|beginning|first))?$/;

/** Where a chain ends that only names a place; null where it is worked. */
function endOfNamedChain(tokens: readonly Token[], from: number, i: number): number | null {
  const before = tokens
    .slice(Math.max(from, i - 5), i)
    .map((token) => token.text)
    .join(' ');
  if (!PART_OF.test(before)) {
    // "the top of that three chain"
    return tokens[i - 1]?.kind === 'N' && PART_OF.test(before.replace(/ \S+$/, '')) ? i + 1 : null;
  }
  return tokens[i + 1]?.kind === 'N' && tokens[i + 2]?.kind !== 'S' ? i + 2 : i + 1;
}

function letterOf(token: Token): string {
  if (TAKES.has(token.text)) return 'g';
  if (token.kind === 'v') return '';
  if (token.kind === 'r' || token.kind === 'p') return 'p';
  return token.kind;
}
