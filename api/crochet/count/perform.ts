import { type Group, type Item, type Skip, type Target, type Times, type Work } from '../language/tree.ts';
import { stitchOf } from '../stitches.ts';
import { isPair } from './readings.ts';
import { legsOf, pick, usesOf, type Job } from './job.ts';
import { isAt } from './places.ts';
import { isRuleSet, performRules } from './rules.ts';
import { performShaped } from './shaping.ts';

/** Works the items one after another. `rest`: places that what follows them all will need. */
export function perform(job: Job, items: readonly Item[], rest: number): void {
  if (isRuleSet(items)) {
    performRules(job, items);
    return;
  }
  items.forEach((item, i) => {
    const after = items.slice(i + 1);
    const need = () => rest + usesOf(after, job);
    switch (item.type) {
      case 'work':
        if (item.stitch === 'ch') performChain(job, item, after);
        else performWork(job, item, need);
        break;
      case 'group':
        if (item.into && item.into.what !== 'loop') performInto(job, item, need);
        else performGroup(job, item, need, isEnding(after[0]));
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
  });
}

/** `ending with sc in last st`: the last repeat is cut where these words take over. */
const isEnding = (item: Item | undefined): boolean => item?.type === 'note' && item.text.startsWith("end");

function performStep(job: Job, item: Extract<Item, { type: 'step' }>): void {
  const { walker } = job;
  if (item.what === 'turn') job.turned = true;
  if (item.what === 'far') job.sideEnd = 0;
  if (item.what === 'leave') {
    const n = item.n === -1 ? walker.remaining() : (item.n ?? 1);
    walker.kept += n;
  }
  if (item.what === 'join') {
    // `ch 2, join with dc`: the stitch closes the last space.
    const stitch = /with (?:a )?(hdc|dc|tr|dtr|sc)\b/.exec(item.text)?.[1];
    if (stitch && walker.made.at(-1)?.kind === 'chs') walker.lengthen(stitchOf(stitch)?.height ?? 1);
  }
}

function performChain(job: Job, item: Work, after: readonly Item[]): void {
  const n = item.times.type === 'n' ? pick(item.times.n, job.size) : 1;
  const next = after.find((other) => other.type !== 'note');
  if (next?.type === 'work' && next.into?.which === 'hook') {
    job.local = { chains: n, left: 0 };
    return;
  }
  const isEnd = after.every((other) => other.type === 'step' || other.type === 'note');
  if (isEnd && (after.some((other) => other.type === 'step' && other.what === 'turn') || job.turned)) {
    job.turningChain = n;
    return;
  }
  job.walker.chain(n);
}

/** Takes the places of one stitch: several for a stitch drawn together. */
export function takeOne(job: Job, target: Target | null, item: { readonly span: Item['span'] }, legs = 1): number[] {
  const on: number[] = [];
  for (let leg = 0; leg < legs; leg += 1) {
    const at = job.walker.take(leg === 0 ? target : target?.what === 'sp' ? target : null, item.span);
    if (at >= 0) on.push(at);
  }
  return on;
}

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
function performOn(job: Job, items: readonly Item[], on: readonly number[]): void {
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

function performWork(job: Job, item: Work, need: () => number): void {
  const { walker } = job;
  const target = item.into;
  const row = stitchOf(item.stitch);
  const per = pick(item.per, job.size);
  if (item === job.lastSlip) return;
  if (item.stitch === 'picot' || row?.family === 'foundation' || target?.what === 'ring' || target?.what === 'edge') {
    const n = (item.times.type === 'n' ? pick(item.times.n, job.size) : 1) * per;
    for (let i = 0; i < n && !walker.full; i += 1) make(job, item.stitch, []);
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
    const on = placesFor(job, item, hooked ? null : target, legs);
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

/** A stitch into the first one at the end of a round, behind a chain. */
const isClosing = (job: Job, item: Work): boolean =>
  job.ring &&
  job.walker.at > 1 &&
  job.walker.made.at(-1)?.kind === 'chs' &&
  item.times.type === 'n' &&
  item.times.n[0] === 1;

/** Where one stitch goes: the next place, or a place named. */
function placesFor(job: Job, item: Work | Group, target: Target | null, legs: number): number[] {
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

function takeNth(job: Job, item: { readonly span: Item['span'] }, target: Target): number[] {
  const { walker } = job;
  if (target.of !== undefined || target.which === 'centre') return takeOne(job, target, item);
  // `in 2nd st` at the start is told from the edge, later from where the hook is.
  const ahead = (target.n ?? 1) - 1 - (walker.at <= 1 ? walker.at : 0);
  for (let i = 0; i < ahead; i += 1) walker.take({ ...target, which: 'next' }, item.span);
  return takeOne(job, { ...target, which: 'next' }, item);
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
  for (let i = 0; i < n * per; i += 1) make(job, item.stitch, []);
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
      for (let i = 0; i < n && !walker.full; i += 1) on.push(...takeOne(job, null, item));
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

/** A group all in one place, as often as its words say. */
function performInto(job: Job, item: Group, need: () => number): void {
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
  const n = countOf(job, item);
  for (let i = 0; i < n && !job.walker.full; i += 1) once();
}

const countOf = (job: Job, item: Group): number =>
  item.times.type === 'n'
    ? pick(item.times.n, job.size)
    : item.times.type === 'rep'
      ? pick(item.times.n, job.size) + (job.choices.rep === 'more' ? 1 : 0)
      : 1;

function performGroup(job: Job, item: Group, need: () => number, ending: boolean): void {
  const part = item.stop === null ? null : item.items.slice(0, item.stop);
  const { walker } = job;
  const isFill = item.times.type === 'fill' || (item.times.type === 'unsaid' && job.choices.unsaid === 'fill');
  if (!isFill) {
    const n = countOf(job, item);
    const unit = usesOf(item.items, job);
    for (let i = 0; i < n && !walker.full; i += 1) {
      const isLast = i === n - 1;
      perform(job, isLast && part ? part : item.items, isLast ? need() : need() + unit * (n - 1 - i));
    }
    return;
  }
  fillGroup(job, item, part, need(), ending);
}

function fillGroup(job: Job, item: Group, part: readonly Item[] | null, rest: number, ending: boolean): void {
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
function cutShort(job: Job, items: readonly Item[], stop: number): void {
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

function goal(job: Job, to: Target): number {
  if (to.what === 'mark') return job.marks.find((at) => at >= job.walker.at) ?? -1;
  return job.walker.find({ ...to, which: 'next' });
}

/** Where the places end: at the turn to the far side of a chain, else at the last. */
const endOf = (job: Job): number => (job.sideEnd > 0 ? job.sideEnd : job.walker.places.length);

/** Index before which a fill stops: the end less what is kept back, or a place named. */
function stopAt(job: Job, times: Extract<Times, { type: 'fill' }> | null, rest: number): number {
  const { walker } = job;
  const end = endOf(job);
  if (walker.open) return end;
  if (times?.to) {
    const at = goal(job, times.to);
    return at < 0 ? end : at;
  }
  const kept = times ? pick(times.leave, job.size) : 0;
  const { leaveOf } = times ?? { leaveOf: null };
  if (kept > 0 && leaveOf?.what === 'group') {
    // `to last shell`: to where it begins.
    let left = kept;
    for (let at = end - 1; at >= 0; at -= 1) {
      const place = walker.places[at]!;
      if (place.nth === 1 && place.size > 1 && place.size * 3 > walker.spaces.largest * 2) left -= 1;
      if (left === 0) return at;
    }
    return 0;
  }
  if (kept > 0 && leaveOf && (leaveOf.what === 'sp' || leaveOf.what === 'gap' || leaveOf.stitch !== undefined)) {
    let left = kept;
    for (let at = end - 1; at >= 0; at -= 1) {
      if (isAt(walker.places[at]!, leaveOf, walker.spaces)) left -= 1;
      if (left === 0) return at;
    }
    return 0;
  }
  return indexLeaving(job, kept > 0 ? kept : job.sideEnd > 0 ? 0 : rest, end);
}

/** The index from which exactly so many counted places remain. */
function indexLeaving(job: Job, n: number, end: number): number {
  const { walker } = job;
  let left = n;
  let at = end;
  while (left > 0 && at > 0) {
    at -= 1;
    if (walker.places[at]!.counted) left -= 1;
  }
  return at;
}

/** Does `once` until the places of this kind before `stop` run out. */
function fill(job: Job, target: Target | null, stop: number, once: () => void, legs = 1): void {
  const { walker } = job;
  if (walker.open) {
    once();
    job.endless = true;
    return;
  }
  for (;;) {
    const next =
      walker.pointed >= walker.at
        ? walker.pointed
        : target
          ? walker.find(target.which === 'each' || target.which === 'next' ? target : { ...target, which: 'next' })
          : walker.find(null);
    if (next < 0 || next >= stop) return;
    if (legs > 1 && walker.remaining(stop) < legs) return;
    const before = walker.at;
    once();
    if (walker.at <= before) return;
  }
}
