import { sumOf, type Unit } from '../work/units.ts';

/** How many places there may be to work into, the likeliest first. */
export interface Base {
  readonly n: number;
  readonly cost: number;
}

export interface Resolved {
  readonly units: readonly Unit[];
  readonly fit: 'fits' | 'misfit' | 'unknown';
  readonly base: number | null;
  /** Places left on purpose. */
  readonly leaves: number;
  readonly cost: number;
}

/** What may be taken for granted: that phrases are repeated though nobody says so, that places are left. */
export interface Allowance {
  readonly mayImply: boolean;
  readonly mayLeave: boolean;
}

const IMPLIED_COST = 1.2;

/**
 * Closes what was left open ("all the way around") by the places there are, or where these are not known by a total
 * that was said, and says whether the work fits.
 */
export function resolve(
  units: readonly Unit[],
  bases: readonly Base[],
  totals: readonly number[],
  may: Allowance,
): readonly Resolved[] {
  const opens = distinctOpens(units);
  if (opens.length === 0) return closed(units, bases, may);
  return opens.flatMap((index) => {
    const kept = units.filter((unit, n) => n === index || !isOpen(unit));
    const at = kept.findIndex(isOpen);
    return fill(kept, at, bases, totals).map((one) => ({ ...one, cost: one.cost + (opens.length > 1 ? 0.8 : 0) }));
  });
}

function isOpen(unit: Unit): boolean {
  return unit.type === 'repeat' && unit.times === 0;
}

function distinctOpens(units: readonly Unit[]): number[] {
  const seen = new Set<string>();
  return units.flatMap((unit, n) => {
    if (!isOpen(unit)) return [];
    const key = JSON.stringify(unit);
    if (seen.has(key)) return [];
    seen.add(key);
    return [n];
  });
}

function closed(units: readonly Unit[], bases: readonly Base[], may: Allowance): Resolved[] {
  const { uses } = sumOf(units);
  if (bases.length === 0) return [{ units, fit: 'unknown', base: null, leaves: 0, cost: 0 }];
  const fit = bases.find((base) => base.n === uses);
  if (fit !== undefined) return [{ units, fit: 'fits', base: fit.n, leaves: 0, cost: fit.cost }];
  if (may.mayLeave && uses < bases[0]!.n)
    return [{ units, fit: 'fits', base: bases[0]!.n, leaves: bases[0]!.n - uses, cost: 0.2 }];
  const out: Resolved[] = [{ units, fit: 'misfit', base: bases[0]!.n, leaves: 0, cost: 0 }];
  if (!may.mayImply || uses === 0) return out;
  for (const base of bases.slice(0, 3)) {
    if (base.n % uses === 0 && base.n > uses) {
      const whole: Unit = { type: 'repeat', units, times: base.n / uses };
      out.push({ units: [whole], fit: 'fits', base: base.n, leaves: 0, cost: base.cost + IMPLIED_COST });
    }
  }
  return out;
}

function fill(units: readonly Unit[], at: number, bases: readonly Base[], totals: readonly number[]): Resolved[] {
  const hole = units[at]!;
  if (hole.type !== 'repeat') return [];
  const rest = units.filter((_, n) => n !== at);
  const others = sumOf(rest);
  const one = sumOf(hole.units);
  const filled = (times: number): Unit[] => units.flatMap((unit, n) => (n === at ? flat({ ...hole, times }) : [unit]));
  if (bases.length === 0) {
    const total = totals.find((t) => one.makes > 0 && t > others.makes && (t - others.makes) % one.makes === 0);
    if (total === undefined) return [{ units: filled(1), fit: 'unknown', base: null, leaves: 0, cost: 2 }];
    return [{ units: filled((total - others.makes) / one.makes), fit: 'unknown', base: null, leaves: 0, cost: 0.3 }];
  }
  const out: Resolved[] = [];
  for (const base of bases) {
    const left = base.n - others.uses;
    if (one.uses > 0 && left > 0 && left % one.uses === 0) {
      out.push({ units: filled(left / one.uses), fit: 'fits', base: base.n, leaves: 0, cost: base.cost });
    }
  }
  if (out.length > 0) return out;
  const base = bases[0]!.n;
  const times = one.uses > 0 ? Math.max(1, Math.floor((base - others.uses) / one.uses)) : 1;
  return [{ units: filled(times), fit: 'misfit', base, leaves: 0, cost: 1 }];
}

/** One kind of stitch in every place is so many stitches, not a repeat of one. */
function flat(unit: Extract<Unit, { type: 'repeat' }>): Unit[] {
  const [only] = unit.units;
  if (unit.units.length === 1 && (only?.type === 'stitch' || only?.type === 'together' || only?.type === 'oneplace')) {
    return [{ ...only, times: only.times * unit.times }];
  }
  return [unit];
}
