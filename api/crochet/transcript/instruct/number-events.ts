import { type Event } from './event.ts';
import { type Letters } from './letters.ts';

/** So many of a stitch or a shaping, or several together: work, where a bare name may only be spoken of. */
const WORK = /N[SPD](?!IO)|[NS]T|[&,]P(?=[.,&|])|NI[XLOME]/g;

/** Index of the last letter of work, slip stitches that may only join left out; -1 where there is none. */
export function lastWorkIn({ text, tokens }: Letters): number {
  let last = -1;
  for (const { index } of text.matchAll(WORK)) if (tokens[index + 1]!.value !== 'slst') last = index + 1;
  return last;
}

/** `That comes to thirty six double crochets.`, `Thirty seven double crochet.`: the stitches that are there, not work. */
export function statedTotal(letters: Letters, i: number, lastWork: number, hasWork: boolean): Event | null {
  const token = letters.tokens[i]!;
  if (token.kind !== 'N' || !'So'.includes(letters.text[i + 1] ?? '.')) return null;
  const before = letters.text[i - 1] ?? '.';
  const after = letters.text[i + 2] ?? '.';
  const isWeak = before === '=' && WEAK_RESULT.test(letters.tokens[i - 1]!.text);
  const results = before === '=' && (isWeak ? Number(token.value) > 19 && '.|,'.includes(after) : !/[IE]/.test(after));
  if (Number(token.value) < 8 && !(results && !isWeak && '.|'.includes(after))) return null;
  const alone = '.|'.includes(before) && '.|,'.includes(after);
  // where work follows, so many stitches alone in a sentence are work themselves
  if (!(results || (alone && i + 1 >= lastWork)) || !hasWork) return null;
  const place = { at: letters.at[i]!, end: letters.at[i]! + 1, sentence: letters.sentence[i]! };
  return { ...place, type: 'number', n: Number(token.value), asTotal: 1.8, asItem: 0.5, asTimes: 0 };
}

/** "For" and "so" lead to a total, and to much else. */
const WEAK_RESULT = /^(?:for|so|at|be|have|got|you want|leaving)$/;

/** A number on its own may be a total, stitches of the kind in hand, a repeat, or talk; what stands beside it says how likely. */
export function numberEvent(letters: Letters, i: number, lastWork: number): Event | null {
  const token = letters.tokens[i]!;
  if (token.kind !== 'N' || refersBack(letters, i)) return null;
  const before = letters.text[i - 1] ?? '.';
  const beforeThat = letters.text[i - 2] ?? '.';
  const after = letters.text[i + 1] ?? '.';
  const isAlone = '.|,'.includes(before) && '.|'.includes(after);
  // alone between stretches of work it is a stretch itself, as "eighteen" along the side of an oval
  const isBetween = i < lastWork && '.|,&'.includes(before) && !'tRo'.includes(after);
  let asTotal = 0;
  if (before === '=' || (before === 'w' && beforeThat === '='))
    asTotal += WEAK_RESULT.test(letters.tokens[i - 1]!.text) ? 1.1 : 1.6;
  if (isAlone) asTotal += isBetween ? 0.6 : before === ',' ? 1 : 1.5;
  if ('.|'.includes(before) && after === 'w' && '.|'.includes(letters.text[i + 2] ?? '.') && !isBetween) asTotal += 1.5;
  if ('.|'.includes(before) && after === ',' && Number(token.value) > 7) asTotal += 1.1;
  if (after === 'G' || after === '=') asTotal += 1.2;
  if (after === 'E' || (after === 'w' && letters.text[i + 2] === 'E')) asTotal += 0.7;
  if (before === 'c') asTotal += 1.6;
  if ('.|'.includes(after)) asTotal += 0.4;
  if (before === 'p' || after === 'w') asTotal -= 0.4;
  if (before === ',' && after !== 'w') asTotal += 0.3;
  if (after === '=' && /^(?:remain|remains|are left|left)/.test(letters.tokens[i + 1]!.text)) asTotal += 0.6;
  if (isNamedTotal(letters, i)) asTotal += 1.2;
  if (token.isGuess) asTotal -= 1;
  const isThing = after === 'w';
  const closes = isThing && /[,.&|F]/.test(letters.text[i + 2] ?? '.');
  if (token.text === 'counted by steps') asTotal += 1.4;
  // so many arches, loops, scallops: things, and no stitches
  const isOfThings = isThings(letters, i + 1);
  if (isOfThings) asTotal -= 2.5;
  const namesLines = after === 'U' && letters.tokens[i + 1]!.text.endsWith('s');
  if (namesLines) asTotal -= 3;
  const asItem =
    (namesLines || token.text.startsWith('counted') ? -2 : 0) +
    ('&,.|~pwFmYIgNTDPOXLG'.includes(before) ? 0.6 : 0) +
    ('&,F.RNTDP|'.includes(after) ? 0.6 : 0) +
    (isThing ? (closes ? 0.4 : -0.2) - (token.value === 1 ? 0.3 : 0) : 0) -
    (before === '=' ? 0.5 : 0) -
    (after === 'G' ? 0.2 : 0) +
    (isBetween ? 0.3 : 0);
  const asTimes = token.text.startsWith('counted') ? -2 : after === 'R' || after === 'w' ? 0.8 : 0.2;
  return {
    type: 'number',
    at: letters.at[i]!,
    end: letters.at[i]! + 1,
    sentence: letters.sentence[i]!,
    n: Number(token.value),
    asTotal,
    asItem,
    asTimes,
  };
}

/** `twelve trebles, with the chain being the first of the twelve`: the same stitches spoken of again. */
function refersBack({ source, at, tokens, sentence }: Letters, i: number): boolean {
  const here = at[i]!;
  if (source[here - 2]?.text !== 'of' || !/^(?:the|those|these|your|our)$/.test(source[here - 1]!.text)) return false;
  for (let n = i - 1; n >= 0 && sentence[n] === sentence[i]; n--)
    if (tokens[n]!.kind === 'N' && tokens[n]!.value === tokens[i]!.value) return true;
  return false;
}

/** A plain noun in the plural behind a number, at the end of a clause: `twelve arches.` */
function isThings({ text, tokens }: Letters, i: number): boolean {
  const token = tokens[i];
  if (token === undefined || !'.,|&'.includes(text[i + 1] ?? '.')) return false;
  if (text[i] === 'Z' || token.value === 'loop') return true;
  return text[i] === 'w' && THINGS.test(token.text);
}

/** What work is made of that is no stitch: its number is no total. */
const THINGS =
  /^(?:shells|fans|scallops|petals|picots|points|peaks|holes|bumps|ridges|waves|ripples|spikes|teeth|leaves|loops|groups|clusters|squares|blocks|bars|couples|bunches|ruffles|frills|vs|inches|rows|rounds|laps|sections|panels)$/;

/** `the number to check is twenty five`. */
function isNamedTotal({ source, at }: Letters, i: number): boolean {
  const here = at[i]!;
  const before = source.slice(Math.max(0, here - 7), here);
  return (
    /^(?:is|are|was)$/.test(before.at(-1)?.text ?? '') &&
    before.some((one) => one.kind === '#' || one.kind === 'c' || /^(?:number|total|check|count)$/.test(one.text))
  );
}
