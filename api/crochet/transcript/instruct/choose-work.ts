import { merged, settleStitches } from '../work/settle.ts';
import { sumOf, type Unit } from '../work/units.ts';
import { assemble } from './assemble.ts';
import { type Event } from './event.ts';
import { type Choice, fitGain, judgeWork, type Proposal, saidGain, saidTotal } from './judge-work.ts';
import { type Base, resolve } from './resolve.ts';
import { remindsOf } from './told-again.ts';
import { castNumbers, type Casting, type Element } from './roles.ts';
import { startingChains } from './starting-chain.ts';

/** Where a line stands: what it may work into, and the stitch in hand. */
export interface Setting {
  readonly bases: readonly Base[];
  readonly stitch: string;
  readonly chainCounts: boolean | null;
  /** What a corner was before, in the stitch in hand. */
  readonly corner: Unit | null;
  /** What an end of a row was before, in the stitch in hand. */
  readonly edge: Unit | null;
  /** Whether what stands before is itself doubtful, so that a total that agrees outweighs it. */
  readonly isDoubtful: boolean;
  /** Works of other lines that this one may be a copy of, with what speaks against it. */
  readonly copies: readonly { readonly units: readonly Unit[]; readonly cost: number }[];
  /** The sentence that announces the line, which may tell in short what others tell in full. */
  readonly heading: number;
  /** Whether places are left on purpose. */
  readonly mayLeave: boolean;
  /** Whether totals of the piece leave out the chains inside a group. */
  readonly leavesOut: boolean;
  /** Whether the line is worked in a ring. */
  readonly isRing: boolean;
  /** Whether words say that nothing is shaped. */
  readonly isPlain: boolean;
  /** Whether they say so in so many words. */
  readonly isTold: boolean;
}

/** The corner that the line itself tells, wherever it does. */
function cornerIn(events: readonly Event[]): Unit | null {
  for (const event of events) {
    const unit = event.type === 'unit' ? event.options.find((units) => units.length > 0)?.[0] : undefined;
    if (unit?.type === 'oneplace' && unit.parts.includes('ch')) return unit;
  }
  return null;
}

interface Heard {
  /** Numbers left over, which may be totals. */
  readonly idle: Casting['idle'];
  readonly used: readonly Event[];
}

const LOST_REPEAT = 6;
const SURE_TOTAL = 1.5;

/**
 * Takes the phrases of a line in every likely way, shortlists them by sums of places and totals, and has the count judge
 * the likeliest.
 */
export function chooseWork(events: readonly Event[], setting: Setting): Choice | null {
  const found: Found = { proposals: [], best: -Infinity };
  const corner = cornerIn(events) ?? setting.corner;
  const hasTimes = events.some((event) => event.type === 'times');
  addWhole(events, setting, found);
  for (const { kept, rest, cost } of prefixes(events, setting.heading).sort((a, b) => a.cost - b.cost)) {
    const later = rest.filter((event) => event.type === 'number');
    if (isHopeless(cost, found)) break;
    for (const casting of castNumbers(kept)) {
      if (isHopeless(cost + casting.cost, found)) break;
      const idle = [...casting.idle, ...later];
      for (const elements of startingChains(casting.elements, setting.chainCounts)) {
        const mayImply = !hasTimes && isRepeatable(elements.elements);
        const before = casting.cost + cost + elements.cost;
        if (isHopeless(before, found)) continue;
        for (const assembly of assemble(elements.elements, { corner, edge: setting.edge })) {
          if (isHopeless(before + assembly.cost, found)) break;
          if (assembly.units.length > 0)
            weigh(assembly.units, before + assembly.cost, { idle, used: kept }, setting, mayImply, found);
        }
      }
    }
  }
  return judgeWork(found.proposals, setting);
}

interface Found {
  readonly proposals: Proposal[];
  best: number;
}

/** The most that places and a total can speak for a reading. */
const MOST_GAIN = 6.9;
/** How far behind the best a reading may be and still tell how sure that is. */
const KEPT_BEHIND = 0.6;

