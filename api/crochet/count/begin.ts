import { type Item } from '../language/tree.ts';
import { stitchOf } from '../stitches.ts';
import { allItems } from './tree-walk.ts';
import { type Job } from './job.ts';
import { firstStitch, performStart, startOf, type ChainPolicy } from './start.ts';
import { type Setting } from './work-line.ts';

/** `with dc in 4th ch from hook` on a foundation: whether the chains passed over are a stitch. */
export function hookStart(
  items: readonly Item[],
  hook: number,
  job: Job,
  policy: ChainPolicy,
): { stitch: string | null; extra: number; unsaid: boolean } {
  const stitch = firstStitch(items);
  const row = stitch ? stitchOf(stitch) : undefined;
  const height = row?.height ?? 1;
  if (!stitch || hook <= 2 || height < 2) return { stitch: null, extra: 0, unsaid: false };
  const over = hook - 1 - height;
  const spaces = allItems(items).flatMap((item) =>
    item.type === 'work' && item.stitch === 'ch' && item.times.type === 'n' ? [item.times.n[0]!] : [],
  );
  const extra = over > 0 ? (spaces.find((n) => over === 2 * n || over === n) ?? 0) : 0;
  const usual = (over >= 0 && height >= 3) || extra > 0;
  const own = allItems(items).find((item) => item.type === 'work' && item.into?.which === 'hook');
  const said = own?.type === 'work' && own.counts ? own.counts.as !== null : null;
  const known = said ?? policy[stitch] ?? null;
  const counts = extra > 0 ? true : (known ?? (job.choices.chain === 'usual' ? usual : !usual));
  return {
    stitch: counts && row?.family === 'plain' ? stitch : null,
    extra: counts ? extra : 0,
    unsaid: known === null && extra === 0,
  };
}

export function begin(
  job: Job,
  body: readonly Item[],
  setting: Setting,
  hook: number,
  isOpen: boolean,
): { items: readonly Item[]; unsaid: boolean } {
  if (hook > 0) {
    if (setting.blocks && hook > 3) {
      job.walker.chain(hook - 1);
      return { items: withoutSkips(body), unsaid: false };
    }
    const start = hookStart(body, hook, job, setting.policy);
    if (start.stitch) job.walker.stitch(start.stitch, []);
    job.walker.chain(start.extra);
    return { items: withoutSkips(body), unsaid: start.unsaid };
  }
  const start = startOf(body, 0, job, setting.policy, setting.left.turningChain);
  if (!start) return { items: body, unsaid: false };
  const after = body.slice(start.index);
  if (start.stitch || start.extra > 0) performStart(job, start, after, isOpen);
  return { items: after, unsaid: start.unsaid };
}

/** `skip first 3 ch` on a foundation has been reckoned with in its places already. */
export function withoutSkips(items: readonly Item[]): readonly Item[] {
  const index = items.findIndex((item) => item.type === 'work' || item.type === 'group' || item.type === 'skip');
  const first = items[index];
  const isLead = first?.type === 'skip' && (first.of === null || ['ch', 'st'].includes(first.of.what));
  return isLead ? [...items.slice(0, index), ...items.slice(index + 1)] : items;
}

/**
 * `(ch 3, dc) in same sp` at the start of a round is `ch 3, dc in same sp`: the chain within the bracket starts the line
 * like any other.
 */
export function opened(items: readonly Item[]): readonly Item[] {
  const index = items.findIndex(
    (item) => item.type === 'group' || item.type === 'skip' || (item.type === 'work' && item.stitch !== 'slst'),
  );
  const group = items[index];
  if (group?.type !== 'group' || !group.into || group.into.what === 'ring') return items;
  const [chain, next] = group.items;
  const isStart =
    group.times.type === 'n' &&
    group.times.n[0] === 1 &&
    (group.into.which === 'same' || group.into.which === 'first' || group.into.which === 'next') &&
    chain?.type === 'work' &&
    chain.stitch === 'ch' &&
    chain.times.type === 'n' &&
    chain.times.n[0]! >= 2 &&
    (next?.type === 'work' || next?.type === 'group');
  if (!isStart) return items;
  const rest = { ...group, items: group.items.slice(1), into: { ...group.into, which: 'same' as const } };
  return [...items.slice(0, index), chain, rest, ...items.slice(index + 1)];
}
