import { type LineTree, type ReadLine, type Totals } from '../language/tree.ts';
import { asksOf } from './asks.ts';
import { compareTotals, type CountedWith } from './compare.ts';
import { MOST, plainLeft } from './places.ts';
import { mixtures, usualFor, type Choices } from './readings.ts';
import { type Ask, type Verdict } from './result.ts';
import { workLine, type LineWork, type Setting } from './work-line.ts';

/** Totals given for a line: written (in the text or beside it) and spoken. */
export interface Given {
  readonly written: Totals | null;
  readonly said: Totals | null;
}

/** A line worked and judged, for one size and one round. */
export interface Judged {
  readonly work: LineWork;
  readonly choices: Choices;
  readonly verdict: Verdict;
  readonly ways: readonly CountedWith[];
  readonly odd: readonly ('said' | 'written' | 'worked')[];
  readonly asks: readonly Ask[];
  /** The plain total in force for this size and round; null where none was given. */
  readonly total: number | null;
  /** The text did not tell a base, and the total was taken for it. */
  readonly inferred: boolean;
}

/**
 * Works a line under every reading its words leave open and takes the usual one, unless only another fits the places
 * and the totals.
 *
 * @param index which figure of a total counts: the size, or the round of a range that lists one each.
 */
export function judgeLine(read: ReadLine, given: Given, setting: Setting, index: number): Judged {
  const usual = usualFor(read.tree);
  const most = given.written || given.said ? 3 : 2;
  let best: Judged | null = null;
  let bestScore = -1;
  for (const choices of mixtures(read.tree, usual)) {
    const judged = tryReading(read.tree, choices, given, setting, index);
    const score = scoreOf(judged);
    if (score > bestScore && isAllowed(choices, usual, judged, given, read.tree)) {
      best = judged;
      bestScore = score;
    }
    if ((score === most && best === judged) || judged.work.full) break;
  }
  const attempt = (choices: Choices) => tryReading(read.tree, choices, given, setting, index);
  return best!.work.full ? best! : { ...best!, asks: asksOf(read.tree, best!, usual, attempt) };
}

function scoreOf(judged: Judged): number {
  if (judged.verdict === 'agrees') return 3;
  if (judged.verdict === 'no-total') return 2;
  return judged.work.fits ? 1 : 0;
}

/** Readings that only a total can settle are not taken on the places alone. */
function isAllowed(choices: Choices, usual: Choices, judged: Judged, given: Given, tree: LineTree): boolean {
  if (choices === usual) return true;
  const settled = judged.verdict === 'agrees';
  const hasTotal = given.written !== null || given.said !== null;
  if (choices.whole !== usual.whole) return settled || (!hasTotal && judged.work.fits && isRepeatedOften(judged));
  if (choices.cut !== usual.cut) return settled && hasOpening(tree);
  if (choices.chains !== usual.chains || choices.dec !== usual.dec) return settled;
  if (choices.pair !== usual.pair) return settled || given.written === null;
  return true;
}

/** A few stitches, over and over: nobody writes `2 sc, inc` under eighteen stitches and means it once. */
const isRepeatedOften = (judged: Judged): boolean => judged.work.walk.length >= 6;

/** Something is worked before the repeat, so that it may stop in the middle to meet it. */
function hasOpening(tree: LineTree): boolean {
  const works = tree.items.filter((item) => item.type === 'work' || item.type === 'group' || item.type === 'skip');
  return works[0]?.type === 'work' && works.length > 1;
}

function tryReading(tree: LineTree, choices: Choices, given: Given, setting: Setting, index: number): Judged {
  const work = workLine(tree, choices, setting);
  if (work.endless) {
    const inferred = inferBase(tree, choices, given, setting, index);
    if (inferred) return inferred;
  }
  return {
    ...verdictOf(work, given, index, setting.sense),
    work,
    choices,
    asks: [],
    total: totalOf(given, index),
    inferred: false,
  };
}

function totalOf(given: Given, index: number): number | null {
  const figures = (given.written ?? given.said)?.sts;
  return figures?.[index] ?? figures?.[0] ?? null;
}

/** Places that one repeat may take, as far as a base not known is looked for. */
const WIDEST = 40;
/** Stitches worked in trying bases, about: large totals are looked for more narrowly. */
const MOST_TRIED = 10_000;

/** Where the base is not known, the one base that gives the total. */
function inferBase(tree: LineTree, choices: Choices, given: Given, setting: Setting, index: number): Judged | null {
  const total = totalOf(given, index);
  if (total === null || total > MOST) return null;
  const on = (n: number) => workLine(tree, choices, { ...setting, left: plainLeft(n) });
  // The more places, the more stitches: near the one base on which so many are made, each is tried.
  let [low, high] = [0, total * 2];
  while (low < high) {
    const middle = Math.floor((low + high) / 2);
    if (on(middle).tally.sts < total) low = middle + 1;
    else high = middle;
  }
  const wide = Math.min(WIDEST, Math.ceil(MOST_TRIED / Math.max(1, total)));
  for (let n = Math.max(1, low - wide); n <= low + wide; n += 1) {
    const work = on(n);
    if (!work.fits || work.tally.sts !== total) continue;
    return {
      ...verdictOf(work, given, index, setting.sense),
      work: { ...work, base: null, uses: null },
      choices,
      asks: [],
      total,
      inferred: true,
    };
  }
  return null;
}

function verdictOf(
  work: LineWork,
  given: Given,
  index: number,
  sense: CountedWith | null,
): Pick<Judged, 'verdict' | 'ways' | 'odd'> {
  const written = given.written ? compareTotals(given.written, work.tally, index, sense) : null;
  const said = given.said ? compareTotals(given.said, work.tally, index, sense) : null;
  const ways = sharedWays(written?.ways ?? [], said?.ways ?? []);
  const isWritten = written?.comparable ? written.equal : null;
  const isSaid = said?.comparable ? said.equal : null;
  if (!work.fits) return { verdict: 'does-not-fit', ways: ways ?? [], odd: ['worked'] };
  if (isWritten === null && isSaid === null) return { verdict: 'no-total', ways: [], odd: [] };
  if (isWritten !== false && isSaid !== false)
    return ways ? { verdict: 'agrees', ways, odd: [] } : { verdict: 'differs', ways: [], odd: ['said', 'written'] };
  return { verdict: 'differs', ways: ways ?? [], odd: oddOf(isWritten, isSaid, given) };
}

/** Null where each of two plain totals comes out, but not in one sense: 36 with the chains and 28 without. */
function sharedWays(written: readonly CountedWith[], said: readonly CountedWith[]): readonly CountedWith[] | null {
  if (written.length === 0 || said.length === 0) return written.length > 0 ? written : said;
  const shared = written.filter((way) => said.includes(way));
  return shared.length > 0 ? shared : null;
}

/** The total unlike the other two; where only two are given, or all three are unlike, all of them. */
function oddOf(written: boolean | null, said: boolean | null, given: Given): ('said' | 'written' | 'worked')[] {
  if (written === null) return ['said', 'worked'];
  if (said === null) return ['written', 'worked'];
  if (written !== said) return written ? ['said'] : ['written'];
  const isSame = JSON.stringify(given.written) === JSON.stringify(given.said);
  return isSame ? ['worked'] : ['said', 'written', 'worked'];
}
