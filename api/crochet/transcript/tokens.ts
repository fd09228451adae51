import { type Class } from './lexicon/classes.ts';
import { MISHEARINGS, ORDINARY } from './lexicon/mishearings.ts';
import { readNumber } from './lexicon/numbers.ts';
import { PHRASES } from './lexicon/phrases.ts';
import { GUESSES, mendLetter, soundsLikeNumber, soundsLikeUnit } from './sound-likes.ts';
import { tidyNumbers } from './tidy-numbers.ts';
import { type Word } from './words.ts';

/** A stretch of speech with its class: one word, a phrase of the trade, a number of several words, or a break. */
export interface Token {
  readonly kind: Class;
  readonly value: string | number;
  /** Indices of the first and the last word it stands on; a break carries the word before it. */
  readonly first: number;
  readonly last: number;
  /** The plain words themselves. */
  readonly text: string;
  /** `twenty four` as twenty, then four. */
  readonly split: readonly [number, number] | null;
  /** A number taken from "to", "too" or "for": it may be the preposition after all. */
  readonly isGuess: boolean;
}

export interface Correction {
  readonly firstWord: number;
  readonly lastWord: number;
  readonly heard: string;
  readonly meant: string;
}

export interface Tokens {
  readonly tokens: readonly Token[];
  /** Trade words that were mis-heard, for the maker to take into the captions. */
  readonly corrections: readonly Correction[];
}

interface Atom {
  readonly text: string;
  readonly word: number;
  readonly breakAfter: '' | ',' | '.' | '|';
}

/** A silence of this many milliseconds parts sentences where nobody wrote a full stop. */
const SENTENCE_SILENCE = 1500;

/** Turns words into classed tokens: mis-hearings set right, numbers put together, phrases of the trade recognised. */
export function tokensOf(words: readonly Word[]): Tokens {
  const corrections: Correction[] = [];
  const atoms = mend(atomsOf(words), corrections);
  const texts = atoms.map((atom) => mendLetter(atom.text));
  const joined = (index: number) => atoms[index]?.breakAfter === '';
  const misheard = corrections.length > 1;
  const tokens: Token[] = [];
  for (let at = 0; at < atoms.length;) {
    const unit = soundsLikeUnit(texts, at, joined, tokens.at(-1));
    const token =
      unit === null
        ? (numberToken(texts, at, joined, tokens, misheard) ?? phraseToken(texts, at, joined))
        : { token: plain('U', unit, texts[at]!), length: 1 };
    const length = token.length;
    tokens.push({ ...token.token, first: atoms[at]!.word, last: atoms[at + length - 1]!.word });
    at += length;
    const mark = atoms[at - 1]!.breakAfter;
    if (mark !== '') tokens.push(breakToken(mark, atoms[at - 1]!.word));
  }
  return { tokens: tidyNumbers(tokens), corrections };
}

