import { type Target, type Work } from '../language/tree.ts';
import { edgeOf } from './finished.ts';
import { legsOf, pick, type Edge, type Job } from './job.ts';
import { make } from './make.ts';
import { takeOne } from './take.ts';

/** Along the edge of a piece worked earlier: so many stitches, or all of them where no number is given. */
export function workEdge(job: Job, item: Work, target: Target): void {
  const { walker } = job;
  const legs = legsOf(item.stitch);
  const edge = edgeFor(job, target, item.times.type === 'n' ? pick(item.times.n, job.size) * legs : 1);
  const rest = edge.has === null ? null : Math.max(0, Math.floor((edge.has - edge.used) / legs));
  if (item.times.type !== 'n' && rest === null) job.endless = true;
  const n = item.times.type === 'n' ? pick(item.times.n, job.size) : (rest ?? 1);
  const per = pick(item.per, job.size);
  for (let i = 0; i < n && !walker.full; i += 1) {
    const on = takeOne(job, null, item, legs);
    edge.used += legs;
    makeSeveral(job, item.stitch, on, per);
  }
  const lacking = edge.has === null ? 0 : edge.used - edge.has;
  if (lacking > 0) {
    walker.short += lacking;
    walker.fault ??= item.span;
    edge.used -= lacking;
  }
}

function makeSeveral(job: Job, stitch: string, on: readonly number[], n: number): void {
  for (let i = 0; i < n && !job.walker.full; i += 1) make(job, stitch, on);
}

/** The edge meant. Of pieces told apart by no number (`left leg`, `right leg`) the next is meant once one is used up. */
function edgeFor(job: Job, target: Target, need: number): Edge {
  let n = target.n ?? 0;
  const keyOf = () => `${target.piece ?? ''} ${String(n)}`;
  const isUsedUp = ({ has, used }: Edge) => has !== null && used + need > has;
  while (target.n === undefined && isUsedUp(job.edges.get(keyOf()) ?? { has: null, used: 0 })) n -= 1;
  const key = keyOf();
  const known = job.edges.get(key);
  if (known) return known;
  const edge: Edge = { has: edgeOf(job.finished, target, job.size), used: 0 };
  job.edges.set(key, edge);
  return edge;
}

/**
 * Places there are for a line that joins pieces: those it takes of their edges and along the chains between them. Null
 * where a piece is not known; what is left of an edge is no fault, since legs often meet in a stitch or two.
 */
export function joinedPlaces({ edges, walker }: Job): number | null {
  const all = [...edges.values()];
  return all.length > 0 && all.every((edge) => edge.has !== null) ? walker.at - walker.short : null;
}
