import { type Sentences } from './sentences.ts';
import { type Token } from './tokens.ts';

const MAKES =
  /\b(?:make|need|needs|wants|want|do|makes|making|quantity|also|of them|of these|twice|pair|identical|each side|there is|there are|you will be making|two of|each)\b/;
const NOT_COUNTED = 'SGtUHZCKPD';

/** How many to make of the piece that begins here: the number said with it, before its first line or in it. */
export function readMake(tokens: readonly Token[], from: number, to: number, sentences: Sentences): number {
  let found = 1;
  for (let i = from; i < to; i++) {
    const token = tokens[i]!;
    const start = sentences.isPunctuated ? sentences.startOf[i]! : Math.max(sentences.startOf[i]!, i - 9);
    const end = sentences.isPunctuated ? sentences.endOf[i]! : Math.min(sentences.endOf[i]!, i + 6);
    const text = tokens
      .slice(Math.max(from, start), Math.min(to, end))
      .map((one) => one.text)
      .join(' ');
    if (/\b(?:a|the) pair\b|\bpair of\b/.test(text)) found = Math.max(found, 2);
    if (/\btwice\b/.test(text) && /\b(?:make|making|do|everything)\b/.test(text)) found = Math.max(found, 2);
    if (token.kind !== 'N' || token.isGuess) continue;
    const n = Number(token.value);
    const next = tokens[i + 1];
    if (n < 2 || n > 60 || NOT_COUNTED.includes(next?.kind ?? '.') || tokens[i - 1]?.kind === 'U') continue;
    if (isMeasure(next) || isMeasure(tokens[i + 2])) continue;
    if (MAKES.test(text) || isAlone(tokens, i)) found = found === 1 ? n : found;
  }
  return found;
}

const MEASURE =
  /^(?:millimet|centimet|inch|yard|gram|ounce|minute|ply|hundred|weight|half|color|colour|ball|skein|hour|year|month|stitch|row|round|finger|child|kid|people|month|dog)/;

function isMeasure(token: Token | undefined): boolean {
  return token !== undefined && MEASURE.test(token.text);
}

/** `Legs. There's four.`, `Legs, so, four.`, `Two ears.` */
function isAlone(tokens: readonly Token[], i: number): boolean {
  const before = tokens[i - 1]?.kind ?? '.';
  const after = tokens[i + 1]?.kind ?? '.';
  const isHead = '.|'.includes(before) && after === 'w';
  return isHead || (',v~.|w'.includes(before) && '.,|'.includes(after)) || (after === 'w' && '~&a'.includes(before));
}

const NO_NAME = new Set(
  'first last now okay so the a an welcome back hello new piece part thing bit next one it he she they them we you i and then going make made make two need little small big that this good well start starting begin beginning time today here there up out let see look right color colour brown green white red pink dark light yarn same done cut tail long mine way hand hands put sew stitch hold find join what all day just more turn upside down get hi hey over on off fun'.split(
    ' ',
  ),
);

/** What the piece is called: the likeliest noun among the words that lead to its first line. */
export function readPieceName(tokens: readonly Token[], from: number, to: number): string | null {
  const words = tokens
    .slice(from, to)
    .filter(
      (token) =>
        token.kind === 'w' && token.text.length > 2 && !NO_NAME.has(token.text) && /^[a-z'-]+$/.test(token.text),
    );
  const counts = new Map<string, number>();
  words.forEach((token, n) => {
    const i = tokens.indexOf(token, from);
    const isLed = tokens[i - 1]?.kind === 'a' || tokens[i - 1]?.kind === 'N';
    const isHead = '.|,'.includes(tokens[i + 1]?.kind ?? '.');
    counts.set(token.text, (counts.get(token.text) ?? 0) + 1 + (isLed ? 0.6 : 0) + (isHead ? 0.6 : 0) + n / 1000);
  });
  const best = [...counts].sort((a, b) => b[1] - a[1])[0]?.[0];
  return best === undefined ? null : `${best[0]!.toUpperCase()}${best.slice(1)}`;
}
