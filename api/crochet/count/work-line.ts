import { type Span } from '../span.ts';
import { type Item, type LineTree, type Target } from '../language/tree.ts';
import { chainBase, foundationOf, ownChain, ownRing, type FreeLoops } from './base.ts';
import { allItems, isAlongRows, takesBack, targetsIn } from './tree-walk.ts';
import { aimsIn, namedIn, travelling } from './named.ts';
import { type Job } from './job.ts';
import { type CountedWith } from './compare.ts';
import { perform } from './perform.ts';
import { groundOf, groundTurned, OPEN_GROUND } from './ground.ts';
import { NOTHING, placesIn, plainLeft, type Left, type Named } from './places.ts';
import { shaped, type Choices } from './readings.ts';
import { type ChainPolicy } from './start.ts';
import { grouped, tallyOf, type Tally } from './tally.ts';
import { Walker, type Step } from './walker.ts';
import { closingSlip, sideEndOf, travelled, marksOf, firstPlain } from './line-signs.ts';
import { begin, opened } from './begin.ts';
import { joinedPlaces } from './edge.ts';
import { isRoundOpening, openingLeft, type Finished } from './finished.ts';

/** What a line needs to know of the piece it stands in. */
export interface Setting {
  readonly left: Left;
  readonly ring: boolean;
  readonly size: number;
  readonly policy: ChainPolicy;
  readonly own: ReadonlyMap<string, readonly Item[]>;
  /** What a bare `inc` is made of where the line names no stitch. */
  readonly stitch: string;
  readonly free: FreeLoops;
  /** Pieces worked earlier, in their order. */
  readonly finished: readonly Finished[];
  /** Rows of the piece so far, for work along its side. */
  readonly rows: number;
  /** A later line goes over what a short row leaves. */
  readonly comesBack: boolean;
  readonly label: number | null;
  /** Counted in blocks: the chains passed over at a start are a space of the block, no stitch. */
  readonly blocks: boolean;
  /** The sense of plain totals in this piece; null while it is open. */
  readonly sense: CountedWith | null;
}

/** A line worked once, under one choice of what its words leave open. */
export interface LineWork {
  readonly fits: boolean;
  readonly base: number | null;
  readonly uses: number | null;
  readonly short: number;
  readonly over: number;
  readonly fault: Span | null;
  readonly tally: Tally;
  readonly walk: readonly Step[];
  readonly left: Left;
  /** The base was not known and the line goes on until it runs out. */
  readonly endless: boolean;
  /** Whether a starting chain counts was settled by nothing. */
  readonly chainUnsaid: boolean;
  readonly isFoundation: boolean;
  /** More stitches than a line can have: not worked to its end. */
  readonly full: boolean;
}

/** Works a line on what the line before left. Pure; linear in the stitches made. */
export function workLine(tree: LineTree, choices: Choices, setting: Setting): LineWork {
  const foundation = foundationOf(tree.items, setting.size);
  if (foundation) return foundationWork(foundation);
  const items = opened(shaped(tree, choices));
  const loop = items.find((item) => item.type === 'group' && item.into?.what === 'loop');
  if (loop?.type === 'group')
    return onPlaces(loop.items, choices, { ...setting, left: loopBase(loop.into!, setting) }, 0, null);
  const own = ownChain(items, setting.size);
  const ring = ownRing(items, setting.size);
  if (ring) {
    const base = chainBase(ring.chains, items.slice(ring.index + 1), true);
    return onPlaces(items.slice(ring.index + 1), choices, { ...setting, left: base.left }, 0, base.told, true);
  }
  const { left } = setting;
  const isOnChain = left.chains > 0 && left.made.length === 0;
  if (own && (left === NOTHING || left.open || isOnChain)) {
    const base = chainBase(own.chains, items, false);
    return onPlaces(items.slice(own.index + 1), choices, { ...setting, left: base.left }, base.hook, base.told);
  }
  if (isOnChain) {
    const base = chainBase(left.chains, items, left.shape === 'ring');
    return onPlaces(
      items,
      choices,
      { ...setting, left: { ...base.left, turningChain: left.turningChain } },
      base.hook,
      base.told,
      true,
    );
  }
  const rows = setting.rows > 0 ? setting.rows : left.open ? (setting.finished.at(-1)?.rows ?? 0) : 0;
  if (rows > 0 && isAlongRows(items)) return onPlaces(items, choices, { ...setting, left: plainLeft(rows) }, 0, null);
  if (rows > 0 && targetsIn(items).some((target) => target.rows)) return onPlaces(items, choices, setting, 0, rows);
  const opening = left.open && isRoundOpening(items) ? setting.finished.findLast((piece) => piece.opening) : undefined;
  if (opening?.opening)
    return onPlaces(items, choices, { ...setting, left: openingLeft(opening.opening), ring: true }, 0, null);
  return onPlaces(items, choices, setting, 0, null);
}

