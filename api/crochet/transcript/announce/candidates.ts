import { type Sentences } from '../sentences.ts';
import { type Token } from '../tokens.ts';
import { bareCandidates } from './bare-candidates.ts';
import { type Candidate } from './candidate.ts';
import { isMention } from './mentions.ts';
import { isCounted, numberAt, type NumberList, readNumberList } from './number-list.ts';
import { oneMore, repeatCandidates } from './repeat-candidates.ts';
import { startCandidates } from './start-candidates.ts';

/** Finds every place where a line may be announced, in the order of speech. */
export function findCandidates(tokens: readonly Token[], sentences: Sentences): readonly Candidate[] {
  const found: Candidate[] = [];
  tokens.forEach((token, i) => {
    if (token.kind === 'U') found.push(...unitCandidates(tokens, i, sentences));
    else if (token.kind === '#') found.push(...numberWord(tokens, i, sentences));
    else if ('XLA'.includes(token.kind)) found.push(...oneMore(tokens, i, sentences));
    else if (token.kind === 't' || token.kind === 'o') found.push(...repeatCandidates(tokens, i, sentences));
    found.push(...bareCandidates(tokens, i, sentences));
  });
  found.push(...startCandidates(tokens, sentences, found));
  return found.sort((a, b) => a.at - b.at || b.strength - a.strength);
}

/** Everything that is said around "round" and "row". */
function unitCandidates(tokens: readonly Token[], i: number, sentences: Sentences): Candidate[] {
  const word = String(tokens[i]!.value);
  const unit = word.startsWith('row') ? 'row' : 'round';
  const after = tokens[i + 1]?.kind === '#' ? i + 2 : skipArticles(tokens, i + 1);
  const named = readNumberList(tokens, after, word.endsWith('s'));
  if (named !== null) {
    return fromNamed(tokens, i, named, unit, sentences);
  }
  return fromBefore(tokens, i, unit, sentences);
}

function fromNamed(
  tokens: readonly Token[],
  i: number,
  named: NumberList,
  unit: 'round' | 'row',
  sentences: Sentences,
): Candidate[] {
  const word = String(tokens[i]!.value);
  const mention = isMention(tokens, i, named, sentences);
  const at = deedBefore(tokens, i, sentences) ?? announcementStart(tokens, i, sentences);
  const base = { kind: 'line' as const, at, end: named.end, mark: i, unit, needs: null };
  const renamed = namedAnew(tokens, named);
  if (renamed !== null)
    return [{ ...base, end: renamed.end, lines: { type: 'named', from: renamed.from, to: renamed.to }, strength: 3 }];
  if (mention === 'until')
    return [{ ...base, at: untilStart(tokens, i, sentences), lines: { type: 'until', last: named.to }, strength: 1.2 }];
  if (mention !== null || (word.endsWith('s') && named.from === named.to)) return [];
  const isFirst = startsClause(tokens, i);
  const split = tokens[named.end - 1]!.split;
  const out: Candidate[] = [
    { ...base, lines: { type: 'named', from: named.from, to: named.to }, strength: isFirst ? 3 : 2.4 },
  ];
  // "round twenty two trebles" may be round twenty, two trebles
  if (split !== null && named.from === named.to) {
    out.push({ ...base, end: named.end - 1, lines: { type: 'named', from: split[0], to: split[0] }, strength: 1.5 });
  }
  return out;
}

/** `rows one to four again, now they are five to eight`: earlier lines worked as later ones. */
function namedAnew(tokens: readonly Token[], named: NumberList): NumberList | null {
  if (named.from === named.to) return null;
  for (let i = named.end; i < Math.min(tokens.length, named.end + 9) && !'S|'.includes(tokens[i]!.kind); i++) {
    const list = readNumberList(tokens, i, true);
    if (list === null) continue;
    return list.from > named.to && list.to - list.from === named.to - named.from ? list : null;
  }
  return null;
}

