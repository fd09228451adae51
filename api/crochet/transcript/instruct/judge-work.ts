import { type Left } from '../../count/places.ts';
import { countUnits, isTotalOf, leavesOutInside } from '../work/counted.ts';
import { spell, type Unit } from '../work/units.ts';
import { type Event } from './event.ts';
import { type Casting } from './roles.ts';

/** A way to take a line before the count was asked. */
export interface Proposal {
  readonly units: readonly Unit[];
  readonly fit: 'fits' | 'misfit' | 'unknown';
  readonly base: number | null;
  /** Places that it may stop short of the base, left on purpose. */
  readonly leaves: number;
  readonly idle: Casting['idle'];
  readonly used: readonly Event[];
  readonly score: number;
  readonly cost: number;
}

/** One way to take a line, with its standing among the others. */
export interface Choice {
  readonly units: readonly Unit[];
  readonly said: number | null;
  /** Whether the number said is what the count makes of the work; null where none was said. */
  readonly agrees: boolean | null;
  readonly fit: 'fits' | 'misfit' | 'unknown';
  readonly base: number | null;
  /** What it leaves for the next line. */
  readonly left: Left;
  readonly makes: number;
  /** Whether its total left out the chains inside a group; null where it tells nothing of that. */
  readonly leavesOutInside: boolean | null;
  readonly score: number;
  /** What speaks against this way of taking the words, whatever the count says. */
  readonly cost: number;
  /** How far ahead of the next different reading. */
  readonly lead: number;
  /** The phrases that it was taken from; what was told again, or only spoken of, is not among them. */
  readonly used: readonly Event[];
}

/** How many of the likeliest readings of a line the count is asked about. */
const ASKED = 12;
const FIT_GAIN = 4;
const SAID_GAIN = 2.2;
const MISFIT_SAID_GAIN = 1;
const SURE_TOTAL = 1.5;

/** What the places speak for a reading. */
export const fitGain = (fit: Proposal['fit']): number => (fit === 'fits' ? FIT_GAIN : fit === 'unknown' ? 1 : 0);

/** A total that agrees speaks for the work, more where it was plainly said as one, little where the work does not fit. */
export function saidGain(idle: Casting['idle'], said: number, isMisfit: boolean): number {
  if (isMisfit) return MISFIT_SAID_GAIN;
  const clearest = Math.max(...idle.filter((event) => event.n === said).map((event) => event.asTotal));
  return SAID_GAIN + 0.4 * Math.max(0, Math.min(2.5, clearest) - 1);
}

/** The total among the numbers left over: one that comes out, else the one said most like a total. */
export function saidTotal(idle: Casting['idle'], makes: number, comesOut: (n: number) => boolean): number | null {
  const equal = idle.filter((event) => event.asTotal > (makes < 3 ? 1 : -0.9) && comesOut(event.n));
  const exact = equal.find((event) => event.n === makes) ?? equal.find((event) => event.asTotal >= 1);
  if (exact !== undefined) return exact.n;
  const likely = idle.filter((event) => event.asTotal >= SURE_TOTAL && event.n > 2 && event.n * 3 >= makes);
  return likely.sort((a, b) => b.asTotal - a.asTotal)[0]?.n ?? null;
}

/** How a line is counted: in a ring or not, and whether the totals of its piece leave out the chains inside a group. */
export interface Counting {
  readonly isRing: boolean;
  readonly leavesOut: boolean;
}

/**
 * Asks the count about the likeliest readings and takes the one that stands best: that fits the places, agrees with
 * what was said, and has least against it. No more than a dozen are counted, each in time linear in its stitches.
 */
export function judgeWork(proposals: readonly Proposal[], how: Counting): Choice | null {
  const likeliest = [...proposals].sort((a, b) => b.score - a.score).slice(0, 4 * ASKED);
  const seen = new Set<string>();
  const choices: Choice[] = [];
  for (const proposal of likeliest) {
    if (seen.size >= ASKED) break;
    const key = `${spell(proposal.units).join(' ')} ${String(proposal.base)}`;
    if (seen.has(key)) continue;
    seen.add(key);
    choices.push(judge(proposal, how));
  }
  const ranked = choices.sort((a, b) => b.score - a.score);
  const [first] = ranked;
  if (first === undefined) return null;
  const spelled = spell(first.units).join(' ');
  // where the work does not fit, other work that does not fit either says no less that something is wrong
  const isMisfit = first.fit === 'misfit';
  const second = ranked.find(
    (choice) => spell(choice.units).join(' ') !== spelled && !(isMisfit && choice.fit === 'misfit'),
  );
  return { ...first, lead: second === undefined ? 2 : Math.min(2, first.score - second.score) };
}

function judge(proposal: Proposal, { isRing, leavesOut }: Counting): Choice {
  const { units, base, idle, cost, used } = proposal;
  const places = proposal.fit === 'unknown' || base === null ? null : base - proposal.leaves;
  const counted = countUnits(units, places, isRing);
  const fit = places === null ? 'unknown' : counted.fits ? 'fits' : 'misfit';
  const makes = counted.tally.sts + counted.tally.chainsOutside;
  const comesOut = (n: number) => isTotalOf(n, counted.tally, leavesOut);
  const said = saidTotal(idle, makes, comesOut);
  const agrees = said === null ? null : comesOut(said);
  const gain = agrees === true ? saidGain(idle, said!, fit === 'misfit') : 0;
  const score = fitGain(fit) + gain - cost;
  const inside = agrees === true ? leavesOutInside(said!, counted.tally) : null;
  return {
    units,
    said,
    agrees,
    fit,
    base,
    left: counted.left,
    makes,
    leavesOutInside: inside,
    score,
    cost,
    lead: 0,
    used,
  };
}
