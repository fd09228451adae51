import { type Token } from '../tokens.ts';
import { type Candidate } from './candidate.ts';

/** A candidate that was taken, with the lines it came to be. */
export interface Announced {
  readonly candidate: Candidate;
  readonly from: number | null;
  readonly to: number | null;
  /** Whether a piece begins here. */
  readonly begins: boolean;
}

interface State {
  readonly to: number;
  readonly score: number;
  readonly announced: Announced | null;
  readonly before: State | null;
  /** Right after a starting chain, at this token. */
  readonly chainAt: number | null;
}

/** What it costs to pass over the number of a line, and to begin a piece where nothing else says so. */
const SKIP_COST = 2.2;
/** However many lines were missed, more than this is not asked. */
const MOST_SKIP_COST = 6;
const NEAR_GAP = 3;
const RESTART_COST = 0.9;
const CHAIN_REACH = 70;
const STATES_KEPT = 4;
const CHAINS_KEPT = 3;
const OWN_RING = 24;
const OWN_RING_AGAIN = 44;
/** Weak announcements are taken only where they join others. */
const TAKING_COST = 0.45;

/**
 * Chooses among the candidates the chain that fits best: numbers that go on or begin again, strong announcements
 * before weak ones. Takes time linear in the candidates.
 */
export function chooseChain(candidates: readonly Candidate[], tokens: readonly Token[]): readonly Announced[] {
  const start: State = { to: 0, score: 0, announced: null, before: null, chainAt: null };
  const best = new Map<number, State>([[0, start]]);
  let top = start;
  let chains: readonly State[] = [];
  for (const candidate of candidates) {
    const fresh: State[] = [];
    if (candidate.kind === 'foundation') {
      if (isToldAgain(candidate, chains[0], top)) continue;
      const state = begin(candidate, top, 0, candidate.strength - restartCost(top, candidate, tokens) / 2);
      chains = [state, ...chains].slice(0, CHAINS_KEPT);
      continue;
    }
    for (const state of options(candidate, best, top, chains, tokens)) fresh.push(state);
    for (const state of fresh) {
      const old = best.get(state.to);
      if (old === undefined || state.score > old.score + 1e-9) best.set(state.to, state);
      if (state.score > top.score + 1e-9) top = state;
    }
  }
  const out: Announced[] = [];
  for (let state: State | null = top; state !== null; state = state.before) {
    if (state.announced !== null) out.push(state.announced);
  }
  out.reverse();
  return out;
}

function options(
  candidate: Candidate,
  best: ReadonlyMap<number, State>,
  top: State,
  chains: readonly State[],
  tokens: readonly Token[],
): State[] {
  const { lines } = candidate;
  const open = chains.filter((one) => isFree(one, candidate) && candidate.at - one.chainAt! < CHAIN_REACH);
  if (lines.type === 'named') {
    if (candidate.needs === 'chain') {
      return open.map((before) => go(candidate, before, 1, 1, candidate.strength + 0.6));
    }
    const out: State[] = [];
    if (lines.from === 1) {
      for (const before of candidate.needs === 'start' ? [] : open) {
        out.push(go(candidate, before, 1, lines.to, candidate.strength + 1.6));
      }
      if (isFree(top, candidate) && !isOwnRing(top, candidate, tokens))
        out.push(begin(candidate, top, lines.to, candidate.strength - restartCost(top, candidate, tokens)));
    }
    for (const before of statesBefore(lines.from, best, top)) {
      if (before.to === 0 && before.announced === null && lines.from > 1 && candidate.strength < 2) continue;
      if (lines.from === 1 && (before.announced !== null || candidate.needs === 'start')) continue;
      if (!isFree(before, candidate)) continue;
      const cost = Math.min(MOST_SKIP_COST, (lines.from - 1 - before.to) * SKIP_COST);
      out.push(go(candidate, before, lines.from, lines.to, candidate.strength - cost));
    }
    return out;
  }
  const reach = [...new Set([top, ...[...best.values()].sort((a, b) => b.score - a.score).slice(0, STATES_KEPT)])];
  const from = [...open, ...reach];
  return from.flatMap((before) => relative(candidate, before));
}