/** `fifth round`, `next round`, `the next three rounds`, `three more rounds`, `last row`. */
function fromBefore(tokens: readonly Token[], i: number, unit: 'round' | 'row', sentences: Sentences): Candidate[] {
  let j = i - 1;
  while (j >= 0 && 'Fm~aS'.includes(tokens[j]!.kind) && i - j < 5) j -= 1;
  const before = tokens[j];
  if (before === undefined) return [];
  const at = announcementStart(tokens, j, sentences, true);
  const base = { kind: 'line' as const, at, end: i + 1, mark: j, unit, needs: null };
  const isPast =
    /^(?:was|were)$/.test(tokens[i + 1]?.text ?? '') || /^(?:was|were|every|each)$/.test(tokens[j - 1]?.text ?? '');
  if (isPast) return [];
  if (before.kind === 'O') {
    const list = ordinalsBefore(tokens, j);
    if (tokens[j - 1]?.kind === 'p') return [];
    return [
      {
        ...base,
        at: announcementStart(tokens, list.at, sentences),
        lines: { type: 'named', from: list.from, to: Number(before.value) },
        strength: 2.6,
      },
    ];
  }
  const plural = String(tokens[i]!.value).endsWith('s');
  if (before.kind === 'X' && !plural) return [{ ...base, lines: { type: 'next', many: 1 }, strength: 2 }];
  if (before.kind === 'L' && !plural && tokens[j - 1]?.kind !== 'I')
    return [{ ...base, lines: { type: 'next', many: 1 }, strength: 1.1 }];
  if (before.kind === 'N' && plural) return counted(tokens, i, j, base, sentences);
  const isOne =
    before.kind === 'N' &&
    Number(before.value) === 1 &&
    /[Fm]/.test(kindsOf(tokens, j + 1, i) + (tokens[i + 1]?.kind ?? ''));
  if (isOne && !plural) return [{ ...base, mark: i, lines: { type: 'next', many: 1 }, strength: 1 }];
  return [];
}

function counted(
  tokens: readonly Token[],
  i: number,
  j: number,
  base: Omit<Candidate, 'lines' | 'strength'>,
  sentences: Sentences,
): Candidate[] {
  const many = Number(tokens[j]!.value);
  if (many < 2 || many > 200) return [];
  const ahead = tokens[j - 1]?.kind === 'X' || tokens[j - 2]?.kind === 'X' || tokens[j + 1]?.kind === 'm';
  const isUntil = tokens.slice(Math.max(0, j - 5), j).some((one) => one.text === 'until' || one.text === 'till');
  if (isUntil)
    return [{ ...base, at: untilStart(tokens, j, sentences), lines: { type: 'until', last: many }, strength: 1.2 }];
  const list = explicitAfter(tokens, i + 1, many);
  if (list !== null) return [{ ...base, lines: { type: 'named', from: list.from, to: list.to }, strength: 3 }];
  const isFor = tokens[j - 1]?.text === 'for';
  const isResult =
    (tokens[j - 1]?.kind === '=' && !isFor) || tokens[j - 1]?.text === "'s" || tokens[j - 1]?.kind === 'p';
  if (isResult && !ahead)
    return [{ ...base, at: untilStart(tokens, j, sentences), lines: { type: 'until', last: many }, strength: 0.8 }];
  if (tokens[i + 1]?.text === 'of' && tokens[i + 2]?.kind === 'N') return [];
  return [{ ...base, lines: { type: 'next', many }, strength: ahead ? 2 : isFor ? 1.4 : 1 }];
}

/** `the next three rounds, so sixteen, seventeen and eighteen`: the numbers said soon after, as many as were promised. */
function explicitAfter(
  tokens: readonly Token[],
  from: number,
  many: number,
): { from: number; to: number; end: number } | null {
  for (let i = from; i < Math.min(tokens.length, from + 24); i++) {
    if (tokens[i]!.kind === '|') return null;
    const list = readNumberList(tokens, i, true);
    if (list !== null && list.to - list.from + 1 === many) return list;
  }
  return null;
}

