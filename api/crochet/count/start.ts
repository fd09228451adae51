import { type ChainCounts, type Item, type Work } from '../language/tree.ts';
import { stitchOf } from '../stitches.ts';
import { pick, type Job } from './job.ts';
import { takeOne } from './take.ts';

/** What the pattern says of its starting chains, by the stitch they stand for. Null is unsaid. */
export type ChainPolicy = Readonly<Record<string, boolean | null>>;

/** A starting chain and what it turned out to be. */
export interface Start {
  /** How many items it takes, with the travelling before it. */
  readonly index: number;
  readonly chains: number;
  readonly stitch: string | null;
  /** Chains beyond the stitch: `ch 5 (counts as dc + ch 2)`. */
  readonly extra: number;
  /** Nothing settles whether it counts. */
  readonly unsaid: boolean;
}

/** The first stitch worked among these items. */
export function firstStitch(items: readonly Item[]): string | null {
  for (const item of items) {
    if (item.type === 'work' && !['ch', 'slst', 'picot', 'st'].includes(item.stitch)) return item.stitch;
    const inner = item.type === 'group' ? firstStitch(item.items) : null;
    if (inner) return inner;
  }
  return null;
}

/** The starting chain of a line, or null. `carried` is a turning chain that the line before ended with. */
export function startOf(
  items: readonly Item[],
  travels: number,
  job: Job,
  policy: ChainPolicy,
  carried: number,
): Start | null {
  let index = travels;
  while (items[index] && ['note', 'step', 'loops'].includes(items[index]!.type)) index += 1;
  const item = items[index];
  const own = item?.type === 'work' && item.stitch === 'ch' && !item.between ? item : null;
  if (!own && carried === 0) return null;
  const after = items.slice(own ? index + 1 : index);
  if (
    own &&
    after.every(
      (other) => other.type !== 'work' && other.type !== 'group' && other.type !== 'skip' && other.type !== 'straight',
    )
  )
    return null;
  const next = after.find((other) => other.type !== 'note' && other.type !== 'step');
  if (next?.type === 'work' && next.into?.which === 'hook') return null;
  const chains = own ? (own.times.type === 'n' ? pick(own.times.n, job.size) : 1) : carried;
  const named = firstStitch(after);
  const stitch = named !== null && job.own.has(named) ? firstStitch(job.own.get(named)!) : named;
  const found = own?.counts ? said(own.counts, stitch, chains) : unsaid(chains, stitch, after, items, policy, job);
  return { index: own ? index + 1 : index, chains, ...found };
}

type Found = Pick<Start, 'stitch' | 'extra' | 'unsaid'>;

function said(counts: ChainCounts, stitch: string | null, chains: number): Found {
  const as = counts.as === 'st' ? stitch : counts.as;
  const height = as ? (stitchOf(as)?.height ?? 3) : 0;
  return {
    stitch: as ?? null,
    extra: counts.chains > 0 ? counts.chains : counts.as === 'st' && chains > height + 1 ? 0 : 0,
    unsaid: false,
  };
}

function unsaid(
  chains: number,
  stitch: string | null,
  after: readonly Item[],
  items: readonly Item[],
  policy: ChainPolicy,
  job: Job,
): Found {
  const row = stitch ? stitchOf(stitch) : undefined;
  // Before a cluster in the same place the chain is its first leg.
  if (row?.family === 'bunch') return { stitch: null, extra: 0, unsaid: false };
  const tall =
    row?.family === 'increase' || row?.family === 'decrease' ? (stitchOf(job.stitch)?.height ?? 1) : (row?.height ?? 1);
  const base =
    row?.family === 'plain' || row?.family === 'post' ? stitch! : row?.family === 'group' ? 'dc' : job.stitch;
  if (tall <= 1) {
    // Before single crochet a longer chain is a space of its own, a short one only lifts the hook.
    const isSpace = chains > 1 && hasChains(after);
    return { stitch: null, extra: isSpace ? chains : 0, unsaid: false };
  }
  const join = items.findLast((item) => item.type === 'step' && item.what === 'join');
  const joined = join?.type === 'step' ? join.into : undefined;
  const over = chains - tall;
  const isPlus = over > 0 && hasChains(after, over);
  const known = policy[base] ?? null;
  const settled = joined === 'stitch' ? false : joined === 'chain' ? true : known;
  const usual = isPlus || (chains >= tall && tall >= 3);
  const counts = settled ?? (job.choices.chain === 'usual' ? usual : !usual && chains >= 2);
  const extra = counts && isPlus ? over : 0;
  return { stitch: counts ? base : null, extra, unsaid: settled === null };
}

function hasChains(items: readonly Item[], length?: number): boolean {
  return items.some((item) => {
    if (item.type === 'group') return hasChains(item.items, length);
    if (item.type !== 'work' || item.stitch !== 'ch' || item.times.type !== 'n') return false;
    return length === undefined || item.times.n[0] === length;
  });
}

/** Works a starting chain that counts: it takes the first place, or stands in the place of what follows in the same. */
export function performStart(job: Job, start: Start, after: readonly Item[], ring: boolean): void {
  const { walker } = job;
  if (!start.stitch) {
    walker.chain(start.extra);
    return;
  }
  walker.start = { stitch: start.stitch, chains: start.chains };
  const next = after.find(
    (item): item is Work | Extract<Item, { type: 'group' }> =>
      (item.type === 'work' && item.stitch !== 'ch') || item.type === 'group',
  );
  if (ring || next?.into?.what === 'ring') walker.stitch(start.stitch, []);
  else {
    const isSpace = next?.into && (next.into.what === 'sp' || next.into.what === 'gap');
    if (isSpace && (next.into.which === 'same' || !job.named.st)) {
      const which = next.into.which === 'same' && !job.named.st ? (job.named.sps[0] ?? next.into) : next.into;
      const at = walker.find({ ...which, which: 'next' });
      walker.stitch(start.stitch, at < 0 ? [] : [at]);
      if (next.into.which === 'same' && at >= 0) takeOne(job, { ...which, which: 'next' }, next);
    } else if (!job.named.st && !job.named.ch) {
      const at = walker.find(job.named.sps[0] ?? { what: 'gap', which: 'next' });
      walker.stitch(start.stitch, at < 0 ? [] : [at]);
      if (next?.into?.which === 'same' && at >= 0) walker.pointed = at;
    } else if (walker.last >= 0 && walker.walk.length === 0) walker.stitch(start.stitch, [walker.last]);
    else walker.stitch(start.stitch, takeOne(job, null, after[0] ?? { span: { start: 0, end: 0 } }));
  }
  walker.chain(start.extra);
}
