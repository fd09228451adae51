import { type Span } from '../span.ts';
import { type Target } from '../language/tree.ts';
import { type Ground } from './ground.ts';
import { isAt, MOST, type Made, type Place, type Spaces } from './places.ts';
import { type Stitch } from './result.ts';
import { type StartChain } from './tally.ts';

/** One entry of the walk with what the tally needs beside. */
export interface Step extends Stitch {
  readonly colour: string | null;
}

/** A mark to come back to: work after it is undone by cutting the lists back. */
export interface Bookmark {
  readonly at: number;
  readonly last: number;
  readonly pointed: number;
  readonly short: number;
  readonly walk: number;
  readonly made: number;
  readonly skipped: readonly number[];
  readonly fault: Span | null;
}

/** Hands on the work: a cursor along the places, and what has been made so far. */
export class Walker {
  readonly places: readonly Place[];
  /** The number of places is not known: they never run out. */
  readonly open: boolean;
  readonly walk: Step[] = [];
  readonly made: Made[] = [];
  /** Index of the next place. */
  at = 0;
  /** Place worked into last, or -1. */
  last = -1;
  /** A place named and not yet worked into (`to marked st`), or -1. */
  pointed = -1;
  /** Places asked for that there were not. */
  short = 0;
  skipped: number[] = [];
  fault: Span | null = null;
  /** Places kept back on purpose at the end. */
  kept = 0;
  /** Words of the line followed so far, over and over in a repeat. */
  toil = 0;
  /** The starting chain that counts as a stitch. */
  start: StartChain | null = null;
  readonly counted: readonly number[];
  readonly spaces: Spaces;

  constructor({ places, counted, spaces, open }: Ground) {
    this.places = places;
    this.open = open;
    this.counted = counted;
    this.spaces = spaces;
  }

  mark(): Bookmark {
    const { at, last, pointed, short, fault } = this;
    return {
      at,
      last,
      pointed,
      short,
      fault,
      walk: this.walk.length,
      made: this.made.length,
      skipped: [...this.skipped],
    };
  }

  back(mark: Bookmark): void {
    this.at = mark.at;
    this.last = mark.last;
    this.pointed = mark.pointed;
    this.short = mark.short;
    this.fault = mark.fault;
    this.walk.length = mark.walk;
    this.made.length = mark.made;
    this.skipped = [...mark.skipped];
  }

  /** Counted places from the cursor to an index (the end where none is given). */
  remaining(until = this.places.length): number {
    if (this.open) return Number.POSITIVE_INFINITY;
    return Math.max(0, this.counted[until]! - this.counted[Math.min(this.at, until)]!);
  }

  /** Places used or passed over so far. */
  get uses(): number {
    return this.counted[Math.min(this.at, this.places.length)]! + this.short;
  }

  /** Index of the next place that the target names, or -1. */
  find(target: Target | null): number {
    for (let i = this.at; i < this.places.length; i += 1) {
      if (isAt(this.places[i]!, target, this.spaces)) return i;
    }
    return -1;
  }

  /** Takes the next place that the target names; -1 where there is none, which is noted as short. */
  take(target: Target | null, span: Span): number {
    if (this.open) {
      this.last = this.at;
      this.at += 1;
      this.pointed = -1;
      return this.last;
    }
    const at = this.pointed >= this.at ? this.pointed : this.find(target);
    this.pointed = -1;
    if (at < 0) {
      // All that is left is passed over in vain.
      this.at = this.places.length;
      this.short += 1;
      this.fault ??= span;
      this.last = -1;
      return -1;
    }
    this.at = at + 1;
    this.last = at;
    return at;
  }

  /** More than any line has: a hostile figure, not worked further. */
  get full(): boolean {
    return this.walk.length > MOST || this.toil > MOST * 6;
  }

  /** A stitch made on these places. */
  stitch(key: string, on: readonly number[], colour: string | null = null): void {
    this.walk.push({ stitch: key, on, makes: 1, colour });
    this.made.push({ kind: 'st', stitch: key, chains: 0, on, group: -1, nth: 1, size: 1, inside: false, colour });
  }

  chain(n: number): void {
    if (n <= 0) return;
    for (let i = 0; i < n && !this.full; i += 1) this.walk.push({ stitch: 'ch', on: [], makes: 0, colour: null });
    const previous = this.made.at(-1);
    if (previous?.kind === 'chs') this.made[this.made.length - 1] = { ...previous, chains: previous.chains + n };
    else
      this.made.push({
        kind: 'chs',
        stitch: 'ch',
        chains: n,
        on: [],
        group: -1,
        nth: 1,
        size: 1,
        inside: false,
        colour: null,
      });
  }

  /** The last run of chains grows by a stitch that stands for so many. */
  lengthen(n: number): void {
    const last = this.made.at(-1);
    if (last?.kind === 'chs') this.made[this.made.length - 1] = { ...last, chains: last.chains + n };
  }

  /** The run of chains made last becomes a picot: an edge that makes no stitch and no space. */
  closePicot(): void {
    if (this.made.at(-1)?.kind !== 'chs') return;
    this.made.pop();
    while (this.walk.at(-1)?.stitch === 'ch') this.walk.pop();
    this.walk.push({ stitch: 'picot', on: [], makes: 0, colour: null });
  }

  /** Counted places behind the cursor that any of these could still go into. */
  left(aims: readonly (Target | null)[]): number {
    if (this.open) return 0;
    let left = 0;
    for (let i = this.at; i < this.places.length; i += 1) {
      const place = this.places[i]!;
      if (place.counted && aims.some((aim) => isAt(place, aim, this.spaces))) left += 1;
    }
    return left;
  }

  skip(at: number): void {
    this.walk.push({ stitch: 'sk', on: at < 0 ? [] : [at], makes: 0, colour: null });
  }
}
