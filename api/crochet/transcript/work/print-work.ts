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
    return unit.inOne === 1 ? `${name} in each st ${end}` : `${unit.inOne} ${name} in each st ${end}`;
  }
  return null;
}

function printUnit(unit: Unit, setting: PrintSetting): string {
  switch (unit.type) {
    case 'stitch':
      return printStitch(unit, setting);
    case 'together': {
      const name = `${nameOf(unit.stitch, setting)}${unit.many}tog`;
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
      return `(${unit.units.map((one) => printUnit(one, setting)).join(', ')}) × ${unit.times}`;
  }
}

function printStitch(unit: Extract<Unit, { type: 'stitch' }>, setting: PrintSetting): string {
  const name = nameOf(unit.stitch, setting);
  if (unit.inOne === 1) return unit.times === 1 ? name : `${unit.times} ${name}`;
  const one = unit.inOne === 2 && unit.stitch === 'sc' ? 'inc' : `${unit.inOne} ${name} in next st`;
  if (unit.times === 1) return one;
  return one === 'inc' ? `${unit.times} inc` : `(${one}) × ${unit.times}`;
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
