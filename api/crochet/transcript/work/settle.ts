import { BARE } from '../instruct/event.ts';
import { areSame, type Unit } from './units.ts';

/** Names the stitch of bare numbers, increases and decreases: the one last named, else the first named after, else the one in hand. */
export function settleStitches(units: readonly Unit[], inHand: string): readonly Unit[] {
  let current = firstNamed(units) ?? inHand;
  const visit = (unit: Unit): Unit => {
    switch (unit.type) {
      case 'stitch':
      case 'together': {
        const stitch = unit.stitch === BARE ? current : unit.stitch;
        if (isFabric(stitch)) current = stitch;
        return stitch === unit.stitch ? unit : { ...unit, stitch };
      }
      case 'oneplace':
        return unit.parts.includes(BARE)
          ? { ...unit, parts: unit.parts.map((part) => (part === BARE ? current : part)) }
          : unit;
      case 'repeat':
        return { ...unit, units: unit.units.map(visit) };
      default:
        return unit;
    }
  };
  return merged(units.map(visit));
}

const SPECIAL = new Set(['bobble', 'popcorn', 'puff', 'cluster', 'picot', 'slst']);
const isFabric = (stitch: string): boolean => !SPECIAL.has(stitch);

function firstNamed(units: readonly Unit[]): string | null {
  for (const unit of units) {
    const found =
      unit.type === 'repeat'
        ? firstNamed(unit.units)
        : unit.type === 'oneplace'
          ? (unit.parts.find((part) => part !== 'ch' && part !== BARE && isFabric(part)) ?? null)
          : (unit.type === 'stitch' || unit.type === 'together') && unit.stitch !== BARE && isFabric(unit.stitch)
            ? unit.stitch
            : null;
    if (found !== null) return found;
  }
  return null;
}

/**
 * Two singles and one single are three; a group said once before its repeat, or repeated again after it, is one repeat.
 */
export function merged(units: readonly Unit[]): readonly Unit[] {
  const out: Unit[] = [];
  for (const unit of units.flatMap((one) => (one.type === 'repeat' && one.times === 1 ? one.units : [one]))) {
    const last = out.at(-1);
    if (unit.type === 'stitch' && last?.type === 'stitch' && last.stitch === unit.stitch && last.inOne === unit.inOne) {
      out[out.length - 1] = { ...last, times: last.times + unit.times };
    } else if (unit.type === 'repeat' && unit.times > 0) out.push(withEarlier(out, unit));
    else out.push(unit);
  }
  return out;
}

/** Takes from the end of the row the tellings of a group that the repeat goes on with. */
function withEarlier(row: Unit[], repeat: Extract<Unit, { type: 'repeat' }>): Unit {
  let { times } = repeat;
  const { length } = repeat.units;
  for (;;) {
    const last = row.at(-1);
    if (last?.type === 'repeat' && last.times > 0 && areSame(last.units, repeat.units)) {
      times += last.times;
      row.pop();
    } else if (row.length >= length && areSame(row.slice(-length), repeat.units)) {
      times += 1;
      row.length -= length;
    } else return { ...repeat, times };
  }
}