/** Whether a way of taking the words that costs so much can no longer come near the best: the ways come cheapest first. */
function isHopeless(cost: number, found: Found): boolean {
  return MOST_GAIN - cost < found.best - KEPT_BEHIND;
}

function isRepeatable(elements: readonly Element[]): boolean {
  return !elements.some((one) => one.type === 'unit' && one.fills);
}

/** The phrases of the first sentences, the rest being talk: needed where a line is told twice. */
function prefixes(
  events: readonly Event[],
  heading: number,
): { kept: readonly Event[]; rest: readonly Event[]; cost: number }[] {
  const out = [{ kept: events, rest: [] as readonly Event[], cost: 0 }];
  const borders = events.flatMap((event, n) =>
    n > 0 && (event.sentence !== events[n - 1]!.sentence || isExplained(event)) ? [n] : [],
  );
  for (const border of borders.slice(0, 6)) {
    const rest = events.slice(border);
    const units = rest.filter((event) => event.type === 'unit').length;
    if (units === 0 && !rest.some((event) => event.type === 'times' || event.type === 'around')) continue;
    const explained = isExplained(rest[0]!);
    const times = rest.some((event) => event.type === 'times') ? LOST_REPEAT : 0;
    out.push({ kept: events.slice(0, border), rest, cost: explained ? 0.4 + times : 0.6 + 0.35 * units + times });
  }
  for (const border of borders.slice(0, 3)) {
    const before = events.slice(0, border);
    const units = before.filter((event) => event.type === 'unit').length;
    if (units === 0) continue;
    const times = before.some((event) => event.type === 'times') ? LOST_REPEAT : 0;
    const isHeading =
      events.length - border > 2 &&
      before.every((event) => event.sentence === heading && (event.type !== 'unit' || event.options.length > 1));
    out.push({
      kept: events.slice(border),
      rest: before,
      cost: (isHeading ? 0.3 + 0.1 * units : 0.7 + 0.35 * units) + times,
    });
  }
  return out;
}

const isExplained = (event: Event): boolean => event.type === 'unit' && event.explains;

/** Readings of the whole line at once: plain work, and copies of other lines. */
function addWhole(events: readonly Event[], setting: Setting, found: Found): void {
  const heard = { idle: events.filter((event) => event.type === 'number'), used: events };
  const units = events.filter((event) => event.type === 'unit').length;
  const times = events.some((event) => event.type === 'times') ? 3 : 0;
  const plain: Unit = { type: 'repeat', units: [{ type: 'stitch', stitch: '?', inOne: 1, times: 1 }], times: 0 };
  if (setting.isPlain) weigh([plain], (setting.isTold ? 0.4 : 0.8) + units * 0.8 + times, heard, setting, false, found);
  for (const copy of setting.copies) {
    const against = remindsOf(copy.units, events) ? 0 : units * 1.1 + times;
    weigh(copy.units, copy.cost + against, heard, setting, true, found);
  }
}

function weigh(
  units: readonly Unit[],
  cost: number,
  { idle, used }: Heard,
  setting: Setting,
  mayImply: boolean,
  found: Found,
): void {
  const settled = settleStitches(units, setting.stitch);
  const totals = idle.filter((event) => event.asTotal >= SURE_TOTAL).map((event) => event.n);
  for (const resolved of resolve(settled, setting.bases, totals, { mayImply, mayLeave: setting.mayLeave })) {
    const { makes, chains } = sumOf(resolved.units);
    const said = saidTotal(idle, makes, (n) => n === makes || n === makes - chains);
    const isSoft =
      resolved.fit === 'misfit' && setting.isDoubtful && said === makes && makes * 2 >= (setting.bases[0]?.n ?? 0);
    const fit = isSoft ? 'unknown' : resolved.fit;
    const agrees = said === makes || said === makes - chains;
    const score = fitGain(fit) + (agrees ? saidGain(idle, said, fit === 'misfit') : 0) - cost - resolved.cost;
    found.proposals.push({
      units: merged(resolved.units),
      fit,
      base: resolved.base,
      leaves: resolved.leaves,
      idle,
      used,
      score,
      cost: cost + resolved.cost,
    });
    found.best = Math.max(found.best, score);
  }
}
