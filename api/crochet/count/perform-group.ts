import { type Group, type Item, type Work } from '../language/tree.ts';
import { pick, usesOf, type Job } from './job.ts';
import { goal, fill, stopAt } from './fill.ts';
import { placesFor } from './take.ts';
import { performOn } from './make.ts';
import { perform } from './perform.ts';

/** A group all in one place, as often as its words say. */
export function performInto(job: Job, item: Group, need: () => number): void {
  const target = item.into!;
  const once = (): void => {
    const isRing = target.what === 'ring';
    const on = isRing ? [] : placesFor(job, item, target.which === 'hook' ? null : target, 1);
    performOn(job, item.items, on);
  };
  if (item.times.type === 'fill' || item.times.type === 'unsaid') {
    fill(job, target, stopAt(job, item.times.type === 'fill' ? item.times : null, need()), once);
    return;
  }
  repeat(job, countOf(job, item), once);
}

/** Does the same so often, and no further where it comes to nothing: a hostile number of empty repeats ends at once. */
function repeat(job: Job, n: number, once: (i: number) => void): void {
  const { walker } = job;
  for (let i = 0; i < n && !walker.full; i += 1) {
    const { at, short } = walker;
    const worked = walker.walk.length;
    once(i);
    if (walker.walk.length === worked && walker.at === at && walker.short === short) return;
  }
}

export const countOf = (job: Job, item: Group): number =>
  item.times.type === 'n'
    ? pick(item.times.n, job.size)
    : item.times.type === 'rep'
      ? pick(item.times.n, job.size) + (job.choices.rep === 'more' ? 1 : 0)
      : 1;

export function performGroup(job: Job, item: Group, need: () => number, ending: boolean): void {
  const part = item.stop === null ? null : item.items.slice(0, item.stop);
  const isFill = item.times.type === 'fill' || (item.times.type === 'unsaid' && job.choices.unsaid === 'fill');
  if (!isFill) {
    const n = countOf(job, item);
    const unit = usesOf(item.items, job);
    const after = need();
    job.depth += 1;
    repeat(job, n, (i) => {
      const isLast = i === n - 1;
      perform(job, isLast && part ? part : item.items, isLast ? after : after + unit * (n - 1 - i));
    });
    job.depth -= 1;
    return;
  }
  const after = need();
  job.depth += 1;
  fillGroup(job, item, part, after, ending);
  job.depth -= 1;
}

export function fillGroup(job: Job, item: Group, part: readonly Item[] | null, rest: number, ending: boolean): void {
  const { walker } = job;
  const times = item.times.type === 'fill' ? item.times : null;
  const stop = stopAt(job, times, rest);
  if (walker.open) {
    perform(job, item.items, 0);
    job.endless = true;
    return;
  }
  while (walker.remaining(stop) > 0 && !walker.full) {
    const before = walker.mark();
    perform(job, item.items, 0);
    const went = walker.at > before.at;
    if (walker.short > before.short || walker.at > stop) {
      walker.back(before);
      if (part) perform(job, part, 0);
      else if (ending || job.choices.cut === 'cut') cutShort(job, item.items, stop);
      return;
    }
    if (!went) {
      walker.back(before);
      return;
    }
  }
  if (times?.to) walker.pointed = goal(job, times.to);
}

/** The last repeat, as far as there is room for it. */
export function cutShort(job: Job, items: readonly Item[], stop: number): void {
  const { walker } = job;
  for (const item of items) {
    const before = walker.mark();
    if (walker.remaining(stop) === 0) return;
    perform(job, [item], 0);
    if (walker.short > before.short || walker.at > stop) {
      walker.back(before);
      if (item.type === 'work' && item.into === null && item.times.type === 'n' && pick(item.times.n, job.size) > 1) {
        const one: Work = { ...item, times: { type: 'n', n: [1] } };
        while (walker.remaining(stop) > 0) perform(job, [one], 0);
      }
      return;
    }
  }
}
