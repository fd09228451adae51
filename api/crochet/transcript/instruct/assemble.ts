import { settleStitches } from '../work/settle.ts';
import { periodOf, type Unit } from '../work/units.ts';
import { BARE } from './event.ts';
import { cornerTold, gatherPlaces, isSimple, onePlace, withEnds } from './gather-places.ts';
import { type Element } from './roles.ts';

/** A way in which the phrases of a line may belong together. Repeats still open carry `times: 0`. */
export interface Assembly {
  readonly units: readonly Unit[];
  /** What speaks against it: 0 is what anybody would take it to mean. */
  readonly cost: number;
}

interface Node {
  readonly unit: Unit;
  readonly sentence: number;
}

interface Partial {
  readonly nodes: readonly Node[];
  /** Nodes before this index are part of no later group, unless the whole line is repeated. */
  readonly closed: number;
  readonly corner: Unit | null;
  readonly edge: Unit | null;
  readonly cost: number;
}

/** What the corners and the ends of the lines before were, in the stitch in hand. */
export interface Known {
  readonly corner: Unit | null;
  readonly edge: Unit | null;
}

const MOST = 24;

/** Puts phrases together in every likely way: which of them a repeat takes in, what stands in one place. */
export function assemble(spoken: readonly Element[], known: Known): readonly Assembly[] {
  const elements = gatherPlaces(withEnds(spoken));
  const corner = cornerTold(elements) ?? known.corner;
  let partials: Partial[] = [{ nodes: [], closed: 0, corner, edge: known.edge, cost: 0 }];
  for (const element of elements) {
    const next = partials.flatMap((partial) => extend(partial, element));
    partials = next.sort((a, b) => a.cost - b.cost).slice(0, MOST);
  }
  return partials.map(({ nodes, cost }) => ({ units: nodes.map((node) => node.unit), cost }));
}

function extend(partial: Partial, element: Element): Partial[] {
  const { sentence } = element;
  switch (element.type) {
    case 'unit':
      if (element.reaches) return [reach(partial, element.options[0]!, sentence)];
      return element.options.map((units, n) => ({
        ...partial,
        nodes: [...partial.nodes, ...units.map((unit) => ({ unit: element.fills ? open([unit]) : unit, sentence }))],
        closed: element.fills ? partial.nodes.length + units.length : partial.closed,
        cost: partial.cost + 0.4 * n,
      }));
    case 'plain':
    case 'here':
      return [partial];
    case 'times':
      return element.explains
        ? [...repeat(partial, element.n, sentence), { ...partial, cost: partial.cost + 0.3 }]
        : repeat(partial, element.n, sentence);
    case 'around':
      return repeat(partial, 0, sentence);
    case 'again':
      return [partial, ...again(partial, sentence)];
    case 'oneplace':
      return [gather(partial, sentence)];
    case 'corner':
      return named(partial, partial.corner, sentence);
    case 'edge':
      return named(partial, partial.edge, sentence);
    case 'cycle':
      return cycle(partial, element.items, sentence);
    case 'ends':
      return [partial];
  }
}

/** `single crochet in the second chain, and on until you have fourteen`: fourteen with the first. */
function reach(partial: Partial, units: readonly Unit[], sentence: number): Partial {
  const last = partial.nodes.at(-1)?.unit;
  const isStart = last?.type === 'stitch' && last.times === 1 && last.inOne === 1;
  const kept = isStart ? partial.nodes.slice(0, -1) : partial.nodes;
  return { ...partial, nodes: [...kept, ...units.map((unit) => ({ unit, sentence }))] };
}

function open(units: readonly Unit[]): Unit {
  return { type: 'repeat', units, times: 0 };
}

