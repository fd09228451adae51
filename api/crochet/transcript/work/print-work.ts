import { type Unit } from './units.ts';

const UK: Readonly<Record<string, string>> = {
  sc: 'dc',
  hdc: 'htr',
  dc: 'tr',
  tr: 'dtr',
  dtr: 'trtr',
  slst: 'ss',
  sk: 'miss',
};

export interface PrintSetting {
  readonly isUk: boolean;
  readonly isRows: boolean;
  readonly loops: 'both' | 'back' | 'front';
  /** Places there were to work into; a single kind of stitch in all of them is "in each st". */
  readonly base: number | null;
  readonly isRing: boolean;
  /** Whether the maker's decreases are the invisible ones. */
  readonly isInvisible: boolean;
}

/** Prints work as shorthand in house style: `(sc, inc) × 6`, `BLO: sc in each st around`. */
export function printWork(units: readonly Unit[], setting: PrintSetting): string {
  if (units.length === 0) return '';
  const loops = setting.loops === 'back' ? 'BLO: ' : setting.loops === 'front' ? 'FLO: ' : '';
  const body = wholeLine(units, setting) ?? units.map((unit) => printUnit(unit, setting)).join(', ');
  return loops + (setting.isRing ? `${body} in magic ring` : body);
}

function wholeLine(units: readonly Unit[], setting: PrintSetting): string | null {
  const [unit] = units;
  if (units.length !== 1 || unit === undefined || setting.isRing || setting.base === null) return null;
  const end = setting.isRows ? 'across' : 'around';
  if (unit.type === 'stitch' && unit.times === setting.base && unit.times > 1) {
    const name = nameOf(unit.stitch, setting);
    const work = unit.inOne === 1 ? name : isIncrease(unit) ? 'inc' : `${unit.inOne} ${name}`;
    return `${work} in each st ${end}`;
  }
  return null;
}

/** One thing repeated is that thing so many times, without brackets. */
function timesOver(unit: Unit, times: number): Unit {
  return unit.type === 'chain' || unit.type === 'skip'
    ? { ...unit, many: unit.many * times }
    : { ...unit, times: unit.times * times };
}

function printUnit(unit: Unit, setting: PrintSetting): string {
  switch (unit.type) {
    case 'stitch':
      return printStitch(unit, setting);
    case 'together': {
      const name = nameOfTogether(unit, setting);
      return unit.times === 1 ? name : `${name} × ${unit.times}`;
    }
    case 'chain':
      return `ch ${unit.many}`;
    case 'skip':
      return `${setting.isUk ? 'miss' : 'sk'} ${unit.many}`;
    case 'oneplace': {
      const inside = `(${joinParts(unit.parts, setting)}) in next st`;
      return unit.times === 1 ? inside : `[${inside}] × ${unit.times}`;
    }
    case 'repeat':
      if (unit.units.length === 1) return printUnit(timesOver(unit.units[0]!, unit.times), setting);
      return `(${unit.units.map((one) => printUnit(one, setting)).join(', ')}) × ${unit.times}`;
  }
}

/** A plain decrease by its short name, as it is spoken. */
function nameOfTogether(unit: Extract<Unit, { type: 'together' }>, setting: PrintSetting): string {
  if (unit.stitch === 'sc' && unit.many === 2) return setting.isInvisible ? 'inv dec' : 'dec';
  return `${nameOf(unit.stitch, setting)}${unit.many}tog`;
}

function printStitch(unit: Extract<Unit, { type: 'stitch' }>, setting: PrintSetting): string {
  const name = nameOf(unit.stitch, setting);
  if (unit.inOne === 1) return unit.times === 1 ? name : `${unit.times} ${name}`;
  const one = isIncrease(unit) ? 'inc' : `${unit.inOne} ${name} in next st`;
  if (unit.times === 1) return one;
  return one === 'inc' ? `${unit.times} inc` : `(${one}) × ${unit.times}`;
}

function isIncrease(unit: Extract<Unit, { type: 'stitch' }>): boolean {
  return unit.inOne === 2 && unit.stitch === 'sc';
}

function joinParts(parts: readonly string[], setting: PrintSetting): string {
  const out: { part: string; n: number }[] = [];
  for (const part of parts) {
    const last = out.at(-1);
    if (last?.part === part) last.n += 1;
    else out.push({ part, n: 1 });
  }
  return out
    .map(({ part, n }) =>
      part === 'ch' ? `ch ${n}` : n === 1 ? nameOf(part, setting) : `${n} ${nameOf(part, setting)}`,
    )
    .join(', ');
}

function nameOf(stitch: string, { isUk }: PrintSetting): string {
  if (isUk) return UK[stitch] ?? stitch;
  return stitch === 'slst' ? 'sl st' : stitch;
}