/** The chains that a numbered line may go on from: those up to shortly before it, and the best where more are missing. */
function statesBefore(from: number, best: ReadonlyMap<number, State>, top: State): readonly State[] {
  const near: State[] = [];
  for (let gap = 0; gap <= NEAR_GAP; gap++) {
    const before = best.get(from - 1 - gap);
    if (before !== undefined) near.push(before);
  }
  const isFar = top.announced !== null && top.to < from - 1 - NEAR_GAP;
  return isFar ? [...near, top] : near;
}

function relative(candidate: Candidate, before: State): State[] {
  if (!isFree(before, candidate)) return [];
  const { lines } = candidate;
  const first = before.to + 1;
  if (before.announced === null) return [];
  if (lines.type === 'next') {
    const bonus = before.chainAt !== null ? 0.8 : 0;
    return [go(candidate, before, first, first + lines.many - 1, candidate.strength + bonus)];
  }
  if (lines.type === 'until' && lines.last >= first && lines.last - first < 200) {
    return [go(candidate, before, first, lines.last, candidate.strength)];
  }
  return [];
}

/** `chain forty three … that's my forty three chain`: the same chain spoken of again before anything stands on it. */
function isToldAgain(candidate: Candidate, last: State | undefined, top: State): boolean {
  const told = last?.announced?.candidate;
  const line = top.announced?.candidate;
  const isPassed = line !== undefined && told !== undefined && line.at > told.end && line.at < candidate.at;
  if (told === undefined || isPassed || candidate.at - told.end > CHAIN_REACH) return false;
  return told.lines.type === 'chain' && candidate.lines.type === 'chain' && told.lines.n === candidate.lines.n;
}

/** A ring named within the first round is that round's own, and begins no other piece. */
function isOwnRing(top: State, candidate: Candidate, tokens: readonly Token[]): boolean {
  if (candidate.needs !== 'start' || top.announced?.from !== 1) return false;
  const { at, end } = top.announced.candidate;
  const since = candidate.at - end;
  if (since >= OWN_RING_AGAIN) return false;
  const hasRing = tokens.slice(at, candidate.at).some((token) => token.kind === 'V');
  return since < (hasRing ? OWN_RING_AGAIN : OWN_RING);
}

/** Whether the candidate's words come after those of the line before. */
function isFree(before: State, candidate: Candidate): boolean {
  return before.announced === null || candidate.end > before.announced.candidate.end;
}

function go(candidate: Candidate, before: State, from: number, to: number, gain: number): State {
  return {
    to,
    score: before.score + gain - TAKING_COST,
    announced: { candidate, from, to, begins: before.announced === null },
    before,
    chainAt: null,
  };
}

function begin(candidate: Candidate, before: State, to: number, gain: number): State {
  const isChain = candidate.kind === 'foundation';
  const announced = { candidate, from: isChain ? null : 1, to: isChain ? null : to, begins: true };
  return { to, score: before.score + gain, announced, before, chainAt: isChain ? candidate.end : null };
}

const ENDING = /\b(?:cut|fasten|tail|sew|off|close|pieces?|two|make|now|weave|hide|ends?|snip|snug|finish|done|tie)\b/;

/** Beginning at one again is likely where the line before was finished off or a part is named. */
function restartCost(top: State, candidate: Candidate, tokens: readonly Token[]): number {
  if (top.announced === null) return 0;
  const between = tokens
    .slice(Math.max(top.announced.candidate.end, candidate.at - 60), candidate.at)
    .map((one) => one.text)
    .join(' ');
  return ENDING.test(between) ? RESTART_COST : RESTART_COST * 2;
}