function foundationWork(left: Left): LineWork {
  const walk = Array.from({ length: placesIn(left.chains) }, (): Step => ({
    stitch: 'ch',
    on: [],
    makes: 0,
    colour: null,
  }));
  const tally = { ...tallyOf([]), sts: left.chains };
  return {
    fits: true,
    base: null,
    uses: null,
    short: 0,
    over: 0,
    fault: null,
    tally,
    walk,
    left: { ...left, count: left.chains },
    endless: false,
    chainUnsaid: false,
    isFoundation: true,
    full: false,
  };
}

/**
 * Loops left free: of the line named, else of the last that left any; in this piece, else in one worked earlier. The
 * loops of a line's own stitches (`back loops of rnd 7`) are left free by the line after it.
 */
function loopBase({ line, own }: Target, setting: Setting): Left {
  const maps = [setting.free, ...setting.finished.toReversed().map((piece) => piece.free)];
  for (const free of maps) {
    const found =
      line === undefined
        ? [...free.values()].at(-1)
        : own
          ? (free.get(line + 1) ?? free.get(line))
          : (free.get(line) ?? free.get(line + 1));
    if (found) return plainLeft(found.n[setting.size] ?? found.n[0]!);
  }
  return NOTHING;
}

function onPlaces(
  items: readonly Item[],
  choices: Choices,
  setting: Setting,
  hook: number,
  told: number | null,
  onChain = hook > 0,
): LineWork {
  const { left } = setting;
  const first = namedIn(items);
  const wide = onChain ? { ...first, st: true } : first;
  const named: Named = choices.chains === 'places' && wide.sps.length === 0 && wide.st ? { ...wide, ch: true } : wide;
  const base =
    takesBack(items) && left.unworked > 0 ? { ...left, made: [...left.made, ...plainLeft(left.unworked).made] } : left;
  const isOpen =
    left.open ||
    (hook === 0 &&
      allItems(items).some(
        (item) =>
          (item.type === 'work' || item.type === 'group') && (item.into?.what === 'ring' || item.into?.what === 'edge'),
      ));
  let ground = isOpen ? OPEN_GROUND : groundOf(base, named);
  const travels = hook > 0 ? 0 : travelling(items);
  let pointed = -1;
  let at = 0;
  if (travels > 0 && !isOpen) {
    const standing = travelled(ground, items.slice(0, travels), setting.size);
    if (standing >= 0 && setting.ring) ground = groundTurned(ground, standing);
    else at = standing;
    pointed = standing < 0 ? -1 : setting.ring ? 0 : standing;
  }
  const walker = new Walker(ground);
  if (pointed >= 0) {
    // In a row the hook stands on the last slip stitch; in a ring the place reached is where the round begins.
    walker.at = setting.ring ? 0 : at + 1;
    if (setting.ring) walker.pointed = pointed;
    else walker.last = at;
  }
  const body = items.slice(travels);
  const job: Job = {
    walker,
    choices,
    size: setting.size,
    stitch: firstPlain(items) ?? setting.stitch,
    named,
    own: setting.own,
    ring: setting.ring,
    sideEnd: sideEndOf(items, ground.places.length, hook),
    local: null,
    marks: marksOf(items, ground.places, setting.size),
    endless: false,
    turned: false,
    finished: setting.finished,
    edges: new Map(),
    depth: 0,
    turningChain: 0,
    lastSlip: closingSlip(body),
  };
  const begun = begin(job, body, setting, hook, isOpen);
  perform(job, begun.items, 0);
  return finish(job, aimsIn(begun.items), setting, told, begun.unsaid, isOpen);
}

function finish(
  job: Job,
  aims: readonly (Target | null)[],
  setting: Setting,
  told: number | null,
  chainUnsaid: boolean,
  isOpen: boolean,
): LineWork {
  const { walker } = job;
  const kept = walker.kept;
  const remaining = isOpen ? 0 : Math.max(0, walker.left(aims) - kept);
  const isShortRow = remaining > 0 && job.turned && setting.comesBack;
  const over = isShortRow ? 0 : remaining;
  const carried =
    aims.some((aim) => aim?.which === 'skipped') && walker.skipped.length === 0 ? 0 : setting.left.unworked;
  const made = grouped(walker.made, setting.ring);
  const tally = tallyOf(made, walker.walk.filter((step) => step.stitch === 'picot').length, walker.start);
  const turns = job.turned || !setting.ring;
  const counted = walker.counted.at(-1) ?? 0;
  const isBaseKnown = !isOpen;
  const joined = told ?? joinedPlaces(job);
  const passed = remaining === 0 ? walker.remaining() : Math.min(kept, walker.remaining());
  const uses = isBaseKnown ? walker.uses + passed : joined === null ? null : joined + walker.short;
  return {
    fits: walker.short === 0 && over === 0 && !walker.full,
    base: isBaseKnown ? counted : joined,
    uses,
    short: walker.short,
    over,
    fault: walker.fault,
    tally,
    walk: walker.walk,
    left: {
      made: turns ? made.toReversed() : made,
      shape: setting.ring ? 'ring' : 'row',
      chains: 0,
      unworked: carried + (isShortRow ? remaining : 0) + (setting.ring ? 0 : walker.kept),
      turningChain: job.turningChain,
      count: tally.sts,
      open: false,
    },
    endless: job.endless,
    chainUnsaid,
    isFoundation: false,
    full: walker.full,
  };
}
