import { type Sentences } from './sentences.ts';
import { type Token } from './tokens.ts';

const RECAP =
  /\b(?:that was|so round \w+ was|recap|to review|that there was|let us recall|where was i|so that was|did you notice|see how|if you (?:have|got|get|are at|are looking at) (?:\d+|\w+(?:teen|ty)|twelve|eleven|ten|nine|eight)|if yours|if your|somebody just asked|short version|would mean)\b/;
const DEMONSTRATION =
  /\b(?:let me (?:show|do|demonstrate|slow)|i shall demonstrate|if you have never|if you never done|for anybody who|for anyone who|some of you asked|a half treble is|what is a|rehearse|permit me|quick clinic|my decrease|around here we call)\b/;

/** Marks tokens that are no instruction: how a stitch is made, what was done before, what if it went wrong. */
export function findSkipped(tokens: readonly Token[], sentences: Sentences): readonly boolean[] {
  const out = new Array<boolean>(tokens.length).fill(false);
  for (let start = 0; start < tokens.length;) {
    const end = sentences.endOf[start]!;
    if (sentences.isPunctuated) markSentence(tokens, start, end, out);
    else markStretches(tokens, start, end, out);
    start = end;
  }
  return out;
}

function markSentence(tokens: readonly Token[], start: number, end: number, out: boolean[]): void {
  const part = tokens.slice(start, end);
  const text = part.map((token) => token.text).join(' ');
  const makes = part.filter((token) => token.kind === 'y').length;
  const works =
    part.some((token) => 'PDt'.includes(token.kind)) || part.filter((token) => token.kind === 'U').length > 0;
  const isShown = makes > 0 && (!works || makes > 1);
  if (isShown || RECAP.test(text) || DEMONSTRATION.test(text)) out.fill(true, start, end);
}

const REACH = 9;
const BACK = 5;

/** Without full stops only what stands close to "yarn over" is left out, up to the next announcement. */
function markStretches(tokens: readonly Token[], start: number, end: number, out: boolean[]): void {
  for (let i = start; i < end; i++) {
    if (tokens[i]!.kind !== 'y' || !isShown(tokens, i)) continue;
    for (let j = i; j > Math.max(start, i - BACK) && tokens[j]!.kind !== 'U'; j--) out[j] = true;
    for (let j = i; j < Math.min(end, i + REACH) && tokens[j]!.kind !== 'U'; j++) out[j] = true;
  }
}

/** One "pull up" may be part of a round; two close together show how a stitch is made. */
function isShown(tokens: readonly Token[], i: number): boolean {
  return tokens.slice(Math.max(0, i - 2 * REACH), i + 2 * REACH).filter((token) => token.kind === 'y').length > 1;
}
