import { type Announced } from './announce/chain.ts';
import { readNumberList } from './announce/number-list.ts';
import { type ReadSoFar } from './bases.ts';
import { cornerBefore, edgeBefore } from './corner-before.ts';
import { basesFor } from './places-before.ts';
import { chooseWork, type Setting } from './instruct/choose-work.ts';
import { type Choice } from './instruct/judge-work.ts';
import { type Event } from './instruct/event.ts';
import { leadingTotal } from './instruct/leading-total.ts';
import { findEvents } from './instruct/find-events.ts';
import { lettersOf } from './instruct/letters.ts';
import { prune } from './instruct/prune.ts';
import { type Base } from './instruct/resolve.ts';
import { isInvisible, loopsOf } from './loops.ts';
import { copiesFor, linesNamed } from './references.ts';
import { type Sentences } from './sentences.ts';
import { type Token } from './tokens.ts';
import { findVague, type TokenSpan } from './vague.ts';
import { type Unit } from './work/units.ts';

/** The whole talk, with what is known of it before lines are read. */
export interface Talk {
  readonly tokens: readonly Token[];
  readonly sentences: Sentences;
  readonly skipped: readonly boolean[];
}

/** A line to read: its announcement and the tokens up to what comes next. */
export interface Stretch {
  readonly announced: Announced;
  readonly from: number;
  readonly to: number;
}

/** What stands before a line: the lines of its piece, of all pieces, and how the piece goes. */
export interface Before {
  readonly piece: readonly ReadSoFar[];
  readonly all: readonly (readonly ReadSoFar[])[];
  readonly chains: number | null;
  /** Where the piece's introduction begins, in which it may be told what the piece grows on. */
  readonly introFrom: number;
  readonly stitch: string;
  readonly chainCounts: boolean | null;
  readonly chainJoined: boolean;
  /** Whether the piece goes to and fro. */
  readonly isRows: boolean;
}

export interface ReadLineResult extends ReadSoFar {
  readonly count: number | null;
  readonly isRing: boolean;
  readonly isInvisible: boolean;
  /** Words that leave it open how the work goes on. */
  readonly vague: TokenSpan | null;
  readonly lead: number;
  readonly score: number;
  readonly cost: number;
  /** All phrases heard, and those that the work was taken from. */
  readonly events: readonly Event[];
  readonly used: readonly Event[];
}

/** Reads one announced line: its phrases, the places before it, and of all ways to take them the one that fits best. */
export function readSpokenLine(talk: Talk, stretch: Stretch, before: Before): ReadLineResult {
  const { tokens } = talk;
  const { announced, from, to } = stretch;
  const { candidate } = announced;
  const names = namesOfLines(tokens, stretch);
  const start = tokens.slice(from, candidate.mark).some((token) => 'SPDFE'.includes(token.kind))
    ? from
    : candidate.mark;
  const isOut = (i: number) =>
    i < start || talk.skipped[i] === true || names.has(i) || (i >= candidate.mark && i < candidate.end);
  const letters = lettersOf(tokens, from, to, talk.sentences, isOut);
  const words = tokens.slice(from, to).filter((_, n) => !isOut(from + n));
  const isRing =
    before.piece.length === 0 &&
    (before.chains === null || before.chainJoined) &&
    words.some((token) => token.kind === 'V');
  const heading = talk.sentences.startOf[candidate.mark]!;
  const lead = leadingTotal(tokens, from, candidate.mark);
  const events = [...lead, ...prune(findEvents(letters), tokens, heading, isRing)];
  const loops = loopsOf(tokens, from, to, (i) => talk.skipped[i] === true);
  const bases = isRing ? [] : basesFor(talk, stretch, before, loops, words);
  const named = linesNamed(tokens, from, to, announced.from ?? 0);
  const setting: Setting = {
    bases,
    stitch: stitchNamed(words, events) ?? (isSlipRow(words, before) ? 'slst' : before.stitch),
    chainCounts: chainRule(words) ?? before.chainCounts,
    corner: cornerBefore(before, stitchNamed(words, events) ?? before.stitch),
    edge: edgeBefore(before, stitchNamed(words, events) ?? before.stitch),
    isDoubtful: before.piece.at(-1)?.isDoubtful ?? false,
    copies: copiesFor(tokens, from, to, named, before.piece),
    heading,
    mayLeave: LEAVING.test(words.map((token) => token.text).join(' ')),
    isRing: !before.isRows,
    leavesOut: before.piece.findLast((line) => line.leavesOutInside !== null)?.leavesOutInside ?? false,
    isPlain: isPlainLine(words, events, announced),
    isTold: announced.from !== announced.to || isToldPlain(talk, stretch, isOut),
  };
  const vague = findVague(tokens, candidate.end, to, talk.sentences, events);
  const told = vague === null ? events : firstTelling(events, vague);
  const choice = chooseWork(told, vague === null ? setting : { ...setting, bases: [], isPlain: false, copies: [] });
  const rest = { loops, isRing, isInvisible: isInvisible(tokens, from, to), vague };
  return result(choice, announced, bases, events, rest, setting.isDoubtful);
}

