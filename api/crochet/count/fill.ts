import { type Target, type Times } from '../language/tree.ts';
import { pick, type Job } from './job.ts';
import { isAt } from './places.ts';

export function goal(job: Job, to: Target): number {
  if (to.what === 'mark') return job.marks.find((at) => at >= job.walker.at) ?? -1;
  return job.walker.find({ ...to, which: 'next' });
}

/** Where the places end: at the turn to the far side of a chain, else at the last. */
export const endOf = (job: Job): number => (job.sideEnd > 0 ? job.sideEnd : job.walker.places.length);

/** Index before which a fill stops: the end less what is kept back, or a place named. */
export function stopAt(job: Job, times: Extract<Times, { type: 'fill' }> | null, rest: number): number {
  const { walker } = job;
  const end = endOf(job);
  if (walker.open) return end;
  if (times?.to) {
    const at = goal(job, times.to);
    return at < 0 ? end : at;
  }
  const kept = times ? pick(times.leave, job.size) : 0;
  const { leaveOf } = times ?? { leaveOf: null };
  if (kept > 0 && leaveOf?.what === 'group') {
    // `to last shell`: to where it begins.
    let left = kept;
    for (let at = end - 1; at >= 0; at -= 1) {
      const place = walker.places[at]!;
      if (place.nth === 1 && place.size > 1 && place.size * 3 > walker.spaces.largest * 2) left -= 1;
      if (left === 0) return at;
    }
    return 0;
  }
  if (kept > 0 && leaveOf && (leaveOf.what === 'sp' || leaveOf.what === 'gap' || leaveOf.stitch !== undefined)) {
    let left = kept;
    for (let at = end - 1; at >= 0; at -= 1) {
      if (isAt(walker.places[at]!, leaveOf, walker.spaces)) left -= 1;
      if (left === 0) return at;
    }
    return 0;
  }
  return indexLeaving(job, kept > 0 ? kept : job.sideEnd > 0 ? 0 : rest, end);
}

/** The index from which exactly so many counted places remain. */
export function indexLeaving(job: Job, n: number, end: number): number {
  const { walker } = job;
  let left = n;
  let at = end;
  while (left > 0 && at > 0) {
    at -= 1;
    if (walker.places[at]!.counted) left -= 1;
  }
  return at;
}

/** Does `once` until the places of this kind before `stop` run out. */
export function fill(job: Job, target: Target | null, stop: number, once: () => void, legs = 1): void {
  const { walker } = job;
  if (walker.open) {
    once();
    job.endless = true;
    return;
  }
  for (;;) {
    const next =
      walker.pointed >= walker.at
        ? walker.pointed
        : target
          ? walker.find(target.which === 'each' || target.which === 'next' ? target : { ...target, which: 'next' })
          : walker.find(null);
    if (next < 0 || next >= stop) return;
    if (legs > 1 && walker.remaining(stop) < legs) return;
    const before = walker.at;
    once();
    if (walker.at <= before) return;
  }
}
