import { type Unit } from '../work/units.ts';
import { BARE, type Event } from './event.ts';

const MOST = 80;

/**
 * Whether what a line tells agrees with a line it is said to be the same as: its phrases stand in that one in the same
 * order. "The same row again: two in the first, four, three together, four" only reminds.
 */
export function remindsOf(units: readonly Unit[], events: readonly Event[]): boolean {
  const row = flat(units);
  let at = 0;
  let told = 0;
  for (const event of events) {
    if (event.type !== 'unit' || event.fills) continue;
    const unit = event.options[0]?.[0];
    if (unit === undefined) continue;
    const found = row.findIndex((one, n) => n >= at && isLike(one, unit));
    if (found < 0) return false;
    at = found + 1;
    told += 1;
  }
  return told > 0;
}

function flat(units: readonly Unit[]): readonly Unit[] {
  const out: Unit[] = [];
  for (const unit of units) {
    if (unit.type !== 'repeat') out.push(unit);
    else for (let n = 0; n < Math.max(1, unit.times) && out.length < MOST; n++) out.push(...flat(unit.units));
    if (out.length >= MOST) break;
  }
  return out;
}

function isLike(one: Unit, told: Unit): boolean {
  if (one.type === 'stitch' && told.type === 'stitch')
    return one.inOne === told.inOne && one.times === told.times && isSame(one.stitch, told.stitch);
  if (one.type === 'together' && told.type === 'together')
    return one.many === told.many && isSame(one.stitch, told.stitch);
  if (one.type === 'chain' || one.type === 'skip') return one.type === told.type && one.many === told.many;
  return one.type === 'oneplace' && told.type === 'oneplace' && one.parts.length === told.parts.length;
}

const isSame = (one: string, told: string): boolean => told === BARE || one === told;