/** Of a line whose end is left open, what its first sentence tells before that; bare totals left out. */
function firstTelling(events: readonly Event[], vague: TokenSpan): readonly Event[] {
  const before = events.filter((event) => event.at < vague.from && event.type !== 'around');
  const sentence = before.find((event) => event.type === 'unit')?.sentence;
  return before.filter((event) => event.sentence === sentence && !(event.type === 'number' && event.asTotal > 1));
}

/** Numbers that name lines and count nothing: `so that's 22 and 23`, `same as round 9`, `six in a ring, that's one`. */
function namesOfLines(tokens: readonly Token[], { announced, from, to }: Stretch): ReadonlySet<number> {
  const out = new Set<number>();
  const first = announced.from ?? 0;
  const last = announced.to ?? 0;
  const isUnnumbered = announced.candidate.end === announced.candidate.at;
  for (let i = from; i < to; i++) {
    if (tokens[i]!.kind !== 'N' && tokens[i]!.kind !== 'O') continue;
    const list = readNumberList(tokens, i, true);
    const isOwn = list !== null && list.to > list.from && list.to === last && list.from >= first && list.from > 0;
    const follows = tokens[i - 1]?.kind === 'U' || tokens[i - 1]?.kind === '#';
    const value = Number(tokens[i]!.value);
    const isNamed = follows && value <= last + 1;
    const isTag =
      isUnnumbered &&
      value === first &&
      tokens[i - 1]?.kind !== 'E' &&
      /[.,|]/.test(tokens[i + 1]?.kind ?? '.') &&
      /^(?:is|'s|that is|there is|it is)$/.test(tokens[i - 1]?.text ?? '');
    const isHead = isUnnumbered && value === first && i - from < 3 && ',.'.includes(tokens[i + 1]?.kind ?? '.');
    if (isOwn || isNamed || isTag || isHead) for (let j = i; j < (isOwn ? list.end : i + 1); j++) out.add(j);
  }
  return out;
}

const LEAVING =
  /\b(?:leave|leaving)\b(?! (?:one|two|three|four|five|six|\d+) alone).{0,12}\b(?:last|rest|alone|unworked|hat)\b|\bstop dead\b|\bjust the \w+\b|\bhalf the\b/;

const FABRIC = new Set(['sc', 'hdc', 'dc', 'tr']);

/** The stitch a line names; a slip stitch only where the line is made of them. */
function stitchNamed(words: readonly Token[], events: readonly Event[]): string | null {
  const named = words.find((token) => token.kind === 'S' && FABRIC.has(String(token.value)));
  if (named !== undefined) return String(named.value);
  const slips = events.some(
    (event) =>
      event.type === 'unit' &&
      event.fills &&
      event.options[0]!.some((unit) => unit.type === 'stitch' && unit.stitch === 'slst'),
  );
  return slips ? 'slst' : null;
}

/** What may speak against a reading and its lead over others so that a fault it shows is the maker's and not the reader's. */
const CLEAR_COST = 0.65;
const CLEAR_LEAD = 0.35;
const UNSURE_COST = 1;

/**
 * The verdict by what the words come to. A fault is only claimed where the words were understood plainly and stand on a
 * line that is sure; else the line is shown as not understood, which asks a person instead of blaming one.
 */
function verdictOf(choice: Choice, wasDoubtful: boolean): ReadSoFar['verdict'] {
  const isMisfit = choice.fit === 'misfit';
  if (!isMisfit && choice.said === null) return 'no-total';
  if (!isMisfit && choice.agrees === true) return 'agrees';
  if (wasDoubtful || choice.cost > CLEAR_COST || choice.lead < CLEAR_LEAD) return 'unread';
  return isMisfit ? 'does-not-fit' : 'differs';
}

/** How plainly a number must be said as a total to be taken for one where the work is not known. */
const SURE_SAID = 1.5;
/** A reading below this neither fits nor agrees. */
const DOUBTFUL = 0;

/** A single row along a chain that names no other stitch than the slip stitch is made of it. */
function isSlipRow(words: readonly Token[], before: Before): boolean {
  return (
    before.chains !== null &&
    before.piece.length === 0 &&
    words.some((token) => token.kind === 'S' && token.value === 'slst')
  );
}

function isPlainLine(words: readonly Token[], events: readonly Event[], { from, to }: Announced): boolean {
  const plain = words.some(
    (token) =>
      token.kind === 'F' || token.kind === 'E' || token.kind === 'A' || token.kind === 'B' || token.kind === 'M',
  );
  const shapes = events.some(
    (event) => event.type === 'unit' && event.options[0]!.some((unit) => unit.type !== 'stitch' || unit.inOne > 1),
  );
  return !shapes && (plain || from !== to || events.some((event) => event.type === 'unit'));
}

/** Whether the sentence that announces the line, or the next one, says that nothing happens, or goes into every stitch. */
function isToldPlain({ tokens, sentences }: Talk, { announced, to }: Stretch, isOut: (i: number) => boolean): boolean {
  const { mark } = announced.candidate;
  const end = sentences.isPunctuated ? (sentences.endOf[sentences.endOf[mark]!] ?? to) : to;
  for (let i = mark; i < Math.min(to, end); i++) if (!isOut(i) && 'FEAB'.includes(tokens[i]!.kind)) return true;
  return false;
}

const COUNTED =
  /\b(?:counts?|counting|stands? for|standing for|that is a stitch|that is your first|as a stitch|being the first|is a treble|included|that lad)\b/;
const NOT_COUNTED =
  /\b(?:(?:not|never|nobody|no|uncounted|isn't|doesn't|don't|won't)\b.{0,24}\b(?:count|counts|counted|stitch|anything)|ignore|which is nothing|that is nothing|uncounted|does nothing)\b/;

/** What the words say of a starting chain: whether it counts as a stitch. */
export function chainRule(words: readonly Token[]): boolean | null {
  if (!words.some((token) => token.kind === 'C')) return null;
  const text = words.map((token) => token.text).join(' ');
  if (NOT_COUNTED.test(text)) return false;
  return COUNTED.test(text) ? true : null;
}

function result(
  choice: Choice | null,
  announced: Announced,
  bases: readonly Base[],
  events: readonly Event[],
  rest: Pick<ReadLineResult, 'loops' | 'isRing' | 'isInvisible' | 'vague'>,
  wasDoubtful: boolean,
): ReadLineResult {
  const { from, to } = announced;
  const heard = events.filter((event) => event.type === 'number').sort((a, b) => b.asTotal - a.asTotal)[0];
  if (choice === null || rest.vague !== null) {
    const said = heard !== undefined && heard.asTotal >= SURE_SAID ? heard.n : null;
    return {
      isDoubtful: true,
      ...rest,
      from,
      to,
      units: choice?.units ?? [],
      base: bases[0]?.n ?? null,
      said,
      verdict: 'unread',
      left: null,
      leavesOutInside: null,
      count: null,
      lead: 0,
      score: 0,
      cost: 9,
      events,
      used: choice?.used ?? events,
    };
  }
  const verdict = verdictOf(choice, wasDoubtful);
  const isUnsure = wasDoubtful || choice.score < DOUBTFUL || choice.cost > UNSURE_COST || verdict !== 'no-total';
  const isDoubtful = verdict === 'unread' || (verdict !== 'agrees' && isUnsure);
  return {
    isDoubtful,
    ...rest,
    from,
    to,
    units: choice.units,
    base: choice.base,
    said: choice.said,
    verdict,
    count: verdict === 'unread' ? null : verdict === 'agrees' ? choice.said : choice.makes,
    left: choice.left,
    leavesOutInside: choice.leavesOutInside,
    lead: choice.lead,
    score: choice.score,
    cost: choice.cost,
    events,
    used: choice.used,
  };
}

/** Units of work in a chain line. */
export function chainUnits(n: number): readonly Unit[] {
  return [{ type: 'chain', many: n }];
}
