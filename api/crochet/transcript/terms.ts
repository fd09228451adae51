import { type Terms } from '../span.ts';
import { type Token } from './tokens.ts';

export interface InferredTerms {
  readonly terms: Terms;
  /** Why, in a sentence for the maker. */
  readonly reason: string;
}

/** What speaks for which terms, how strongly a time it is said, and how often it may count. */
const EVIDENCE: readonly {
  readonly terms: Terms;
  readonly words: RegExp;
  readonly weight: number;
  readonly most: number;
  readonly reason: string;
}[] = [
  { terms: 'UK', words: /^(?:uk|british|english)$/, weight: 8, most: 1, reason: 'the speaker says so' },
  {
    terms: 'UK',
    words: /^half trebles?$|^half treble crochet$|^htr$/,
    weight: 4,
    most: 3,
    reason: '“half treble” is only said in UK terms',
  },
  {
    terms: 'UK',
    words: /^(?:trebles?|treble crochets?)$/,
    weight: 1.5,
    most: 4,
    reason: '“treble” is said again and again',
  },
  { terms: 'UK', words: /^double trebles?$/, weight: 2, most: 2, reason: '“double treble” is said' },
  { terms: 'UK', words: /^miss(?:es|ing)?$/, weight: 1, most: 3, reason: 'stitches are “missed”, not skipped' },
  { terms: 'UK', words: /^tension$/, weight: 2, most: 1, reason: '“tension” is said for gauge' },
  {
    terms: 'UK',
    words: /^yarn round(?: hook)?$|^wool round(?: the hook)?$/,
    weight: 2,
    most: 2,
    reason: '“yarn round” is said',
  },
  {
    terms: 'US',
    words: /^single crochets?$|^sc$/,
    weight: 4,
    most: 3,
    reason: '“single crochet” is only said in US terms',
  },
  { terms: 'US', words: /^singles?$/, weight: 1.5, most: 4, reason: '“single” is said again and again' },
  {
    terms: 'US',
    words: /^half doubles?$|^half double crochets?$|^hdc$/,
    weight: 4,
    most: 3,
    reason: '“half double” is only said in US terms',
  },
  { terms: 'US', words: /^skip(?:s|ping)?$/, weight: 1, most: 3, reason: 'stitches are “skipped”' },
  { terms: 'US', words: /^gauge$/, weight: 2, most: 1, reason: '“gauge” is said' },
  {
    terms: 'US',
    words: /^(?:color|colors|gray|inch|inches|yards)$/,
    weight: 0.5,
    most: 2,
    reason: 'the words are American',
  },
  {
    terms: 'UK',
    words: /^(?:colour|colours|millimetres?|centimetres?)$/,
    weight: 0.5,
    most: 2,
    reason: 'the words are British',
  },
];

/** Infers US or UK terms from everything that was said, and tells the strongest reason. */
export function inferTerms(tokens: readonly Token[]): InferredTerms {
  const sums = { US: 0, UK: 0 };
  const strongest = { US: { weight: 0, reason: '' }, UK: { weight: 0, reason: '' } };
  for (const { terms, words, weight, most, reason } of EVIDENCE) {
    const times = Math.min(most, tokens.filter((token) => words.test(token.text)).length);
    const sum = times * weight;
    sums[terms] += sum;
    if (sum > strongest[terms].weight) strongest[terms] = { weight: sum, reason };
  }
  const terms: Terms = sums.UK > sums.US ? 'UK' : 'US';
  const { reason } = strongest[terms];
  return {
    terms,
    reason: reason === '' ? 'Nothing speaks for UK terms.' : `${reason[0]!.toUpperCase()}${reason.slice(1)}.`,
  };
}

/** What a stitch that was named comes to in US words, by the terms that are spoken. */
const NAMES: Readonly<Record<Terms, Readonly<Record<string, string>>>> = {
  US: { htr: 'hdc', tr: 'tr' },
  UK: { sc: 'sc', dc: 'sc', htr: 'hdc', hdc: 'hdc', tr: 'dc', dtr: 'tr' },
};

/** Gives every stitch its US name. */
export function inUsTerms(tokens: readonly Token[], terms: Terms): readonly Token[] {
  const names = NAMES[terms];
  return tokens.map((token) => {
    if (token.kind !== 'S' && token.kind !== 'D') return token;
    const name = names[String(token.value)];
    return name === undefined ? token : { ...token, value: name };
  });
}
