import { NO_PART, SHADES, SINGULARS } from './lexicon/no-names.ts';
import { type Sentences } from './sentences.ts';
import { type Token } from './tokens.ts';

/** Where a piece is introduced: what is said before its first line. */
export interface Introduction {
  readonly from: number;
  readonly to: number;
  readonly sentences: Sentences;
  readonly make: number;
  /** The words that are spoken of as things anywhere in the talk. */
  readonly things: ReadonlySet<string>;
}

/** How far before its first line a part is named; what the whole thing is may be told long before. */
const NEAR = 50;
const LONGEST = 2;

/** Said before a part that is about to be made: `let's start with the cap`, `now for the ears`, `make the tail`. */
const BEGINS =
  /\b(?:(?:start|starts|starting|begin|begins|beginning) (?:off |out |us |here )?(?:with|on|by making)|(?:now|next|then|onto|on to|over to|move on to|moving on to|time for|ready for|that leaves|leaves|here comes|next comes|next up|next is|first is|we have|first) (?:for|to|up|comes|is|are|it is)?|(?:make|making|work|do|doing|need) )\s*$/;
/** Said of the whole thing at the opening: `today it's a little lemon`, `we're making an owl`. */
const OPENS =
  /\b(?:today(?: it is| we have| is)?|this is|it is|make|makes|making|crochet|crocheting|build|building)(?: (?:a|an|the|our|this|my|little|big|lovely|simple|such|quick))+$/;
const IDLE = /\b(?:if|when|after|before|because|until|don't|not|never|like|sew|attach|between|without|i show)\b/;
const AFTER = new Set(
  'make made makes making worked working which who that is are and in with so you we they i he she it go goes going now next then first need needs start starts begin begins again to for on of from out has have wants comes want because today because here please today all both as at just this these those there about using one two three four'.split(
    ' ',
  ),
);

/**
 * What the piece is called: a noun in words that name what is about to be made, the plainest and latest of them. Null
 * where nobody says so plainly, since a wrong name is worse than none.
 */
export function readPieceName(tokens: readonly Token[], intro: Introduction): string | null {
  let best: { readonly name: string; readonly score: number } | null = null;
  const isFirst = intro.from === 0;
  for (let i = intro.from; i < intro.to; i++) {
    const phrase = phraseAt(tokens, i, intro.to);
    if (phrase === null) continue;
    const score = scoreOf(tokens, i, phrase, intro, isFirst);
    if (score > 0 && (best === null || score >= best.score)) best = { name: phrase.name, score };
    i = phrase.end - 1;
  }
  if (best !== null) return titled(intro.make > 1 ? singular(best.name) : best.name);
  const saysBody = tokens.slice(intro.from, intro.to).some((token) => token.text === 'body');
  return isFirst && saysBody ? 'Body' : null;
}

interface Phrase {
  readonly name: string;
  readonly head: string;
  readonly end: number;
}

/** One or two plain words up to a pause, a verb or a word that goes on; colours before the noun are left away. */
function phraseAt(tokens: readonly Token[], from: number, to: number): Phrase | null {
  const before = tokens[from - 1];
  if (before?.kind === 'w' && !AFTER.has(before.text) && !SHADES.has(before.text)) return null;
  const words: string[] = [];
  let end = from;
  while (end < to && isPlainWord(tokens, end) && !AFTER.has(tokens[end]!.text)) {
    words.push(tokens[end]!.text);
    end += 1;
  }
  const named = words.filter((word) => !SHADES.has(word));
  const head = named.at(-1);
  if (head === undefined || named.length > LONGEST || words.at(-1) !== head) return null;
  if (named.some((word) => NO_PART.has(word) || !/^[a-z][a-z'-]{2,}$/.test(word) || /ly$|ed$|n't$/.test(word)))
    return null;
  if (named.slice(0, -1).some((word) => word.endsWith('ing'))) return null;
  return { name: named.join(' '), head, end };
}

/** "Leaves" also means what is left over; after a number or an article it is a thing. */
function isPlainWord(tokens: readonly Token[], at: number): boolean {
  const { kind, text } = tokens[at]!;
  const before = tokens[at - 1];
  return kind === 'w' || (text === 'leaves' && (before?.kind === 'N' || before?.kind === 'a'));
}

/** How plainly the words before and after say that this is what is made: 0 where they don't. */
function scoreOf(
  tokens: readonly Token[],
  at: number,
  phrase: Phrase,
  { from, to, sentences, make, things }: Introduction,
  isFirst: boolean,
): number {
  const start = Math.max(from, sentences.startOf[at]!);
  const lead = tokens
    .slice(Math.max(start, at - 8), at)
    .map((token) => token.text)
    .join(' ');
  if (IDLE.test(lead)) return 0;
  const after = tokens[phrase.end];
  const closes = after === undefined || phrase.end >= to || ',.|'.includes(after.kind);
  const isNear = to - at <= NEAR;
  const bare = lead.replace(
    /(?:\b(?:the|a|an|our|my|your|his|her|its|this|that|of all|little|big|\d+|two|three|four|five|six|seven|eight)\s*)+$/,
    '',
  );
  const isLed = bare.length < lead.length;
  const heads = tokens
    .slice(start, at)
    .every((token) => '~&aOXLNp,'.includes(token.kind) || /^(?:for|on|to|now|next)$/.test(token.text));
  const goesOn = closes || /^(?:make|makes|making|next|now|is|are|you|we|worked|which|go|and|in)$/.test(after.text);
  const isMany = make > 1 && singular(phrase.head) !== phrase.head;
  const isNamed = isLed || isMany || isThing(things, phrase.head);
  if (isNear && heads && sentences.isPunctuated && goesOn && isNamed) return closes ? 4 : 3.5;
  if (isNear && BEGINS.test(bare === '' ? bare : `${bare.trim()} `) && isNamed && goesOn) return 3;
  const isWhole = isFirst && OPENS.test(lead.trim());
  return isWhole && goesOn ? 2 : 0;
}

/** A bare word may be a verb or a call; a thing is somewhere spoken of as `the …`, `each …`. */
function isThing(things: ReadonlySet<string>, head: string): boolean {
  return things.has(head) || things.has(singular(head));
}

/** The words that are spoken of as things: once for the whole talk. */
export function thingsNamed(tokens: readonly Token[]): ReadonlySet<string> {
  const out = new Set<string>();
  tokens.forEach((token, n) => {
    if (/^(?:the|a|an|your|each|both|every)$/.test(tokens[n - 1]?.text ?? '')) out.add(token.text);
  });
  return out;
}

function singular(name: string): string {
  const words = name.split(' ');
  const last = words.pop()!;
  return [...words, SINGULARS.get(last) ?? withoutS(last)].join(' ');
}

function withoutS(word: string): string {
  if (/(?:ss|us|is)$/.test(word) || word.length < 4) return word;
  if (word.endsWith('ies')) return `${word.slice(0, -3)}y`;
  return word.replace(/(?<=ch|sh|x|ss)es$|s$/, '');
}

const titled = (name: string): string => `${name[0]!.toUpperCase()}${name.slice(1)}`;
