import { type Sentences } from '../sentences.ts';
import { type Token } from '../tokens.ts';
import { type Candidate } from './candidate.ts';
import { announcementStart } from './candidates.ts';

const NEAR = 34;
const REACH = 16;
/** What turns a start into a suggestion, a habit or another way. */
const UNLESS = /\b(?:if|you may|you could|you can|or|every|each|when|whenever|isn't|counts?)\b/;
const textOf = (tokens: readonly Token[]): string => tokens.map((one) => one.text).join(' ');
const isIdle = (tokens: readonly Token[]): boolean => UNLESS.test(textOf(tokens));

/** What begins a piece without a number: a starting chain, a ring, a first row that is only described. */
export function startCandidates(
  tokens: readonly Token[],
  sentences: Sentences,
  numbered: readonly Candidate[],
): readonly Candidate[] {
  const found: Candidate[] = [];
  const firsts = numbered.filter((one) => one.lines.type === 'named' && one.lines.from === 1 && one.strength > 1.9);
  let passed = 0;
  tokens.forEach((token, i) => {
    while (passed < firsts.length && firsts[passed]!.at < i - REACH) passed += 1;
    if (token.kind === 'C') found.push(...chainCandidate(tokens, i, sentences));
    if (token.kind === 'V') found.push(...ringCandidate(tokens, i, sentences, firsts.slice(passed, passed + 4)));
    if (token.kind === 'H' || token.kind === 'K' || token.kind === 'U' || token.kind === 'S') {
      found.push(...firstRow(tokens, i, sentences, firsts.slice(passed, passed + 4)));
    }
  });
  return found;
}

/** `chain eight`, `eight chains`, `a chain of seven`, `start by chaining twenty nine`. */
function chainCandidate(tokens: readonly Token[], i: number, sentences: Sentences): Candidate[] {
  const after = tokens[i + 1]?.kind === 'a' || tokens[i + 1]?.text === 'of' ? i + 2 : i + 1;
  let number = tokens[after]?.kind === 'N' ? after : -1;
  if (number < 0 && tokens[i - 1]?.kind === 'N') number = i - 1;
  if (number < 0) {
    for (let j = i + 1; j < Math.min(tokens.length, i + 4); j++) {
      if (tokens[j]!.kind === 'N') {
        number = j;
        break;
      }
      if (
        !'a~w,=v'.includes(tokens[j]!.kind) ||
        (tokens[j]!.kind === ',' && !'~='.includes(tokens[j + 1]?.kind ?? '.'))
      )
        break;
    }
  }
  if (number < 0) return [];
  const start = sentences.startOf[i]!;
  const before = tokens.slice(Math.max(start, i - 13), i);
  const n = Number(tokens[number]!.value);
  const rest = textOf(tokens.slice(i, i + 10));
  const lead = tokens[Math.min(i, number) - 1]?.text ?? '';
  const isSpace = /\b(?:stands?|standing|secretly|as a stitch)\b/.test(rest) || lead === "'s" || lead === 'that is';
  const isShort = n < 4 && !isWorkedFrom(tokens, Math.max(i, number) + 1);
  if (isShort || isIdle(before) || isSpace || joinsStitch(tokens, Math.max(i, number) + 1)) return [];
  const next = tokens[Math.max(i, number) + 1]?.kind ?? '.';
  const isCountedSpace = tokens[Math.max(i, number) + 1]?.kind === 'Z';
  if (isCountedSpace || before.some((one) => 'KSPD'.includes(one.kind)) || (n < 5 && next === 'T')) return [];
  const lines = { type: 'chain' as const, n: correctedChain(tokens, Math.max(i, number) + 1, n) };
  const at = announcementStart(tokens, Math.min(i, number), sentences);
  return [
    {
      kind: 'foundation',
      at,
      end: Math.max(i, number) + 1,
      mark: at,
      unit: null,
      lines,
      strength: 0.6,
      needs: null,
    },
  ];
}

/** `Chain two. Row one, three singles in the second chain from the hook`: a first line that stands on few chains. */
function isWorkedFrom(tokens: readonly Token[], after: number): boolean {
  const ahead = tokens.slice(after, after + REACH);
  const line = ahead.findIndex((one) => one.kind === 'U');
  return line >= 0 && line < 4 && ahead.some((one, n) => one.kind === 'C' && ahead[n + 1]?.kind === 'H');
}

/** A starting chain told first thing in a row, before its stitches: `chain twenty-five, slip stitch in the second …`. */
export function ownChain(
  tokens: readonly Token[],
  from: number,
  to: number,
): { readonly at: number; readonly end: number; readonly n: number } | null {
  let at = from;
  while (at < to && '.,|~&av'.includes(tokens[at]!.kind) && at - from < 5) at += 1;
  const number = tokens[at + 1];
  if (tokens[at]?.kind !== 'C' || number?.kind !== 'N' || at + 1 >= to || Number(number.value) < 4) return null;
  const fromHook = tokens.slice(at, Math.min(to, at + REACH)).some((token) => token.kind === 'H');
  return fromHook ? { at, end: at + 2, n: Number(number.value) } : null;
}

/** `four chain and a treble at its foot`: a chain that goes on into stitches begins no piece. */
function joinsStitch(tokens: readonly Token[], after: number): boolean {
  let i = after;
  while (tokens[i]?.kind === '&' || tokens[i]?.kind === 'a') i += 1;
  return i > after && tokens[i]?.kind === 'S' && tokens[i]!.value !== 'slst';
}

/** `chain twenty six, no, sorry, twenty seven`: the last number before the talk goes on. */
function correctedChain(tokens: readonly Token[], from: number, n: number): number {
  let value = n;
  for (let i = from; i < Math.min(tokens.length, from + 12); i++) {
    const token = tokens[i]!;
    if (token.kind === '|' || token.kind === 'S' || token.kind === 'U') break;
    if (token.kind === 'N' && tokens.slice(from, i).some((one) => one.kind === 'Y' || one.text === 'no'))
      value = Number(token.value);
  }
  return value;
}

/** `six singles into a magic ring`: the first round, said by its ring. Where its number follows, both are one. */
function ringCandidate(
  tokens: readonly Token[],
  i: number,
  sentences: Sentences,
  numbered: readonly Candidate[],
): Candidate[] {
  const start = sentences.startOf[i]!;
  const end = sentences.endOf[i]!;
  const near = tokens.slice(Math.max(start, i - 12), Math.min(end, i + 12));
  if (isIdle(tokens.slice(Math.max(start, i - 10), i + 2))) return [];
  const hasWork = near.some((one) => one.kind === 'N' || one.kind === 'S');
  if (numbered.some((one) => one.at > i && one.at - i < NEAR && namesRing(tokens, one.end))) return [];
  if (closesChain(tokens, i, start) && !near.some((one) => one.kind === 'S' && one.value !== 'slst')) return [];
  const at = i - start < 12 ? start : Math.max(start, i - 3);
  const named = numbered.find((one) => one.at >= at && one.at <= i + 14);
  const base = { kind: 'line' as const, at, unit: 'round' as const, needs: 'start' as const };
  const lines = { type: 'named' as const, from: 1, to: 1 };
  if (named !== undefined && named.at > at && hasWork)
    return [{ ...base, end: named.end, mark: named.mark, lines, strength: named.strength + 0.2 }];
  if (!hasWork) return [];
  return [{ ...base, end: at, mark: at, lines, strength: 2 }];
}

/** A numbered round that speaks of its ring itself needs none spoken of before it. */
function namesRing(tokens: readonly Token[], from: number): boolean {
  return tokens.slice(from, from + REACH).some((one) => one.kind === 'V');
}

/** `Chain five, close it in a ring`: the ring is made of the chain. */
function closesChain(tokens: readonly Token[], i: number, start: number): boolean {
  return tokens.slice(Math.max(start, i - 12), i).some((one) => one.kind === 'C');
}

/** How far behind its work a row may be given its number (`… that's row one`), and what it gains to hold both together. */
const LABEL_REACH = 45;
const LABEL_GAIN = 1.2;

/** Whether the number names what was just done. */
function isLabel(tokens: readonly Token[], mark: number): boolean {
  return /^(?:that is|that was|is|'s|it is|so that is|there is)$/.test(tokens[mark - 1]?.text ?? '');
}

/** Right after a starting chain: `slip stitch in the second chain from the hook`, `one row of slip stitch`. */
function firstRow(
  tokens: readonly Token[],
  i: number,
  sentences: Sentences,
  numbered: readonly Candidate[],
): Candidate[] {
  const token = tokens[i]!;
  const start = sentences.startOf[i]!;
  const end = Math.min(sentences.endOf[i]!, i + NEAR);
  const ahead = tokens.slice(Math.max(start, i - 10), end);
  if (token.kind === 'U' && !/^(?:one|a|single|1|only)$/.test(tokens[i - 1]?.text ?? '')) return [];
  if (token.kind === 'K' && tokens[i + 1]?.kind !== 'C' && tokens[i + 2]?.kind !== 'C' && tokens[i + 3]?.kind !== 'C')
    return [];
  if (
    token.kind === 'S' &&
    !ahead.some((one) => one.kind === 'E' || one.kind === 'A' || one.kind === 'C' || one.text === 'down')
  )
    return [];
  if (!ahead.some((one) => one.kind === 'S') && token.kind !== 'U' && token.kind !== 'H') return [];
  const at = i - start < 12 ? start : i;
  const named = numbered.find((one) => one.mark > i && one.mark - i < LABEL_REACH && isLabel(tokens, one.mark));
  if (named !== undefined) return [{ ...named, at, needs: 'chain', strength: named.strength + LABEL_GAIN }];
  return [
    {
      kind: 'line',
      at,
      end: at,
      mark: at,
      unit: String(token.value).startsWith('round') ? 'round' : null,
      lines: { type: 'named', from: 1, to: 1 },
      strength: token.kind === 'S' ? 0.7 : 0.9,
      needs: 'chain',
    },
  ];
}