function atomsOf(words: readonly Word[]): Atom[] {
  const atoms: Atom[] = [];
  words.forEach((word, index) => {
    const plain = word.text
      .toLowerCase()
      .replace(/[’‘ʼ`]/g, "'")
      .replace(/[^\p{L}\p{N}'.-]/gu, '')
      .replace(/^['.-]+|['.-]+$/g, '');
    const parts = plain.split(/[-.]+/).flatMap((part) => /^(.+)('s|'re|'ve|'ll|'d|'m)$/.exec(part)?.slice(1) ?? [part]);
    const said = parts.filter((part) => part !== '').map((part, n) => spoken(part, n === 0 ? '' : parts[n - 1]!));
    const silent = (words[index + 1]?.silenceMs ?? 0) > SENTENCE_SILENCE;
    said.forEach((text, n) => {
      atoms.push({ text, word: index, breakAfter: n < said.length - 1 ? '' : silent ? '|' : word.mark });
    });
  });
  return atoms;
}

const LONG_FORMS: Readonly<Record<string, string>> = {
  "'re": 'are',
  "'ll": 'will',
  "'ve": 'have',
  "'m": 'am',
  "'d": 'would',
};
const BEFORE_IS = /^(?:that|it|there|here|what|which|he|she|who|where|thats)$/;

/** Contractions in full, so that "that's" and "that is" are one; a name's "'s" is left alone. */
function spoken(part: string, before: string): string {
  if (part === "'s" && BEFORE_IS.test(before)) return 'is';
  return LONG_FORMS[part] ?? part;
}

/** Puts the trade word in the place of what was mis-heard. */
function mend(atoms: readonly Atom[], corrections: Correction[]): Atom[] {
  const out: Atom[] = [];
  for (let at = 0; at < atoms.length;) {
    const found = BY_FIRST.get(atoms[at]!.text)?.find(({ heard }) =>
      heard.every(
        (text, n) => atoms[at + n]?.text === text && (n === heard.length - 1 || atoms[at + n]!.breakAfter !== '.'),
      ),
    );
    if (found === undefined) {
      out.push(atoms[at]!);
      at += 1;
      continue;
    }
    const end = atoms[at + found.heard.length - 1]!;
    found.meant.forEach((text, n) => {
      const isLast = n === found.meant.length - 1;
      out.push({ text, word: isLast ? end.word : atoms[at]!.word, breakAfter: isLast ? end.breakAfter : '' });
    });
    const heard = found.heard.join(' ');
    if (!ORDINARY.has(heard)) {
      corrections.push({ firstWord: atoms[at]!.word, lastWord: end.word, heard, meant: found.meant.join(' ') });
    }
    at += found.heard.length;
  }
  return out;
}

const BY_FIRST = new Map<string, (typeof MISHEARINGS)[number][]>();
for (const entry of MISHEARINGS) BY_FIRST.set(entry.heard[0]!, [...(BY_FIRST.get(entry.heard[0]!) ?? []), entry]);
for (const entries of BY_FIRST.values()) entries.sort((a, b) => b.heard.length - a.heard.length);

interface Found {
  readonly token: Omit<Token, 'first' | 'last'>;
  readonly length: number;
}

/** Phrases in which "one", "second" or "first" is no number. */
const NO_NUMBER =
  /^(?:one of you|second one|one after|one beside|one another|one day|one moment|one more thing|one thing|no one)\b/;

function numberToken(
  texts: readonly string[],
  at: number,
  joined: (index: number) => boolean,
  before: readonly Token[],
  misheard: boolean,
): Found | null {
  const text = texts[at]!;
  if (NO_NUMBER.test(texts.slice(at, at + 3).join(' '))) return null;
  if (text === 'one' && isPronoun(before)) {
    return { token: before.at(-2)?.kind === 'I' ? plain('G', 'st', text) : plain('a', 0, text), length: 1 };
  }
  const spoken = readNumber(texts, at, joined) ?? soundsLikeNumber(texts, at, joined(at), before, misheard);
  if (spoken === null) return null;
  // "a hundred": the article belongs to the number, and nothing else begins with one.
  const isGuess = GUESSES.has(text);
  const kind = spoken.isOrdinal ? 'O' : 'N';
  return {
    token: {
      kind,
      value: spoken.value,
      text: texts.slice(at, at + spoken.length).join(' '),
      split: spoken.split,
      isGuess,
    },
    length: spoken.length,
  };
}

/** `the third one`, `this one`, `another one`: the word stands for a thing. */
function isPronoun(tokens: readonly Token[]): boolean {
  const before = tokens.at(-1);
  if (before === undefined) return false;
  if (before.kind === 'w' && /^(?:the|a|this|that|my|your)$/.test(tokens.at(-2)?.text ?? '')) return true;
  return (
    'OXL'.includes(before.kind) ||
    /^(?:this|that|which|another|any|no|pretty|easy|big|little|good|other)$/.test(before.text)
  );
}

function phraseToken(texts: readonly string[], at: number, joined: (index: number) => boolean): Found {
  const phrase = PHRASES.get(texts[at]!)?.find(({ words }) =>
    words.every((word, n) => texts[at + n] === word && (n === words.length - 1 || joined(at + n))),
  );
  if (phrase === undefined) return { token: plain('w', 0, texts[at]!), length: 1 };
  return { token: plain(phrase.kind, phrase.value, phrase.words.join(' ')), length: phrase.words.length };
}

function plain(kind: Class, value: string | number, text: string): Found['token'] {
  return { kind, value, text, split: null, isGuess: false };
}

function breakToken(mark: ',' | '.' | '|', word: number): Token {
  return { kind: mark, value: 0, first: word, last: word, text: mark, split: null, isGuess: false };
}
