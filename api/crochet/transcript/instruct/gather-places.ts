import { type Unit } from '../work/units.ts';
import { BARE } from './event.ts';
import { type Element } from './roles.ts';

const PLAIN: Unit = { type: 'stitch', stitch: BARE, inOne: 1, times: 1 };

/** What is said right after a place was named stands in it: stitches, a chain and stitches become one unit. */
export function gatherPlaces(elements: readonly Element[]): readonly Element[] {
  const out: Element[] = [];
  for (let n = 0; n < elements.length; n++) {
    const element = elements[n]!;
    const besideCorner = elements[n - 1]?.type === 'corner' || elements[n + 1]?.type === 'corner';
    if (element.type === 'plain' && besideCorner) {
      out.push({ ...element, type: 'unit', options: [[PLAIN], []], fills: false, reaches: false, same: false });
      continue;
    }
    // the place was named just before what stands in it
    if ((element.type === 'corner' || element.type === 'here') && isPlaceGroup(elements[n + 1], element.sentence))
      continue;
    const ahead = element.type === 'oneplace' ? allAfter(elements, n) : null;
    if (ahead !== null) {
      out.push({ ...ahead.unit, sentence: element.sentence, at: element.at });
      n += ahead.length;
      continue;
    }
    const one = element.type === 'corner' || element.type === 'here' ? placeAfter(elements, n) : null;
    if (one === null) {
      out.push(element);
      continue;
    }
    const run = elements.slice(n + 1, n + 4);
    const apart = run.flatMap((each) => (each.type === 'unit' ? each.options[0]! : []));
    const options = element.type === 'corner' ? [[one], []] : [[one], apart];
    out.push({ ...run[0]!, type: 'unit', options, fills: false, reaches: false, same: false });
    n += 3;
  }
  return out;
}

function isPlaceGroup(element: Element | undefined, sentence: number): boolean {
  const unit = element?.type === 'unit' && element.sentence === sentence ? element.options[0]![0] : undefined;
  return unit?.type === 'oneplace' && unit.parts.includes('ch');
}

type UnitElement = Extract<Element, { type: 'unit' }>;

/** `All in one stitch: chain two, two double crochets, chain two, slip stitch`: the rest of the sentence. */
function allAfter(elements: readonly Element[], n: number): { unit: UnitElement; length: number } | null {
  const { sentence } = elements[n]!;
  if (elements.slice(0, n).some((one) => one.sentence === sentence && one.type === 'unit')) return null;
  const run: Unit[] = [];
  let length = 0;
  for (const element of elements.slice(n + 1)) {
    if (element.type !== 'unit' || element.sentence !== sentence || element.fills) break;
    run.push(...(element.options.at(-1) ?? []));
    length += 1;
  }
  const one = run.every(isSimple) ? onePlace(run) : null;
  if (one === null) return null;
  const unit: UnitElement = {
    type: 'unit',
    sentence,
    at: elements[n]!.at,
    options: [[one]],
    fills: false,
    reaches: false,
    same: false,
  };
  return { unit, length };
}

function placeAfter(elements: readonly Element[], n: number): Unit | null {
  const run = elements
    .slice(n + 1, n + 4)
    .flatMap((element) =>
      element.type === 'unit' && !element.fills && element.options[0]!.length === 1 ? [element.options[0]![0]!] : [],
    );
  const isPlace =
    run.length === 3 && run[0]!.type === 'stitch' && run[1]!.type === 'chain' && run[2]!.type === 'stitch';
  return isPlace && run.every(isSimple) ? onePlace(run) : null;
}

export function cornerTold(elements: readonly Element[]): Unit | null {
  for (const element of elements) {
    const unit = element.type === 'unit' ? element.options[0]?.[0] : undefined;
    if (unit?.type === 'oneplace' && unit.parts.includes('ch')) return unit;
  }
  return null;
}

/** `two at each end and one in all the others`: what is told of the ends goes first and last, one in each where nothing else is told. */
export function withEnds(elements: readonly Element[]): readonly Element[] {
  const ends = elements.find((element) => element.type === 'ends');
  if (ends?.type !== 'ends') return elements;
  const { sentence, at, unit } = ends;
  const one = (units: readonly Unit[], fills: boolean): Element => ({
    type: 'unit',
    sentence,
    at,
    options: [units],
    fills,
    reaches: false,
    same: false,
  });
  const middle = elements.filter((element) => element.type !== 'ends' && element.type !== 'edge');
  const units = middle.filter((element) => element.type === 'unit');
  // "single crochet, two in the first and the last, one in each between": the stitch is named, not worked
  const told = units.some((element) => element.fills) ? units.filter((element) => element.fills) : units;
  const lone = told.length === 1 ? told[0]!.options[0]![0] : undefined;
  const isFill = lone?.type === 'stitch' && lone.times === 1 && lone.inOne === 1;
  const between =
    told.length === 0
      ? [one([PLAIN], true)]
      : isFill
        ? [one([lone], true)]
        : middle.filter((element) => element.type !== 'around');
  return [one([unit], false), ...between, one([unit], false)];
}

export function isSimple(unit: Unit): boolean {
  return unit.type === 'chain' || (unit.type === 'stitch' && unit.inOne === 1);
}

/** Unlike stitches, or stitches and chains, in one place; null where they are all alike or none. */
export function onePlace(units: readonly Unit[]): Unit | null {
  const parts = units.flatMap((unit) =>
    unit.type === 'chain'
      ? Array.from({ length: unit.many }, () => 'ch')
      : unit.type === 'stitch'
        ? Array.from({ length: unit.times }, () => unit.stitch)
        : [],
  );
  if (units.length < 2 || parts.length < 2 || parts.length > 24) return null;
  return parts.every((part) => part === parts[0]) && parts[0] !== BARE
    ? { type: 'stitch', stitch: parts[0]!, inOne: parts.length, times: 1 }
    : { type: 'oneplace', parts, times: 1 };
}
