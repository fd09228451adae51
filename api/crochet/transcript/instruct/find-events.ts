import { type Event } from './event.ts';
import { RULES } from './grammar.ts';
import { type Made } from './made.ts';
import { lastWorkIn, numberEvent, statedTotal } from './number-events.ts';
import { placeGroupAt } from './place-groups.ts';
import { type Letters } from './letters.ts';

/** Runs the grammar over the letters of an instruction. */
export function findEvents(letters: Letters): readonly Event[] {
  const events: Event[] = [];
  const lastWork = lastWorkIn(letters);
  for (let i = 0; i < letters.text.length;) {
    const total = statedTotal(
      letters,
      i,
      lastWork,
      events.some((event) => event.type === 'unit'),
    );
    if (total !== null) {
      events.push(total);
      i += 2;
      continue;
    }
    const found = groupAt(letters, i) ?? matchAt(letters, i);
    if (found === null) {
      const number = numberEvent(letters, i, lastWork);
      if (number !== null) events.push(number);
      i += 1;
      continue;
    }
    if (found.event !== null) events.push(found.event);
    i += found.length;
  }
  return events;
}

function groupAt(letters: Letters, i: number): { event: Event; length: number } | null {
  const group = placeGroupAt(letters, i);
  if (group === null) return null;
  const made: Made = { type: 'unit', options: group.isDefined ? [[], [group.unit]] : [[group.unit]] };
  const event = eventOf(made, placeOf(letters, i, group.length), false, false);
  return event === null ? null : { event, length: group.length };
}

const placeOf = (letters: Letters, i: number, length: number) => ({
  at: letters.at[i]!,
  end: letters.at[i + length - 1]! + 1,
  sentence: letters.sentence[i]!,
});

function matchAt(letters: Letters, i: number): { event: Event | null; length: number } | null {
  for (const { pattern, make } of RULES) {
    pattern.lastIndex = i;
    const text = pattern.exec(letters.text)?.[0];
    if (text === undefined || text === '') continue;
    const made = make(letters.tokens.slice(i, i + text.length), text);
    if (made === null) continue;
    const place = placeOf(letters, i, text.length);
    const event = eventOf(
      made,
      place,
      letters.text[i - 1] === '=' || letters.tokens[i - 1]?.text === 'meaning',
      text.includes('M') || (text.endsWith('SI') && '.,|&'.includes(letters.text[i + text.length] ?? '.')),
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
  if (made.type === 'times') return { ...place, type: 'times', n: made.n, explains };
  if (made.type === 'ends') return { ...place, type: 'ends', unit: made.unit };
  if (made.type === 'cycle') return { ...place, type: 'cycle', items: made.items };
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
