import { type Evidence } from './draft.ts';
import { type Event } from './instruct/event.ts';
import { type ReadEntry } from './read-pieces.ts';
import { type Sentences } from './sentences.ts';
import { type Token } from './tokens.ts';
import { type TokenSpan } from './vague.ts';
import { type Word } from './words.ts';

/** Phrases this many tokens apart in one sentence are one run of words. */
const NEAR = 3;
/** How much of a line that gave no phrase at all is shown as not understood. */
const SHOWN = 30;

type LineEntry = Extract<ReadEntry, { type: 'line' }>;

/** The words that a line was read from, a row a run: what announced it, gave its work and its total, and what was not read. */
export function evidenceOf(
  entry: LineEntry,
  tokens: readonly Token[],
  words: readonly Word[],
  sentences: Sentences,
): Evidence[] {
  const { candidate } = entry.announced;
  const total = totalSpan(entry);
  const unread = unreadSpan(entry, tokens, sentences);
  const announced =
    entry.kind === 'foundation'
      ? { from: chainAt(tokens, candidate.at, candidate.end), to: candidate.end }
      : { from: candidate.mark, to: beforeChain(tokens, candidate.mark, candidate.end) };
  const work = entry.read.verdict === 'unread' && entry.read.vague === null ? [] : workSpans(entry, total, tokens);
  const rows: Evidence[] = [];
  const add = (role: Evidence['role'], span: TokenSpan | null) => {
    if (span !== null && span.to > span.from) rows.push(evidence(role, span, tokens, words));
  };
  add('announcement', announced);
  for (const span of work) add('work', span);
  add('total', total);
  add('unread', unread);
  if (rows.length === 0) add('announcement', { from: entry.at, to: entry.at + 1 });
  return rows;
}

/** Row of evidence for a stretch of tokens. */
export function evidence(
  role: Evidence['role'],
  span: TokenSpan,
  tokens: readonly Token[],
  words: readonly Word[],
): Evidence {
  const firstWord = tokens[span.from]!.first;
  const lastWord = tokens[span.to - 1]!.last;
  return {
    role,
    firstWord,
    lastWord,
    startMs: words[firstWord]!.startMs,
    endMs: words[lastWord]!.endMs,
    words: quote(words, firstWord, lastWord),
  };
}

export function quote(words: readonly Word[], first: number, last: number): string {
  return words
    .slice(first, last + 1)
    .map((word) => word.text)
    .join(' ');
}

/** What was not understood of a line: the words left open, else the sentences that hold its phrases. Null where all was. */
export function unreadSpan(entry: LineEntry, tokens: readonly Token[], sentences: Sentences): TokenSpan | null {
  const { read, announced, to } = entry;
  if (read.verdict !== 'unread') return null;
  if (read.vague !== null) return read.vague;
  const from = Math.min(announced.candidate.end, tokens.length - 1);
  const told = read.used.filter((event) => event.type !== 'number' && event.at >= from);
  const first = told[0];
  const last = told.at(-1);
  if (first === undefined || last === undefined) return trimmed({ from, to: Math.min(to, from + SHOWN) }, tokens);
  const end = sentences.isPunctuated ? sentences.endOf[last.end - 1]! : last.end;
  return trimmed(
    { from: Math.max(from, sentences.startOf[first.at]!), to: Math.min(Math.max(to, last.end), end) },
    tokens,
  );
}

/** Words without the breaks around them; at least one token. */
function trimmed(span: TokenSpan, tokens: readonly Token[]): TokenSpan {
  let { from, to } = span;
  while (from < to - 1 && ',.|'.includes(tokens[from]!.kind)) from += 1;
  while (to > from + 1 && ',.|'.includes(tokens[to - 1]!.kind)) to -= 1;
  return { from, to: Math.max(to, from + 1) };
}

/** A first row that makes its own chain is announced before it. */
function beforeChain(tokens: readonly Token[], from: number, to: number): number {
  const chain = tokens.slice(from, to).findIndex((token) => token.kind === 'C');
  return chain < 1 ? to : from + chain;
}

function chainAt(tokens: readonly Token[], from: number, to: number): number {
  for (let i = from; i < to; i++) if (tokens[i]!.kind === 'C' || tokens[i]!.kind === 'N') return i;
  return from;
}

/** Where the total was spoken: of all times it was, the one said most like a total. */
function totalSpan({ read }: LineEntry): TokenSpan | null {
  let best: Extract<Event, { type: 'number' }> | null = null;
  for (const event of read.events) {
    if (event.type === 'number' && event.n === read.said && (best === null || event.asTotal >= best.asTotal))
      best = event;
  }
  return best === null ? null : { from: best.at, to: best.end };
}

/** The phrases of the work, those close together in one sentence as one run; bare numbers only beside other phrases. */
function workSpans({ read }: LineEntry, total: TokenSpan | null, tokens: readonly Token[]): TokenSpan[] {
  const runs: { from: number; to: number; sentence: number; isWork: boolean; hasStitch: boolean; repeats: boolean }[] =
    [];
  for (const event of read.used) {
    const isTotal = total !== null && event.at === total.from;
    const isAside = event.type === 'number' && (event.n === read.said || event.asItem <= 0);
    if (isTotal || isAside || event.type === 'correction') continue;
    const isWork = event.type !== 'number';
    const hasStitch = event.type === 'unit';
    const repeats = event.type === 'times' || event.type === 'around';
    const last = runs.at(-1);
    if (last?.sentence === event.sentence && event.at - last.to <= NEAR) {
      last.to = event.end;
      last.isWork ||= isWork;
      last.hasStitch ||= hasStitch;
      last.repeats ||= repeats;
    } else runs.push({ from: event.at, to: event.end, sentence: event.sentence, isWork, hasStitch, repeats });
  }
  const worked = runs.filter((run) => run.isWork);
  const kept = worked.some((run) => run.hasStitch) ? worked.filter((run) => run.hasStitch || run.repeats) : worked;
  return kept.map((run) => trimmed(run, tokens));
}
