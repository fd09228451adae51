import { type Token } from '../tokens.ts';
import { type Unit } from '../work/units.ts';
import { type Event } from './event.ts';

type UnitEvent = Extract<Event, { type: 'unit' }>;

/** Takes out of the phrases what adds nothing: what was taken back, explained twice, or only joins or turns. */
export function prune(events: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  return withEchoes(
    meshes(withoutTurning(withoutJoins(withoutExplained(withoutCorrected(events, tokens)), tokens), tokens)),
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
function withoutExplained(events: readonly Event[]): readonly Event[] {
  return events.filter((event, n) => {
    const before = events[n - 1];
    if (event.type !== 'unit' || before?.type !== 'unit' || !event.explains) return true;
    const [now] = event.options[0]!;
    const [then] = before.options[0]!;
    return !(now?.type === 'stitch' && then?.type === 'stitch' && now.inOne > 1 && now.inOne === then.inOne);
  });
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
function withoutTurning(spoken: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  const events = withoutFirstSkip(spoken, tokens);
  const firstUnit = events.findIndex((event) => event.type === 'unit');
  const hasSpaces = events.some(
    (event) => only(event)?.type === 'skip' || ['corner', 'oneplace', 'here'].includes(event.type),
  );
  if (hasSpaces) return events;
  return events.filter((event, n) => {
    const unit = only(event);
    return unit?.type !== 'chain' || !(unit.many === 1 || (unit.many < 5 && n > firstUnit));
  });
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
function withEchoes(events: readonly Event[]): readonly Event[] {
  const inOnes: Unit[] = [];
  return events.map((event) => {
    const unit = only(event);
    if (event.type !== 'unit' || unit?.type !== 'stitch') return event;
    if (unit.inOne > 1) inOnes.push(unit);
    const echo = inOnes.find((one) => one.type === 'stitch' && one.stitch === unit.stitch && one.inOne === unit.times);
    if (unit.inOne !== 1 || echo === undefined) return event;
    const options: UnitEvent['options'] =
      unit.times > 2 ? [[echo], ...event.options] : [...event.options, [echo]];
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
