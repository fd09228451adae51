import { type Unit } from '../work/units.ts';
import { BARE, type Event } from './event.ts';

/** An event whose part in the line is settled: numbers have become stitches, repeats, or nothing. */
export type Element = { readonly sentence: number; readonly at: number } & (
  | {
      readonly type: 'unit';
      readonly options: readonly (readonly Unit[])[];
      readonly fills: boolean;
      readonly reaches: boolean;
      readonly same: boolean;
    }
  | { readonly type: 'times'; readonly n: number; readonly explains: boolean }
  | { readonly type: 'around' | 'oneplace' | 'corner' | 'here' | 'again' | 'plain' | 'edge' }
  | { readonly type: 'ends'; readonly unit: Unit }
  | { readonly type: 'cycle'; readonly items: readonly (Unit | null)[] }
);

export interface Casting {
  readonly elements: readonly Element[];
  readonly cost: number;
  /** Numbers that were given no part in the work and so may be totals. */
  readonly idle: readonly Extract<Event, { type: 'number' }>[];
}

const MOST = 40;

/** Gives each bare number a part (stitches, a repeat, none) in every likely way, likeliest first. */
export function castNumbers(events: readonly Event[]): readonly Casting[] {
  let castings: Casting[] = [{ elements: [], cost: 0, idle: [] }];
  for (const event of events) {
    if (event.type !== 'number') {
      castings = castings.map((casting) => ({ ...casting, elements: [...casting.elements, settled(event)] }));
      continue;
    }
    castings = castings
      .flatMap((casting) => partsOf(casting, event))
      .sort((a, b) => a.cost - b.cost)
      .slice(0, MOST);
  }
  return castings;
}

function settled(event: Exclude<Event, { type: 'number' }>): Element {
  const { sentence, at } = event;
  if (event.type === 'unit')
    return {
      sentence,
      at,
      type: 'unit',
      options: event.options,
      fills: event.fills,
      reaches: event.reaches,
      same: event.same,
    };
  if (event.type === 'times') return { sentence, at, type: 'times', n: event.n, explains: event.explains };
  if (event.type === 'ends') return { sentence, at, type: 'ends', unit: event.unit };
  if (event.type === 'cycle') return { sentence, at, type: 'cycle', items: event.items };
  return { sentence, at, type: event.type === 'correction' ? 'plain' : event.type };
}

function partsOf(casting: Casting, event: Extract<Event, { type: 'number' }>): Casting[] {
  const { sentence, at, n } = event;
  const idle: Casting = {
    ...casting,
    idle: [...casting.idle, event],
    cost: casting.cost + (event.asTotal >= 1 ? 0 : 0.5 + Math.max(0, event.asItem - 0.6) * 2),
  };
  const out = [idle];
  if (n > 0 && event.asItem > -0.4 && n <= 120) {
    const unit: Unit = { type: 'stitch', stitch: BARE, inOne: 1, times: n };
    const element: Element = {
      sentence,
      at,
      type: 'unit',
      options: bareOptions(unit, casting.elements),
      fills: false,
      reaches: false,
      same: false,
    };
    out.push({
      ...casting,
      elements: [...casting.elements, element],
      cost: casting.cost + Math.max(0, 1.3 - event.asItem),
    });
  }
  if (n > 1 && n <= 60 && casting.elements.length > 0 && event.asTotal < 2.5) {
    const element: Element = { sentence, at, type: 'times', n, explains: false };
    out.push({ ...casting, elements: [...casting.elements, element], cost: casting.cost + 1.6 - event.asTimes });
  }
  return out;
}

/** After `two in the next`, a bare "two" may be two in one again. */
function bareOptions(
  unit: Extract<Unit, { type: 'stitch' }>,
  before: readonly Element[],
): readonly (readonly Unit[])[] {
  const inOne = before
    .flatMap((element) => (element.type === 'unit' ? (element.options[0] ?? []) : []))
    .find((one) => one.type === 'stitch' && one.inOne === unit.times && one.inOne > 1);
  return inOne === undefined ? [[unit]] : [[inOne], [unit]];
}
