import { type Token } from '../tokens.ts';
import { type Unit } from '../work/units.ts';
import { type Event } from './event.ts';

type UnitEvent = Extract<Event, { type: 'unit' }>;

/** Takes out of the phrases what adds nothing: what was taken back, explained twice, or only joins or turns. */
export function prune(spoken: readonly Event[], tokens: readonly Token[], heading: number): readonly Event[] {
  const events = withoutHeading(spoken, heading);
  return withCounted(
    withEchoes(
      meshes(
        withPair(
          withoutTurning(withoutJoins(withoutExplained(withoutCorrected(events, tokens), tokens), tokens), tokens),
        ),
      ),
    ),
  );
}

/**
 * What the speaker took back: `thirty five, no, thirty six`, `three maroon, sorry, four maroon`. What was said before
 * the correction goes where something of the same kind follows it.
 */
function withoutCorrected(events: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  const out: Event[] = [];
  let corrected = false;
  for (const event of events) {
    if (event.type === 'correction') {
      corrected = true;
      continue;
    }
    const before = out.at(-1);
    if (before !== undefined) {
      const saidNo = before.type === event.type && isTakenBack(tokens, before.end, event.at);
      if (saidNo || (corrected && event.at - before.end < 14)) takeBack(out, event);
    }
    corrected = false;
    out.push(event);
  }
  return out;
}

