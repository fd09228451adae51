import { type Event } from './event.ts';
import { RULES } from './grammar.ts';
import { type Made } from './made.ts';
import { type Letters } from './letters.ts';

/** Runs the grammar over the letters of an instruction. */
export function findEvents(letters: Letters): readonly Event[] {
  const events: Event[] = [];
  for (let i = 0; i < letters.text.length;) {
    const total = statedTotal(letters, i, events);
    if (total !== null) {
      events.push(total);
      i += 2;
      continue;
    }
    const found = matchAt(letters, i);
    if (found === null) {
      const number = numberEvent(letters, i);
      if (number !== null) events.push(number);
      i += 1;
      continue;
    }
    if (found.event !== null) events.push(found.event);
    i += found.length;
  }
  return events;
}

/** `That comes to thirty six double crochets.`, `Thirty seven double crochet.`: the stitches that are there, not work. */
function statedTotal(letters: Letters, i: number, events: readonly Event[]): Event | null {
  const token = letters.tokens[i]!;
  if (token.kind !== 'N' || !'So'.includes(letters.text[i + 1] ?? '.') || Number(token.value) < 8) return null;
  const before = letters.text[i - 1] ?? '.';
  const after = letters.text[i + 2] ?? '.';
  const isWeak = before === '=' && WEAK_RESULT.test(letters.tokens[i - 1]!.text);
  const results = before === '=' && (isWeak ? Number(token.value) > 19 && '.|,'.includes(after) : !/[IE]/.test(after));
  const alone = '.|'.includes(before) && '.|,'.includes(after);
  if (!(results || alone) || !events.some((event) => event.type === 'unit')) return null;
  const place = { at: letters.at[i]!, end: letters.at[i]! + 1, sentence: letters.sentence[i]! };
  return { ...place, type: 'number', n: Number(token.value), asTotal: 1.8, asItem: 0.5, asTimes: 0 };
}

function matchAt(letters: Letters, i: number): { event: Event | null; length: number } | null {
  for (const { pattern, make } of RULES) {
    pattern.lastIndex = i;
    const text = pattern.exec(letters.text)?.[0];
    if (text === undefined || text === '') continue;
    const made = make(letters.tokens.slice(i, i + text.length), text);
    if (made === null) continue;
    const place = { at: letters.at[i]!, end: letters.at[i + text.length - 1]! + 1, sentence: letters.sentence[i]! };
    const event = eventOf(
      made,
      place,
      letters.text[i - 1] === '=' || letters.tokens[i - 1]?.text === 'meaning',
      text.includes('M'),
    );
    return { event, length: text.length };
  }
  return null;
}

function eventOf(
  made: Made,
  place: { at: number; end: number; sentence: number },
  explains: boolean,
  same: boolean,
): Event | null {
  if (made.type === 'nothing') return null;
  if (made.type === 'times') return { ...place, type: 'times', n: made.n };
  if (made.type !== 'unit') return { ...place, type: made.type };
  return {
    ...place,
    type: 'unit',
    options: made.options,
    fills: made.fills ?? false,
    reaches: made.reaches ?? false,
    explains,
    same,
  };
}

/** "For" and "so" lead to a total, and to much else. */
const WEAK_RESULT = /^(?:for|so|at|be|have|got|you want|leaving)$/;

/** A number on its own may be a total, stitches of the kind in hand, a repeat, or talk; what stands beside it says how likely. */
function numberEvent(letters: Letters, i: number): Event | null {
  const token = letters.tokens[i]!;
  if (token.kind !== 'N') return null;
  const before = letters.text[i - 1] ?? '.';
  const beforeThat = letters.text[i - 2] ?? '.';
  const after = letters.text[i + 1] ?? '.';
  const isAlone = '.|,'.includes(before) && '.|'.includes(after);
  let asTotal = 0;
  if (before === '=' || (before === 'w' && beforeThat === '='))
    asTotal += WEAK_RESULT.test(letters.tokens[i - 1]!.text) ? 1.1 : 1.6;
  if (isAlone) asTotal += before === ',' ? 1 : 1.5;
  if ('.|'.includes(before) && after === ',' && Number(token.value) > 7) asTotal += 1.1;
  if (after === 'G' || after === '=') asTotal += 1.2;
  if (after === 'E' || (after === 'w' && letters.text[i + 2] === 'E')) asTotal += 0.7;
  if (before === 'c') asTotal += 1.6;
  if ('.|'.includes(after)) asTotal += 0.4;
  if (before === 'p' || after === 'w') asTotal -= 0.4;
  if (before === ',' && after !== 'w') asTotal += 0.3;
  if (token.isGuess) asTotal -= 1;
  const isThing = after === 'w';
  const closes = isThing && /[,.&|F]/.test(letters.text[i + 2] ?? '.');
  if (token.text === 'counted by steps') asTotal += 1.4;
  const namesLines = after === 'U' && letters.tokens[i + 1]!.text.endsWith('s');
  if (namesLines) asTotal -= 3;
  const asItem =
    (namesLines || token.text.startsWith('counted') ? -2 : 0) +
    ('&,.|~pwFmYIgNTDP'.includes(before) ? 0.6 : 0) +
    ('&,F.RNTDP'.includes(after) ? 0.6 : 0) +
    (isThing ? (closes ? 0.4 : -0.2) - (token.value === 1 ? 0.3 : 0) : 0) -
    (before === '=' ? 0.5 : 0) -
    (after === 'G' ? 0.2 : 0);
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
