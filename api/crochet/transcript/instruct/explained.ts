import { type Token } from '../tokens.ts';
import { type Unit } from '../work/units.ts';
import { only, type Event } from './event.ts';
import { textOf } from './spoken-of.ts';

/** `an increase, so two in one`: the same thing in other words. */
export function withoutExplained(events: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  const out: Event[] = [];
  for (const [n, event] of events.entries()) {
    const told = events[n - 1];
    const before = out.at(-1);
    if (before !== undefined && (standsFor(before, event, tokens) || goesWithIt(out, event, told, tokens))) {
      out[out.length - 1] = { ...before, end: event.end };
      continue;
    }
    // "that's your three chain and one more"
    const isOneMore = event.type === 'number' && event.n < 4 && told !== before && told !== undefined;
    if (isOneMore && only(told)?.type === 'chain' && event.at - told.end < 4) continue;
    if (before === undefined || !isInOtherWords(before, event)) {
      out.push(event);
      continue;
    }
    // "increase just means two in one": neither is worked
    const defines = tokens.slice(before.end, event.at).some((token) => token.text.endsWith('means'));
    if (defines && out.some((one) => one !== before && one.type === 'unit')) out.pop();
  }
  return out;
}

/** `four chain, standing for a treble and a chain`: what a starting chain stands for, told and not worked. */
function standsFor(before: Event, event: Event, tokens: readonly Token[]): boolean {
  const chain = only(before);
  const unit = only(event);
  if (event.type !== 'unit' || chain?.type !== 'chain' || before.sentence !== event.sentence) return false;
  if (unit?.type !== 'stitch' || unit.times !== 1 || event.same) return false;
  return STANDS.test(textOf(tokens, before.end, event.at));
}

const STANDS =
  /\b(?:stands? for|standing for|counts? as|counting as|which is|instead of|in place of|does for|serves as|acts as|as your first|as our first|as the first|as my first)\b/;

/** The chain of `for a treble and a chain`. */
function goesWithIt(out: readonly Event[], event: Event, told: Event | undefined, tokens: readonly Token[]): boolean {
  const chain = only(out.at(-1));
  const unit = only(event);
  if (chain?.type !== 'chain' || unit?.type !== 'chain' || chain.many < 4 || unit.many !== chain.many - 3) return false;
  return (
    told !== undefined &&
    told !== out.at(-1) &&
    event.at - told.end < 4 &&
    !textOf(tokens, told.end, event.at).includes('.')
  );
}

function isInOtherWords(before: Event, event: Event): boolean {
  if (event.type !== 'unit' || before.type !== 'unit' || !event.explains) return false;
  // "two in the first, so that's your three chain and one more"
  if (only(event)?.type === 'chain') return isSeveralInOne(only(before)) && before.sentence === event.sentence;
  if (before.same) return true;
  const [now] = event.options[0]!;
  const [then] = before.options[0]!;
  return now?.type === 'stitch' && then?.type === 'stitch' && now.inOne > 1 && now.inOne === then.inOne;
}

const isSeveralInOne = (unit: Unit | undefined): boolean =>
  unit?.type === 'stitch' && unit.inOne > 1 && unit.times === 1;