function isTakenBack(tokens: readonly Token[], from: number, to: number): boolean {
  const between = tokens.slice(from, to);
  return (
    between.length < 4 && between.some((one) => one.text === 'no') && between.every((one) => 'n,~Y'.includes(one.kind))
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
  const { sentence } = out.at(-1)!;
  while (out.length > 0 && out.at(-1)!.sentence === sentence && isLike(out.at(-1)!)) out.pop();
}

/** `an increase, so two in one`: the same thing in other words. */
function withoutExplained(events: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  const out: Event[] = [];
  for (const event of events) {
    const before = out.at(-1);
    if (before !== undefined && (standsFor(before, event, tokens) || goesWithIt(out, event, events, tokens))) {
      out[out.length - 1] = { ...before, end: event.end };
      continue;
    }
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
function goesWithIt(out: readonly Event[], event: Event, events: readonly Event[], tokens: readonly Token[]): boolean {
  const chain = only(out.at(-1));
  const unit = only(event);
  if (chain?.type !== 'chain' || unit?.type !== 'chain' || chain.many < 4 || unit.many !== chain.many - 3) return false;
  const told = events[events.indexOf(event) - 1];
  return (
    told !== undefined &&
    told !== out.at(-1) &&
    event.at - told.end < 4 &&
    !textOf(tokens, told.end, event.at).includes('.')
  );
}

const textOf = (tokens: readonly Token[], from: number, to: number): string =>
  tokens
    .slice(from, to)
    .map((token) => token.text)
    .join(' ');

function isInOtherWords(before: Event, event: Event): boolean {
  if (event.type !== 'unit' || before.type !== 'unit' || !event.explains) return false;
  if (before.same) return true;
  const [now] = event.options[0]!;
  const [then] = before.options[0]!;
  return now?.type === 'stitch' && then?.type === 'stitch' && now.inOne > 1 && now.inOne === then.inOne;
}

const only = (event: Event | undefined): Unit | undefined =>
  event?.type === 'unit' && event.options[0]!.length === 1 ? event.options[0]![0] : undefined;

/** A single slip stitch behind the work, alone in its sentence or clause, closes the round and is no stitch of it. */
function withoutJoins(events: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  return events.flatMap((event, n) => {
    const unit = only(event);
    if (event.type !== 'unit' || unit?.type !== 'stitch' || unit.stitch !== 'slst' || event.fills) return [event];
    if (unit.times !== 1 || unit.inOne !== 1 || !events.slice(0, n).some((one) => one.type === 'unit')) return [event];
    const closes = tokens
      .slice(event.at, event.end + 2)
      .some((token) => token.kind === 'O' || /^(?:to|join|close)$/.test(token.text));
    if (closes) return [];
    const goesOn = events
      .slice(n + 1)
      .some((one) => one.sentence === event.sentence && ['unit', 'around', 'times'].includes(one.type));
    // the last of a list of stitches may still be one of them
    return goesOn ? [event] : [{ ...event, options: [[], [unit]] }];
  });
}

/** A chain of one in a line without spaces only turns or lifts the work. */
const UNCOUNTED =
  /^(?:(?!\bsc\b).){0,40}?\b(?:(?:not|never|nobody|don't|doesn't|isn't|no)\b.{0,20}\b(?:count|counts|counted|stitch|anything)|uncounted|does nothing|is nothing|to begin|to start|to turn|and turn)\b/;

function isUncounted(tokens: readonly Token[], event: Event): boolean {
  const unit = only(event);
  if (unit?.type !== 'chain' || unit.many > 4) return false;
  const after = tokens.slice(event.end, event.end + 9);
  const stop = after.findIndex((token) => token.kind === '.' || token.kind === 'S');
  return UNCOUNTED.test((stop < 0 ? after : after.slice(0, stop)).map((token) => token.text).join(' '));
}

function withoutTurning(spoken: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  const events = withoutFirstSkip(spoken, tokens).filter((event) => !isUncounted(tokens, event));
  const firstUnit = events.findIndex((event) => event.type === 'unit');
  const hasSpaces = events.some(
    (event) => only(event)?.type === 'skip' || ['corner', 'oneplace', 'here'].includes(event.type),
  );
  if (hasSpaces) return events;
  const chains = events.filter((event) => only(event)?.type === 'chain').length;
  return events.flatMap((event, n): readonly Event[] => {
    const unit = only(event);
    if (event.type !== 'unit' || unit?.type !== 'chain' || unit.many > 4) return [event];
    if (n <= firstUnit) return unit.many === 1 ? [] : [event];
    // between stitches it may be work; behind them it only turns
    const isBetween = events.slice(n + 1).some((one) => one.type === 'unit' && one.sentence === event.sentence);
    const repeats = events.slice(n + 1).some((one) => one.sentence === event.sentence && REPEATS.has(one.type));
    if (chains < 2 && !(isBetween && repeats)) return [];
    return [{ ...event, options: [[unit], []] }];
  });
}

const REPEATS: ReadonlySet<string> = new Set(['times', 'around', 'again']);

/** `Round five is single crochet. In the corner …`: the stitch as a heading, worked only in what follows. */
function withoutHeading(events: readonly Event[], heading: number): readonly Event[] {
  const [first, ...rest] = events;
  const unit = first === undefined ? undefined : only(first);
  if (
    first?.type !== 'unit' ||
    first.sentence !== heading ||
    first.fills ||
    unit?.type !== 'stitch' ||
    unit.times !== 1 ||
    unit.inOne !== 1
  )
    return events;
  const inSentence = rest.filter((event) => event.sentence === first.sentence && event.type !== 'plain');
  const isHeading =
    inSentence.every((event) => only(event)?.type === 'chain') &&
    rest.some((event) => event.type === 'unit' && event.sentence !== first.sentence);
  return isHeading ? rest : events;
}

/** `skip one chain` before any stitch only says where the first goes. */
function withoutFirstSkip(events: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  const first = events.findIndex((event) => event.type === 'unit');
  const event = events[first];
  if (event === undefined || only(event)?.type !== 'skip') return events;
  const ofChain = tokens.slice(event.at, event.end).some((token) => token.kind === 'C');
  return ofChain ? events.filter((_, n) => n !== first) : events;
}

/** `three half trebles in one stitch, …, three half trebles`: said short the second time. */
function withEchoes(spoken: readonly Event[]): readonly Event[] {
  const events = withGroupEchoes(spoken);
  const inOnes: Unit[] = [];
  return events.map((event) => {
    const unit = only(event);
    if (event.type !== 'unit' || unit?.type !== 'stitch') return event;
    if (unit.inOne > 1) inOnes.push(unit);
    const echo = inOnes.find((one) => one.type === 'stitch' && one.stitch === unit.stitch && one.inOne === unit.times);
    if (unit.inOne !== 1 || echo === undefined) return event;
    const options: UnitEvent['options'] = unit.times > 2 ? [[echo], ...event.options] : [...event.options, [echo]];
    return { ...event, options };
  });
}

/** In a mesh `a double crochet in each double crochet, chain one, skip the chain` is one step of many, not all of them. */
function meshes(events: readonly Event[]): readonly Event[] {
  const skips = events.filter((event) => only(event)?.type === 'skip').map((event) => event.sentence);
  return events.map((event) =>
    event.type === 'unit' && event.fills && skips.includes(event.sentence) ? { ...event, fills: false } : event,
  );
}

/** `half double, double, half double` said again without `all in one stitch`: the same group in one place. */
function withGroupEchoes(events: readonly Event[]): readonly Event[] {
  const out: Event[] = [];
  let known: { unit: Unit; parts: readonly string[] } | null = null;
  for (let n = 0; n < events.length; n++) {
    const event = events[n]!;
    const unit = only(event);
    if (unit?.type === 'oneplace') known = { unit, parts: unit.parts };
    // "and three together again": the three of the group
    if (known !== null && event.type === 'unit' && unit?.type === 'together' && unit.many === known.parts.length) {
      out.push({ ...event, options: [[known.unit]] });
      continue;
    }
    const many: number = known === null ? 0 : echoLength(events, n, known.parts);
    if (known === null || many === 0 || event.type !== 'unit') {
      out.push(event);
      continue;
    }
    out.push({ ...event, options: [[known.unit]], end: events[n + many - 1]!.end });
    n += many - 1;
  }
  return out;
}

function echoLength(events: readonly Event[], from: number, parts: readonly string[]): number {
  const said: string[] = [];
  for (let n = from; n < events.length && said.length < parts.length; n++) {
    const unit = only(events[n]);
    if (unit?.type === 'stitch' && unit.inOne === 1 && unit.times < 6)
      said.push(...new Array<string>(unit.times).fill(unit.stitch));
    else if (unit?.type === 'chain' && unit.many < 6) said.push(...new Array<string>(unit.many).fill('ch'));
    else return 0;
    if (said.length === parts.length && said.every((part, k) => part === parts[k])) return n - from + 1;
  }
  return 0;
}

/** `decrease, decrease, decrease, six decreases`: the number says how many there are in all. */
function withCounted(events: readonly Event[]): readonly Event[] {
  const out: Event[] = [];
  for (const event of events) {
    const unit = only(event);
    const isMany = (unit?.type === 'together' || (unit?.type === 'stitch' && unit.inOne > 1)) && unit.times > 1;
    if (isMany) {
      const single = JSON.stringify({ ...unit, times: 1 });
      let same = 0;
      while (JSON.stringify(only(out.at(-1 - same))) === single) same += 1;
      if (same > 1 && same < unit.times) out.length -= same;
    }
    out.push(event);
  }
  return out;
}

/** `chain three and a double in the same stitch`: two in one place; a higher chain is a stitch and a space. */
function withPair(events: readonly Event[]): readonly Event[] {
  const at = events.findIndex((event) => event.type === 'unit');
  const chain = only(events[at]);
  const next = events[at + 1];
  const beside = only(next);
  if (chain?.type !== 'chain' || chain.many < 2 || chain.many > 6) return events;
  if (next?.type !== 'unit' || !next.same || beside?.type !== 'stitch' || (beside.times > 1 && beside.inOne > 1))
    return events;
  const arch = chain.many - 3;
  const many = beside.times * beside.inOne;
  const stitches = Array.from({ length: many }, () => beside.stitch);
  const pair: Unit =
    arch > 0
      ? { type: 'oneplace', parts: [beside.stitch, ...new Array<string>(arch).fill('ch'), ...stitches], times: 1 }
      : { ...beside, times: 1, inOne: many + 1 };
  return events.flatMap((event, n) =>
    n === at ? [] : event === next ? [{ ...next, options: [[pair]], same: false }] : [event],
  );
}
