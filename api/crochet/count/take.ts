import { type Group, type Item, type Target, type Work } from '../language/tree.ts';
import { pick, type Job } from './job.ts';
import { isAt, MOST } from './places.ts';
import { endOf } from './fill.ts';

/** Takes the places of one stitch: several for a stitch drawn together. */
export function takeOne(job: Job, target: Target | null, item: { readonly span: Item['span'] }, legs = 1): number[] {
  const on: number[] = [];
  for (let leg = 0; leg < legs; leg += 1) {
    const at = job.walker.take(leg === 0 ? target : target?.what === 'sp' ? target : null, item.span);
    if (at < 0) {
      job.walker.short += legs - leg - 1;
      break;
    }
    on.push(at);
    if (leg > MOST) break;
  }
  return on;
}

/** A stitch into the first one at the end of a round, behind a chain. */
export const isClosing = (job: Job, item: Work): boolean =>
  job.ring &&
  job.walker.at > 1 &&
  job.walker.made.at(-1)?.kind === 'chs' &&
  item.times.type === 'n' &&
  item.times.n[0] === 1;

/** Where one stitch goes: the next place, or a place named. */
export function placesFor(job: Job, item: Work | Group, target: Target | null, legs: number): number[] {
  const { walker } = job;
  switch (target?.which) {
    case 'same': {
      if (walker.pointed >= 0) return takeOne(job, null, item);
      if (walker.last >= 0) return [walker.last];
      return takeOne(job, target.what === 'other' ? null : target, item, legs);
    }
    case 'first': {
      if (walker.at === 0) return takeOne(job, target, item, legs);
      if (walker.last >= 0 && walker.at <= 1) return [walker.last];
      return walker.remaining() > 0 && !job.ring ? takeOne(job, target, item, legs) : [0];
    }
    case 'last': {
      if (walker.open) return takeOne(job, target, item, legs);
      const n = item.times.type === 'n' ? pick(item.times.n, job.size) : 1;
      if (n > 1) return takeOne(job, { ...target, which: 'next' }, item, legs);
      for (let at = endOf(job) - 1; at >= walker.at; at -= 1) {
        if (isAt(walker.places[at]!, target, walker.spaces)) {
          walker.at = at;
          return takeOne(job, target, item, legs);
        }
      }
      return takeOne(job, target, item, legs);
    }
    case 'nth':
    case 'centre':
      return takeNth(job, item, target);
    case 'skipped': {
      const back = walker.skipped.shift();
      return back === undefined ? takeOne(job, { ...target, which: 'next' }, item, legs) : [back];
    }
  }
  if (target?.what === 'mark') {
    const mark = job.marks.find((at) => at >= walker.at);
    if (mark !== undefined) walker.at = mark;
    return takeOne(job, null, item, legs);
  }
  return takeOne(job, target?.what === 'other' ? null : target, item, legs);
}

export function takeNth(job: Job, item: { readonly span: Item['span'] }, target: Target): number[] {
  const { walker } = job;
  if (target.of !== undefined || target.which === 'centre') return takeOne(job, target, item);
  // `in 2nd st` at the start is told from the edge, later from where the hook is.
  const ahead = (target.n ?? 1) - 1 - (walker.at <= 1 ? walker.at : 0);
  for (let i = 0; i < ahead && i < MOST && walker.short === 0; i += 1)
    walker.take({ ...target, which: 'next' }, item.span);
  return takeOne(job, { ...target, which: 'next' }, item);
}
