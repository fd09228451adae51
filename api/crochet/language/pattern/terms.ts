import { type Terms } from '../../span.ts';
import { lexesOf } from '../lexer.ts';
import { plainLetters } from '../letters.ts';

export interface TermsFound {
  readonly terms: Terms;
  /** Why, in one sentence for the person. */
  readonly reason: string;
}

/**
 * US or UK, from what the pattern says of itself, else from a name only one side has, else from the height of its
 * starting chains and how fast it grows. US where nothing tells.
 */
export function termsOf(text: string): TermsFound {
  const plain = plainLetters(text);
  const declared =
    /\b(us|u\.s\.|american|usa|uk|u\.k\.|british|english)\b[ ]{0,2}(crochet )?(terms|terminology|term|stitch names|abbreviations)|(?:terms|terminology|written in|uses?):? (?:are |is |in )?(us|american|uk|british)\b/.exec(
      plain,
    );
  const word = declared?.[1] ?? declared?.[4];
  if (word) {
    const terms: Terms = /^u\.?s|amer/.test(word) ? 'US' : 'UK';
    return { terms, reason: `The pattern says ${terms} terms.` };
  }
  const us = /\b(sc|single crochet|s c|hdc|half double|sc2tog|scs)\b/.exec(plain);
  const uk = /\b(htr|half treble|tension|yrh|miss (?:next |the |\d|one )|dc ?2 ?tog and tr|rtrf|ttr)\b/.exec(plain);
  if (us && !uk) return { terms: 'US', reason: `"${us[0]}" is a US name.` };
  if (uk && !us) return { terms: 'UK', reason: `"${uk[0].trim()}" is a UK name.` };
  if (us) return { terms: 'US', reason: `"${us[0]}" is a US name, though UK words stand beside it.` };
  return heights(text);
}

/** A chain of one before `dc` speaks UK, of three US; a chain of three before `tr` UK, of four US; six and six more UK. */
function heights(text: string): TermsFound {
  const lexes = lexesOf(text.slice(0, 60_000), 'US');
  let us = 0;
  let uk = 0;
  let chain: number | null = null;
  let since = 0;
  lexes.forEach((lex, i) => {
    if (lex.kind === 'stitch' && lex.text === 'ch') {
      const near = [lexes[i - 1], lexes[i + 1], lexes[i + 2]].find((other) => other?.kind === 'num');
      // Only a chain that begins a line tells; one between stitches is a space.
      const before = lexes[i - 1]?.kind === 'num' ? lexes[i - 2] : lexes[i - 1];
      const begins =
        before === undefined || lex.broken || before.text === ':' || before.text === '.' || before.text === ';';
      chain = begins ? (near?.value ?? 1) : null;
      since = 0;
      return;
    }
    since += 1;
    if (lex.kind === 'ord' && lexes[i + 1]?.text === 'ch' && lexes[i + 2]?.text === 'hook') {
      const stitch = lexes.slice(Math.max(0, i - 5), i).findLast((other) => other.kind === 'stitch')?.text;
      if (stitch === 'dc' && lex.value === 2) uk += 1;
      if (stitch === 'dc' && lex.value === 4) us += 1;
      if (stitch === 'tr' && lex.value === 4) uk += 1;
      if (stitch === 'tr' && lex.value === 5) us += 1;
    }
    if (lex.kind !== 'stitch' || chain === null || since > 14) return;
    if (lex.text === 'dc') {
      if (chain === 1) uk += 1;
      if (chain === 3) us += 1;
    }
    if (lex.text === 'tr') {
      if (chain === 3) uk += 1;
      if (chain === 4) us += 1;
    }
    chain = null;
  });
  const six = /\b6 ?(dc|double crochet)\b[^.]{0,24}(ring|circle|loop|mr\b)/.test(plainLetters(text.slice(0, 60_000)));
  const twelve = /\(\s*12\b|\b12 (dc|sts)/.test(text) && /\(\s*18\b|\b18 (dc|sts)/.test(text);
  if (six && twelve) uk += 2;
  if (uk > us)
    return { terms: 'UK', reason: 'The starting chains and the growth of the rounds are those of UK terms.' };
  return {
    terms: 'US',
    reason: us > 0 ? 'The starting chains are those of US terms.' : 'Nothing tells the terms; US is taken.',
  };
}
