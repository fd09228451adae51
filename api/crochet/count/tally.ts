import { type Made } from './places.ts';
import { type Step } from './walker.ts';

export interface StartChain {
  readonly stitch: string;
  readonly chains: number;
}

/** What a line has made, counted in every way that a total may be printed. */
export interface Tally {
  readonly sts: number;
  readonly chains: number;
  /** Chains that do not stand between stitches of one place. */
  readonly chainsOutside: number;
  readonly spaces: number;
  readonly groups: number;
  readonly byStitch: Readonly<Record<string, number>>;
  readonly byLength: Readonly<Record<number, number>>;
  readonly byColour: Readonly<Record<string, number>>;
  /** The starting chain that counts as a stitch, and how many chains it is. */
  readonly start: StartChain | null;
  readonly increases: number;
  readonly decreases: number;
}

/**
 * Tells which stitches stand together in one place: neighbours on the same place are a group, and chains between them
 * lie inside it. In a ring the last and the first may share a place.
 */
export function grouped(made: readonly Made[], ring: boolean): Made[] {
  const runs: number[][] = [];
  let run: number[] = [];
  const placeOf = (i: number): number => (made[i]!.kind === 'st' && made[i]!.on.length === 1 ? made[i]!.on[0]! : -1);
  let chains: number[] = [];
  made.forEach((one, i) => {
    if (one.kind === 'chs') {
      chains.push(i);
      return;
    }
    const previous = run.findLast((j) => made[j]!.kind === 'st');
    const isSame = previous !== undefined && placeOf(i) >= 0 && placeOf(i) === placeOf(previous);
    if (isSame) run.push(...chains, i);
    else {
      if (run.length > 0) runs.push(run);
      run = [i];
    }
    chains = [];
  });
  if (run.length > 0) runs.push(run);
  const first = runs[0];
  const last = runs.at(-1);
  if (ring && runs.length > 1 && first && last) {
    const a = placeOf(first[0]!);
    const isShared = a >= 0 && a === placeOf(last.findLast((j) => made[j]!.kind === 'st')!);
    if (isShared) {
      runs.pop();
      runs[0] = [...last, ...chains, ...first];
    }
  }
  const out = [...made];
  runs.forEach((indices, group) => {
    const size = indices.reduce((n, i) => (made[i]!.kind === 'st' ? n + 1 : n), 0);
    let nth = 0;
    for (const i of indices) {
      const one = made[i]!;
      out[i] = one.kind === 'chs' ? { ...one, inside: true } : { ...one, group, nth: (nth += 1), size };
    }
  });
  return out;
}

const TOGETHER = /^([a-z]+?)\d+tog$/;

/** Counts what was made. Stitches drawn together count under their own name. */
export function tallyOf(made: readonly Made[], picots = 0, start: StartChain | null = null): Tally {
  const byStitch: Record<string, number> = {};
  const byLength: Record<number, number> = {};
  const byColour: Record<string, number> = {};
  let sts = 0;
  let chains = 0;
  let chainsOutside = 0;
  let spaces = 0;
  const groups = new Set<number>();
  let decreases = 0;
  for (const one of made) {
    if (one.kind === 'chs') {
      chains += one.chains;
      if (!one.inside) chainsOutside += one.chains;
      spaces += 1;
      byLength[one.chains] = (byLength[one.chains] ?? 0) + 1;
      continue;
    }
    sts += 1;
    const together = TOGETHER.exec(one.stitch);
    if (together) decreases += 1;
    const key = together ? together[1]! : one.stitch;
    byStitch[key] = (byStitch[key] ?? 0) + 1;
    if (one.size > 1) groups.add(one.group);
    if (one.colour) byColour[one.colour] = (byColour[one.colour] ?? 0) + 1;
  }
  if (picots > 0) byStitch.picot = picots;
  const increases = made.filter((one) => one.size === 2 && one.nth === 2).length;
  return {
    sts,
    chains,
    chainsOutside,
    spaces,
    groups: groups.size,
    byStitch,
    byLength,
    byColour,
    start,
    increases,
    decreases,
  };
}

/** `{"sc":28,"ch":8}`, `{"dc":12,"ch-2 sp":4}`: a single long run is chains, others are spaces. */
export function madeOf(tally: Tally): Record<string, number> {
  const isColoured = Object.keys(tally.byColour).length > 0;
  const made: Record<string, number> = { ...(isColoured ? tally.byColour : tally.byStitch) };
  const lengths = Object.entries(tally.byLength);
  for (const [length, n] of lengths) {
    if (Number(length) >= 6 && n <= 2) made.ch = (made.ch ?? 0) + Number(length) * n;
    else made[`ch-${length} sp`] = n;
  }
  return made;
}

/** The walk in short words: `2sc` for two in one place, `[dc,dc,ch,dc,dc]` for unlike ones. */
export function workOf(all: readonly Step[]): string[] {
  // Slip stitches that only fasten or travel are no work of the line.
  const walk = all.filter((step) => step.stitch !== 'slst' || step.makes > 0);
  const words: string[] = [];
  let at = 0;
  while (at < walk.length) {
    const end = groupEnd(walk, at);
    const group = walk.slice(at, end).map((step) => step.stitch);
    if (group.length === 1) words.push(group[0]!);
    else if (group.every((word) => word === group[0])) words.push(`${group.length}${group[0]!}`);
    else words.push(`[${group.join(',')}]`);
    at = end;
  }
  return words;
}

/** Index behind the last stitch that stands on the same place as the one at `at`; chains between go along. */
function groupEnd(walk: readonly Step[], at: number): number {
  const first = walk[at]!;
  if (first.on.length !== 1 || first.stitch === 'sk') return at + 1;
  let end = at + 1;
  for (let i = at + 1; i < walk.length; i += 1) {
    const step = walk[i]!;
    if (step.stitch === 'ch') continue;
    if (step.stitch === 'sk' || step.on.length !== 1 || step.on[0] !== first.on[0]) break;
    end = i + 1;
  }
  return end;
}