/** Tries a repeat on the phrases of its own sentence, on all since the last repeat, and on the whole line. */
function repeat(partial: Partial, times: number, sentence: number): Partial[] {
  const { nodes, closed } = partial;
  const openAlready = nodes.some(({ unit }) => unit.type === 'repeat' && unit.times === 0);
  if (nodes.length === 0) return [{ ...partial, cost: partial.cost + (times > 0 ? 0.5 : 0) }];
  if (closed >= nodes.length) {
    const last = nodes.at(-1)!.unit;
    const isEcho = times === 0 || openAlready || (last.type === 'repeat' && last.times === times);
    if (isEcho) return [{ ...partial, cost: partial.cost + (times > 0 && !openAlready ? 0.2 : 0.1) }];
  }
  const starts = startsOf(nodes, closed, sentence);
  return starts.flatMap(({ start, cost }) => {
    if (start >= nodes.length) return [];
    const group = settleStitches(
      nodes.slice(start).map((node) => node.unit),
      BARE,
    );
    const period = periodOf(group);
    const before = nodes.slice(0, start);
    const made = (units: readonly Unit[], extra: number): Partial => ({
      ...partial,
      nodes: [...before, { unit: { type: 'repeat', units, times }, sentence }],
      closed: before.length + 1,
      cost: partial.cost + cost + extra,
    });
    return period.length < group.length ? [made(period, 0), made(group, 1)] : [made(group, 0)];
  });
}

/** `and that again`, `that whole lot over again`: the group just said, twice, or only a way of going on. */
function again(partial: Partial, sentence: number): Partial[] {
  if (partial.nodes.length < 2 || partial.closed >= partial.nodes.length) return [];
  return repeat(partial, 2, sentence).map((one) => ({ ...one, cost: one.cost + 0.7 }));
}

function startsOf(nodes: readonly Node[], closed: number, sentence: number): { start: number; cost: number }[] {
  const inSentence = nodes.findIndex((node, n) => n >= closed && node.sentence === sentence);
  const likely = inSentence >= 0 ? inSentence : closed < nodes.length ? closed : 0;
  const starts = new Map<number, number>([[likely, 0]]);
  const add = (start: number, cost: number) => {
    if (start >= 0 && start < nodes.length && !starts.has(start)) starts.set(start, cost);
  };
  add(closed, 0.5);
  nodes.forEach((node, n) => {
    if (n > 0 && n > closed && node.sentence !== nodes[n - 1]!.sentence) add(n, 0.6);
  });
  add(0, 0.9);
  // without full stops a group may begin anywhere; with them hardly inside a sentence
  const isOneSentence = nodes.every((node) => node.sentence === sentence);
  for (let n = closed; n < nodes.length && starts.size < 9; n++) {
    // "you do that bit three times", a sentence of its own, takes in whole sentences: what it would leave out was told too
    const cutsAnother = n > 0 && nodes[n]!.sentence !== sentence && nodes[n - 1]!.sentence === nodes[n]!.sentence;
    if (!cutsAnother) add(n, isOneSentence ? 1.1 : 2.4);
  }
  return [...starts].map(([start, cost]) => ({ start, cost }));
}

/** Stitches and chains that were just said go into one place: those around the last chain, else all of the sentence. */
function gather(partial: Partial, sentence: number): Partial {
  const { nodes, closed } = partial;
  let start = nodes.length;
  while (start > closed && nodes[start - 1]!.sentence === sentence && isSimple(nodes[start - 1]!.unit)) start -= 1;
  const aroundChain = nodes.length - start > 3 && nodes.at(-2)!.unit.type === 'chain';
  if (aroundChain) start = nodes.length - 3;
  if (nodes.length - start > 4) return partial;
  const one = onePlace(nodes.slice(start).map((node) => node.unit));
  if (one === null) return partial;
  return { ...partial, nodes: [...nodes.slice(0, start), { unit: one, sentence }] };
}

/** A corner or an end named alone is the one told before, once more. */
function named(partial: Partial, known: Unit | null, sentence: number): Partial[] {
  if (known === null) return [partial];
  return [
    { ...partial, nodes: [...partial.nodes, { unit: known, sentence }] },
    { ...partial, cost: partial.cost + 0.6 },
  ];
}

/** `corner, fifteen, corner, fifteen` tells all of the line in short, whatever was told of its parts before. */
function cycle(partial: Partial, items: readonly (Unit | null)[], sentence: number): Partial[] {
  const { corner } = partial;
  if (corner === null) return [partial];
  const units = items.map((item) => item ?? corner);
  return [{ ...partial, nodes: [{ unit: open(units), sentence }], closed: 1, cost: partial.cost + 0.2 }, partial];
}
