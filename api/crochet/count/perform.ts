import { type Item, type Skip, type Target, type Work } from '../language/tree.ts';
import { stitchOf } from '../stitches.ts';
import { MOST } from './places.ts';
import { isPair } from './readings.ts';
import { legsOf, pick, usesOf, type Job } from './job.ts';
import { isRuleSet, performRules } from './rules.ts';
import { performShaped } from './shaping.ts';
import { goal, fill, stopAt } from './fill.ts';
import { performGroup, performInto } from './perform-group.ts';
import { placesFor, takeOne, isClosing } from './take.ts';
import { make } from './make.ts';
import { workEdge } from './edge.ts';

/** Works the items one after another. `rest`: places that what follows them all will need. */
export function perform(job: Job, items: readonly Item[], rest: number): void {
  if (isRuleSet(items)) {
    performRules(job, items);
    return;
  }
  for (const [i, item] of items.entries()) {
    if (job.walker.full) return;
    job.walker.toil += 1;
    const need = () => rest + usesOf(items.slice(i + 1), job);
    switch (item.type) {
      case 'work':
        if (item.stitch === 'ch') performChain(job, item, items.slice(i + 1), items[i - 1]);
        else performWork(job, item, need);
        break;
      case 'group':
        if (item.into && item.into.what !== 'loop') performInto(job, item, need);
        else performGroup(job, item, need, isEnding(items[i + 1]));
        break;
      case 'skip':
        performSkip(job, item, need);
        break;
      case 'shaped':
        performShaped(job, item, need());
        break;
      case 'straight':
        fill(job, null, stopAt(job, { type: 'fill', leave: [0], leaveOf: null, to: null }, need()), () =>
          make(job, job.stitch, takeOne(job, null, item)),
        );
        break;
      case 'step':
        performStep(job, item);
        break;
    }
  }
}

/** `ending with sc in last st`: the last repeat is cut where these words take over. */
const isEnding = (item: Item | undefined): boolean => item?.type === 'note' && item.text.startsWith('end');

/** `ch 3, sl st in first ch`, over and over within a repeat: the chain closes on itself. */
const FIRST_CHAIN = /^slst in (?:the )?first (?:of )?(?:\d+ ?)?ch\b/;

function performStep(job: Job, item: Extract<Item, { type: 'step' }>): void {
  const { walker } = job;
  if (item.what === 'turn') job.turned = true;
  if (item.what === 'far') job.sideEnd = 0;
  if (item.what === 'leave') {
    const n = item.n === -1 ? walker.remaining() : (item.n ?? 1);
    walker.kept += n;
  }
  if (item.what === 'join' && job.depth > 0 && FIRST_CHAIN.test(item.text)) walker.closePicot();
  else if (item.what === 'join' && item.into === 'unsaid' && hasPlaceForSlip(job))
    make(job, 'slst', takeOne(job, null, item));
  else if (item.what === 'join') {
    // `ch 2, join with dc`: the stitch closes the last space.
    const stitch = /with (?:a )?(hdc|dc|tr|dtr|sc)\b/.exec(item.text)?.[1];
    if (stitch && walker.made.at(-1)?.kind === 'chs') walker.lengthen(stitchOf(stitch)?.height ?? 1);
  }
}

/** Along a row a last slip stitch is worked into the place that is left (`…, hdc, sc, sl st` of a leaf); it joins a round. */
const hasPlaceForSlip = ({ ring, walker }: Job): boolean => !ring && !walker.open && walker.remaining() === 1;

function performChain(job: Job, item: Work, after: readonly Item[], before: Item | undefined): void {
  const n = item.times.type === 'n' ? pick(item.times.n, job.size) : 1;
  const next = after.find((other) => other.type !== 'note');
  if (next?.type === 'work' && next.into?.which === 'hook') {
    job.local = { chains: n, left: 0 };
    return;
  }
  const isEnd = after.every((other) => other.type === 'step' || other.type === 'note');
  const isClosed =
    job.depth === 0 &&
    before !== undefined &&
    (before === job.lastSlip || (before.type === 'step' && before.what === 'join'));
  if (isEnd && (isClosed || after.some((other) => other.type === 'step' && other.what === 'turn') || job.turned)) {
    job.turningChain = n;
    return;
  }
  job.walker.chain(n);
}

