import { type Unit } from '../work/units.ts';
import { type Event, only } from './event.ts';

type UnitEvent = Extract<Event, { type: 'unit' }>;

/** `three half trebles in one stitch, …, three half trebles`: said short the second time. */
export function withEchoes(spoken: readonly Event[]): readonly Event[] {
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
export function meshes(events: readonly Event[]): readonly Event[] {
  const skips = events
    .filter((event, n) => {
      const unit = only(event);
      const before = events[n - 1];
      return unit?.type === 'skip' || (unit?.type === 'chain' && before?.sentence === event.sentence);
    })
    .map((event) => event.sentence);
  const inMesh = new Set(skips);
  return events.map((event) =>
    event.type === 'unit' && event.fills && inMesh.has(event.sentence) ? { ...event, fills: false } : event,
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
export function withCounted(events: readonly Event[]): readonly Event[] {
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
export function withPair(events: readonly Event[], isRing: boolean): readonly Event[] {
  if (isRing) return events;
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
