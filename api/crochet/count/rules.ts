import { type Item, type Target } from '../language/tree.ts';
import { isAt } from './places.ts';
import { pick, type Job } from './job.ts';
import { make } from './make.ts';

/**
 * Lines that give a rule for each kind of place instead of an order:
 * `dc in each dc, 2 dc in each ch-1 sp`, `3 dc in each ch-1 sp, ch 1 between, corners (3 dc, ch 2, 3 dc)`.
 */
export function isRuleSet(items: readonly Item[]): boolean {
  const rules = items.filter((item) => targetOf(item) !== null);
  if (rules.length < 2) return false;
  const isEach = rules.some(
    (item) =>
      (item.type === 'work' || item.type === 'group') && item.into?.which === 'each' && item.times.type === 'fill',
  );
  if (!isEach) return false;
  const kinds = new Set(rules.map((item) => kindOf(targetOf(item)!)));
  const others = items.filter(
    (item) => (item.type === 'work' || item.type === 'group' || item.type === 'skip') && targetOf(item) === null,
  );
  return (
    kinds.size === rules.length &&
    others.every((item) => item.type === 'work' && item.stitch === 'ch' && (item.between ?? items.indexOf(item) === 0))
  );
}

function targetOf(item: Item): Target | null {
  if (item.type !== 'work' && item.type !== 'group') return null;
  const { into } = item;
  if (!into || into.what === 'ring' || into.what === 'loop') return null;
  const isEach = into.which === 'each' && item.times.type === 'fill';
  return isEach || (into.corner === true && into.which === 'next') ? into : null;
}

const kindOf = (target: Target): string =>
  `${target.what} ${target.stitch ?? ''} ${target.chains ?? ''} ${target.corner ? 'corner' : ''}`;

/** Walks all places once and does at each what its rule says. */
export function performRules(job: Job, items: readonly Item[]): void {
  const { walker } = job;
  const rules = items.flatMap((item) => {
    const target = targetOf(item);
    return target && (item.type === 'work' || item.type === 'group')
      ? [{ item, target: { ...target, which: 'next' as const } }]
      : [];
  });
  // The narrowest rule first: a corner before any space.
  rules.sort((a, b) => narrow(b.target) - narrow(a.target));
  const between = items.find((item) => item.type === 'work' && item.between);
  const chains = between?.type === 'work' && between.times.type === 'n' ? pick(between.times.n, job.size) : 0;
  if (walker.open) {
    job.endless = true;
    return;
  }
  for (let at = walker.at; at < walker.places.length; at += 1) {
    const rule = rules.find(({ target }) => isAt(walker.places[at]!, target, walker.spaces));
    if (!rule) continue;
    walker.at = at + 1;
    walker.last = at;
    const { item } = rule;
    const per = item.type === 'work' ? pick(item.per, job.size) : 1;
    for (let i = 0; i < per && !walker.full; i += 1) {
      if (item.type === 'work') make(job, item.stitch, [at]);
      else for (const inner of item.items) workInner(job, inner, at);
    }
    walker.chain(chains);
  }
}

const narrow = (target: Target): number =>
  (target.corner ? 2 : 0) + (target.chains !== undefined || target.stitch !== undefined ? 1 : 0);

function workInner(job: Job, inner: Item, at: number): void {
  if (inner.type !== 'work') return;
  const n = (inner.times.type === 'n' ? pick(inner.times.n, job.size) : 1) * pick(inner.per, job.size);
  if (inner.stitch === 'ch') job.walker.chain(n);
  else for (let i = 0; i < n && !job.walker.full; i += 1) make(job, inner.stitch, [at]);
}