function performWork(job: Job, item: Work, need: () => number): void {
  const { walker } = job;
  const target = item.into;
  const row = stitchOf(item.stitch);
  const per = pick(item.per, job.size);
  if (item === job.lastSlip && !hasPlaceForSlip(job)) return;
  if (
    item.stitch === 'picot' ||
    row?.family === 'foundation' ||
    target?.what === 'ring' ||
    (target?.what === 'edge' && target.piece === undefined)
  ) {
    const n = (item.times.type === 'n' ? pick(item.times.n, job.size) : 1) * per;
    for (let i = 0; i < n && !walker.full; i += 1) make(job, item.stitch, []);
    return;
  }
  if (target?.what === 'edge' && target.piece !== undefined) {
    workEdge(job, item, target);
    return;
  }
  const hooked = target?.which === 'hook' && job.local === null;
  if (
    (target?.which === 'hook' && !hooked) ||
    (job.local !== null &&
      job.local.left > 0 &&
      item.times.type === 'n' &&
      !target?.stitch &&
      (target === null || target.what === 'st' || target.what === 'ch') &&
      target?.which !== 'same')
  ) {
    if (workLocal(job, item, per)) return;
  }
  if (target?.which === 'first' && isClosing(job, item)) {
    // `ch 2, dc in first st`: the stitch stands for chains of the last space.
    walker.walk.push({ stitch: item.stitch, on: [], makes: 0, colour: null });
    walker.lengthen(row?.height ?? 1);
    return;
  }
  if (target?.which === 'every') {
    performEvery(job, item, target, per, need());
    return;
  }
  const legs =
    item.stitch === 'dec' && job.choices.dec === 'one' && item.times.type === 'n' && pick(item.times.n, job.size) === 2
      ? 2
      : legsOf(item.stitch) * (target?.through === 'layers' ? 2 : 1);
  const once = (): void => {
    const at = placesFor(job, item, hooked ? null : target, legs);
    // All of a round in one chain is a ring begun without one: its stitches stand each for themselves.
    const on = hooked && walker.places.length === 1 && per > 2 ? [] : at;
    if (item.stitch === 'slst' && target?.what === 'sp') {
      // A slip stitch into a space only fastens what comes next.
      walker.walk.push({ stitch: 'slst', on, makes: 0, colour: null });
      return;
    }
    for (let i = 0; i < per && !walker.full; i += 1) make(job, item.stitch, on, item.colour ?? null);
  };
  if (item.times.type === 'n') {
    let n = pick(item.times.n, job.size);
    if (item.stitch === 'dec' && job.choices.dec === 'one' && n === 2) n = 1;
    if (isPair(item) && job.choices.pair === 'increase') {
      const on = placesFor(job, item, target, legs);
      for (let i = 0; i < n && !walker.full; i += 1) make(job, item.stitch, on);
      return;
    }
    for (let i = 0; i < n && !walker.full; i += 1) once();
    return;
  }
  const times = item.times.type === 'fill' ? item.times : null;
  const each: Target | null = target && target.which !== 'same' ? target : null;
  fill(job, each, stopAt(job, times, need()), once, legs);
  if (times?.to) walker.pointed = goal(job, times.to);
}

/** Into a chain made within the line, or into the foundation. */
function workLocal(job: Job, item: Work, per: number): boolean {
  const { walker } = job;
  const n = item.times.type === 'n' ? pick(item.times.n, job.size) : 1;
  if (item.into?.which === 'hook') {
    if (!job.local) return false;
    if (item.stitch === 'slst' && per * n === 1) {
      // A picot: the chain closes on itself.
      walker.walk.push({ stitch: 'picot', on: [], makes: 0, colour: null });
      job.local = null;
      return true;
    }
    const skipped = (item.into.n ?? 2) - 1;
    job.local.left = job.local.chains - skipped;
    // The chains passed over stand beside the block as a space.
    if (skipped >= 3) walker.chain(skipped);
  }
  const { local } = job;
  if (!local || local.left < n) return false;
  local.left -= n;
  for (let i = 0; i < n * per && !walker.full; i += 1) make(job, item.stitch, []);
  return true;
}

/** `inc in every 6th st`: the others plain; `dc in every other st`: the others passed over. */
function performEvery(job: Job, item: Work, target: Target, per: number, rest: number): void {
  const { walker } = job;
  const n = target.n ?? 2;
  const stop = stopAt(job, null, rest);
  if (target.what === 'row-end') {
    fill(job, null, stop, () => {
      const on: number[] = [];
      for (let i = 0; i < Math.min(n, MOST) && walker.short === 0; i += 1) on.push(...takeOne(job, null, item));
      for (let i = 0; i < per && !walker.full; i += 1) make(job, item.stitch, on.slice(i, i + 1));
    });
    return;
  }
  const isIncrease = per > 1 || item.stitch === 'inc';
  while (walker.at < stop && walker.short === 0 && !walker.open) {
    const whole = walker.remaining(stop) >= n;
    for (let i = 1; i < n && walker.remaining(stop) > 0; i += 1) {
      const on = takeOne(job, null, item);
      if (isIncrease) make(job, job.stitch, on);
      else walker.skip(on[0] ?? -1);
    }
    if (!whole) break;
    const on = takeOne(job, null, item);
    for (let i = 0; i < per && !walker.full; i += 1) make(job, item.stitch, on);
  }
  if (walker.open) job.endless = true;
}

function performSkip(job: Job, item: Skip, need: () => number): void {
  const { walker } = job;
  if (item.of?.which === 'every') {
    const n = item.of.n ?? 2;
    fill(job, null, stopAt(job, null, need()), () => {
      for (let i = 1; i < n && walker.remaining() > 0; i += 1) make(job, job.stitch, takeOne(job, null, item));
      if (walker.remaining() > 0) walker.skip(walker.take(null, item.span));
    });
    return;
  }
  const isSpace = item.of?.what === 'sp' || item.of?.what === 'gap';
  // Where only spaces are worked into, stitches are passed over unsaid anyway.
  if (!isSpace && !job.named.st && !job.named.ch) return;
  if (item.of?.which === 'first' && walker.at === 1 && walker.walk.length > 0) return;
  const n = pick(item.n, job.size);
  walker.skipped = [];
  const { last } = walker;
  for (let i = 0; i < n && !walker.full; i += 1) {
    const at = walker.take(isSpace ? item.of : null, item.span);
    if (at >= 0) walker.skipped.push(at);
    walker.skip(at);
  }
  walker.last = last;
}
