import { type Shaped } from '../language/tree.ts';
import { pick, type Job } from './job.ts';
import { make } from './make.ts';
import { takeOne } from './take.ts';

/**
 * Shaping told by its sum, over the places that are left (`rest` of them kept): spread evenly, or at both ends.
 *
 * @example on 12 places, `inc 6 evenly` makes 18.
 */
export function performShaped(job: Job, item: Shaped, rest: number): void {
  const { walker } = job;
  if (walker.open) {
    job.endless = true;
    return;
  }
  const change = pick(item.change, job.size);
  const places = walker.remaining() - rest;
  const shapings = Math.abs(change);
  const legs = change < 0 ? 2 : 1;
  if (shapings * legs > places) {
    walker.short += shapings * legs - places;
    walker.at = walker.places.length;
    walker.fault ??= item.span;
    return;
  }
  const units = change < 0 ? places - shapings : places;
  const isShaped = item.how === 'each-end' ? ends(units, shapings) : spread(units, shapings);
  for (let unit = 0; unit < units; unit += 1) {
    if (!isShaped(unit)) make(job, job.stitch, takeOne(job, null, item));
    else if (change < 0) make(job, 'dec', takeOne(job, null, item, 2));
    else make(job, 'inc', takeOne(job, null, item));
  }
}

const spread =
  (units: number, shapings: number) =>
  (unit: number): boolean =>
    Math.floor(((unit + 1) * shapings) / units) > Math.floor((unit * shapings) / units);

const ends =
  (units: number, shapings: number) =>
  (unit: number): boolean => {
    const front = Math.ceil(shapings / 2);
    return unit < front || unit >= units - (shapings - front);
  };
