/** One thing done in working order, in the short words of the trade (US). */
export type Unit =
  | { readonly type: 'stitch'; readonly stitch: string; readonly inOne: number; readonly times: number }
  | { readonly type: 'together'; readonly stitch: string; readonly many: number; readonly times: number }
  | { readonly type: 'chain'; readonly many: number }
  | { readonly type: 'skip'; readonly many: number }
  | { readonly type: 'oneplace'; readonly parts: readonly string[]; readonly times: number }
  | { readonly type: 'repeat'; readonly units: readonly Unit[]; readonly times: number };

export interface Sum {
  /** Places used or passed over. */
  readonly uses: number;
  /** Stitches made, chains outside one place counted. */
  readonly makes: number;
  /** Chains outside one place. */
  readonly chains: number;
}

/** Adds up places used and stitches made. */
export function sumOf(units: readonly Unit[]): Sum {
  let uses = 0;
  let makes = 0;
  let chains = 0;
  for (const unit of units) {
    const one = sumOfUnit(unit);
    uses += one.uses;
    makes += one.makes;
    chains += one.chains;
  }
  return { uses, makes, chains };
}

function sumOfUnit(unit: Unit): Sum {
  switch (unit.type) {
    case 'stitch':
      return { uses: unit.times, makes: unit.times * unit.inOne, chains: 0 };
    case 'together':
      return { uses: unit.times * unit.many, makes: unit.times, chains: 0 };
    case 'chain':
      return { uses: 0, makes: unit.many, chains: unit.many };
    case 'skip':
      return { uses: unit.many, makes: 0, chains: 0 };
    case 'oneplace':
      return {
        uses: unit.times,
        makes: unit.times * unit.parts.reduce((sum, part) => sum + stitchesIn(part), 0),
        chains: 0,
      };
    case 'repeat': {
      const one = sumOf(unit.units);
      return { uses: one.uses * unit.times, makes: one.makes * unit.times, chains: one.chains * unit.times };
    }
  }
}

function stitchesIn(part: string): number {
  return part === 'ch' ? 0 : 1;
}

const MOST = 20_000;

/** Spells the work out stitch by stitch: `sc`, `2sc`, `sc2tog`, `ch`, `sk`, `[dc,dc,ch,dc,dc]`. */
export function spell(units: readonly Unit[]): readonly string[] {
  const out: string[] = [];
  for (const unit of units) {
    const one = unit.type === 'repeat' ? spell(unit.units) : [wordOf(unit)];
    const times = unit.type === 'chain' || unit.type === 'skip' ? unit.many : unit.times;
    for (let n = 0; n < times && out.length < MOST; n++) out.push(...one);
  }
  return out;
}

function wordOf(unit: Exclude<Unit, { type: 'repeat' }>): string {
  switch (unit.type) {
    case 'stitch':
      return unit.inOne === 1 ? unit.stitch : `${unit.inOne}${unit.stitch}`;
    case 'together':
      return `${unit.stitch}${unit.many}tog`;
    case 'chain':
      return 'ch';
    case 'skip':
      return 'sk';
    case 'oneplace':
      return `[${unit.parts.join(',')}]`;
  }
}

/** Whether two rows of units are the same work, told the same way. */
export function areSame(some: readonly Unit[], others: readonly Unit[]): boolean {
  return some.length === others.length && some.every((unit, n) => isSame(unit, others[n]!));
}

function isSame(one: Unit, other: Unit): boolean {
  switch (one.type) {
    case 'stitch':
      return (
        other.type === 'stitch' && one.stitch === other.stitch && one.inOne === other.inOne && one.times === other.times
      );
    case 'together':
      return (
        other.type === 'together' && one.stitch === other.stitch && one.many === other.many && one.times === other.times
      );
    case 'chain':
    case 'skip':
      return one.type === other.type && one.many === other.many;
    case 'oneplace':
      return (
        other.type === 'oneplace' &&
        one.times === other.times &&
        one.parts.length === other.parts.length &&
        one.parts.every((part, n) => part === other.parts[n])
      );
    case 'repeat':
      return other.type === 'repeat' && one.times === other.times && areSame(one.units, other.units);
  }
}

/** How often a row of units repeats itself: `[a, b, a, b]` is two of `[a, b]`. */
export function periodOf(units: readonly Unit[]): readonly Unit[] {
  for (let length = 1; length <= units.length / 2; length++) {
    if (units.length % length === 0 && units.every((unit, n) => n < length || isSame(unit, units[n - length]!)))
      return units.slice(0, length);
  }
  return units;
}