function ordinalsBefore(tokens: readonly Token[], j: number): { at: number; from: number } {
  let at = j;
  let from = Number(tokens[j]!.value);
  for (let i = j - 1; i >= 0 && j - i < 8; i--) {
    const value = numberAt(tokens, i);
    if (tokens[i]!.kind === 'O' && value === from - 1) {
      from = value;
      at = i;
    } else if (tokens[i]!.text === 'to' && tokens[i - 1]?.kind === 'O') {
      from = Number(tokens[i - 1]!.value);
      at = i - 1;
    } else if (!['a', ','].includes(tokens[i]!.kind) && tokens[i]!.text !== 'and') break;
  }
  return { at, from };
}

function kindsOf(tokens: readonly Token[], from: number, to: number): string {
  return tokens
    .slice(from, to)
    .map((token) => token.kind)
    .join('');
}

/** `row two, row three, row two, row three, till you have ten`: announced by the first row named. */
function untilStart(tokens: readonly Token[], i: number, sentences: Sentences): number {
  const from = Math.max(sentences.startOf[i]!, i - DEED_REACH);
  const kinds = kindsOf(tokens, from, i - 2);
  const first = /U[^N]{0,2}N/.test(kinds) ? kinds.search(/U[^N]{0,2}N/) : kinds.indexOf('R');
  return announcementStart(tokens, first < 0 ? i : from + first, sentences);
}

const DEED_REACH = 28;

/** `repeat row two, two more times, so that's rows three and four` is announced by its deed, not by the numbers at its end. */
function deedBefore(tokens: readonly Token[], i: number, sentences: Sentences): number | null {
  const lead = tokens
    .slice(Math.max(0, i - 3), i)
    .map((token) => token.text)
    .join(' ');
  if (!/\b(?:that is|that 's)$/.test(lead)) return null;
  for (let j = i - 1; j >= Math.max(0, i - 18) && tokens[j]!.kind !== '|'; j--) {
    const isDeed =
      tokens[j]!.kind === 'R' && tokens[j]!.value === 0 && /^[^.]*U[^.]*\.?[^.]*$/.test(kindsOf(tokens, j, i));
    if (isDeed) return announcementStart(tokens, j, sentences);
  }
  return null;
}

/** `Number 4.`, `now number three fills the troughs`. */
function numberWord(tokens: readonly Token[], i: number, sentences: Sentences): Candidate[] {
  if (tokens[i - 1]?.kind === 'U') return [];
  const named = readNumberList(tokens, i + 1, false);
  if (named === null || named.from === 1 || isCounted(tokens, named.end)) return [];
  return [
    {
      kind: 'line',
      at: announcementStart(tokens, i, sentences),
      end: named.end,
      mark: i,
      unit: null,
      lines: { type: 'named', from: named.from, to: named.to },
      strength: 2,
      needs: null,
    },
  ];
}

const FAR = 18;
const LEADS = '~&v=apIXmr';

/** The first words of an announcement: its sentence's start where that is near, else the little words before it. */
export function announcementStart(
  tokens: readonly Token[],
  i: number,
  sentences: Sentences,
  withTurning = false,
): number {
  const start = sentences.startOf[i]!;
  const isLong = i - start <= 2 * FAR && /U.*N/.test(kindsOf(tokens, start, i));
  if ((i - start <= FAR || isLong) && sentences.isPunctuated) return start;
  let at = i;
  while (at > start && i - at < 5 && LEADS.includes(tokens[at - 1]!.kind)) at -= 1;
  const turns = withTurning && /^[~&a=,]*[CR][^USPDV]*$/.test(kindsOf(tokens, start, i));
  const isNear = i - start <= 5 || (i - start <= FAR && turns);
  return isNear ? start : at;
}

/** Whether only little words stand between a break and the token. */
export function startsClause(tokens: readonly Token[], i: number): boolean {
  let at = i - 1;
  while (at >= 0 && i - at < 8 && '~&v=apIXLr'.includes(tokens[at]!.kind)) at -= 1;
  return at < 0 || ['.', ',', '|'].includes(tokens[at]!.kind);
}

function skipArticles(tokens: readonly Token[], at: number): number {
  return tokens[at]?.kind === '~' && tokens[at + 1]?.kind === 'N' ? at + 1 : at;
}
