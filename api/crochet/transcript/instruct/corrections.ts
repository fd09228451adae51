import { type Token } from '../tokens.ts';
import { type Unit } from '../work/units.ts';
import { BARE, only, type Event } from './event.ts';

/**
 * What the speaker took back: `thirty five, no, thirty six`, `three maroon, sorry, four maroon`. What was said before
 * the correction goes where something of the same kind follows it.
 */
export function withoutCorrected(events: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  const out: Event[] = [];
  let corrected = false;
  let last: Event | null = null;
  for (const event of events) {
    if (event.type === 'correction') {
      corrected = true;
      continue;
    }
    const before = out.at(-1);
    if (before !== undefined) {
      const isTaken = corrected ? event.at - before.end < 14 : isTakenBack(tokens, before.end, event.at);
      const mended = isTaken ? withNumber(before, event) : null;
      if (mended !== null) {
        out[out.length - 1] = mended;
        last = mended;
        corrected = false;
        continue;
      }
      // "six singles, no, five, it's a starfish, five singles": the mended stretch in full
      if (before === last && isLikeStretch(only(before), only(event), true)) continue;
      if (isTaken && (corrected || KIND[before.type] === KIND[event.type])) takeBack(out, event);
    }
    corrected = false;
    out.push(event);
  }
  return out;
}

function isTakenBack(tokens: readonly Token[], from: number, to: number): boolean {
  const between = tokens.slice(from, to);
  return (
    between.length < 8 &&
    between.some((one) => one.text === 'no') &&
    between.every((one) => 'n,~Yav='.includes(one.kind))
  );
}

const KIND: Readonly<Record<string, string>> = { unit: 'work', number: 'number', times: 'number' };

function takeBack(out: Event[], event: Event): void {
  const kind = KIND[event.type];
  const isLike = (one: Event) => KIND[one.type] === kind || (kind === 'work' && one.type === 'number');
  if (kind === undefined) return;
  if (kind === 'number') {
    if (isLike(out.at(-1)!)) out.pop();
    return;
  }
  const last = out.at(-1)!;
  // "trebles in the next seven, no, in the next eight": only that stretch again
  if (isLikeStretch(only(last), only(event))) {
    out.pop();
    return;
  }
  const { sentence } = last;
  while (out.length > 0 && out.at(-1)!.sentence === sentence && isLike(out.at(-1)!)) out.pop();
}

function isLikeStretch(before: Unit | undefined, now: Unit | undefined, isEqual = false): boolean {
  return (
    before?.type === 'stitch' &&
    now?.type === 'stitch' &&
    before.inOne === now.inOne &&
    (before.times === now.times) === isEqual &&
    before.times > 1 &&
    (now.stitch === BARE || before.stitch === now.stitch)
  );
}

/** `one in each of the next three, sorry, two`, `three trebles, no, in the next four`: the number alone is mended. */
function withNumber(before: Event, event: Event): Event | null {
  const unit = only(before);
  const now = only(event);
  const many =
    event.type === 'number'
      ? event.n
      : now?.type === 'stitch' && now.stitch === BARE && now.inOne === 1
        ? now.times
        : 0;
  if (before.type !== 'unit' || unit?.type !== 'stitch' || unit.times < 2 || many < 1 || many > 120) return null;
  return { ...before, options: [[{ ...unit, times: many }]], end: event.end };
}
