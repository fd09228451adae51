import { type Item } from '../language/tree.ts';
import { stitchOf } from '../stitches.ts';
import { pick, type Job } from './job.ts';

/** Makes one stitch of this kind on these places; an increase makes two, a stitch of the pattern's own what it is. */
export function make(job: Job, key: string, on: readonly number[], colour: string | null = null): void {
  const { walker } = job;
  const own = job.own.get(key);
  if (own) {
    performOn(job, own, on);
    return;
  }
  const row = stitchOf(key);
  if (key === 'inc') {
    walker.stitch(job.stitch, on, colour);
    walker.stitch(job.stitch, on, colour);
  } else if (key === 'dec' || key === 'invdec') walker.stitch(`${job.stitch}2tog`, on, colour);
  else if (key === 'st') walker.stitch(job.stitch, on, colour);
  else if (key === 'picot') walker.walk.push({ stitch: 'picot', on: [], makes: 0, colour: null });
  else if (key === 'vst') {
    walker.stitch('dc', on);
    walker.chain(1);
    walker.stitch('dc', on);
  } else if (row?.family === 'group') for (let i = 0; i < row.makes; i += 1) walker.stitch('dc', on, colour);
  else walker.stitch(key, on, colour);
}

/** Works items all in one place (or over the same few). */
export function performOn(job: Job, items: readonly Item[], on: readonly number[]): void {
  const { walker } = job;
  for (const item of items) {
    if (item.type === 'work') {
      const n = (item.times.type === 'n' ? pick(item.times.n, job.size) : 1) * pick(item.per, job.size);
      if (item.stitch === 'ch') walker.chain(n);
      else for (let i = 0; i < n && !walker.full; i += 1) make(job, item.stitch, on);
    } else if (item.type === 'group') {
      const n = item.times.type === 'n' || item.times.type === 'rep' ? pick(item.times.n, job.size) : 1;
      for (let i = 0; i < n && !walker.full; i += 1) performOn(job, item.items, on);
    }
  }
}
