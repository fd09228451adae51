import { type Announced } from './announce/chain.ts';
import { ownChain } from './announce/start-candidates.ts';
import { type ReadSoFar } from './bases.ts';
import { foundation } from './foundation.ts';
import { readPieceName, thingsNamed } from './piece-name.ts';
import { readMake } from './pieces.ts';
import { readExpanded } from './read-expanded.ts';
import { chainRule, type ReadLineResult, type Talk } from './read-line.ts';
import { endOfStep, type SpokenStep, startOfTelling } from './steps.ts';
import { type Token } from './tokens.ts';
import { spell, type Unit } from './work/units.ts';

/** A line as it was read, with the tokens it stands on. */
export type ReadEntry =
  | {
      readonly type: 'line';
      readonly kind: 'foundation' | 'round' | 'row';
      readonly at: number;
      readonly to: number;
      readonly announced: Announced;
      readonly read: ReadLineResult;
    }
  | {
      readonly type: 'step';
      readonly at: number;
      readonly to: number;
      /** Where the doing itself is named. */
      readonly trigger: number;
      /** Where the sentence that tells it begins. */
      readonly textFrom: number;
      readonly topic: string;
    };

export interface ReadPiece {
  readonly name: string;
  readonly make: number;
  readonly worked: 'spiral' | 'joined' | 'rows';
  readonly entries: readonly ReadEntry[];
}

/** Where a silence shows that the talk has moved on, in milliseconds. */
const LONG_SILENCE = 7000;
const INTRO = 110;

interface Building {
  name: string;
  make: number;
  unit: 'round' | 'row' | null;
  entries: ReadEntry[];
  lines: ReadSoFar[];
  chains: number | null;
  chainJoined: boolean;
  introFrom: number;
}

/** Reads the announced lines one after another, each with what came before it, and puts the steps between them. */
export function readPieces(
  talk: Talk,
  chain: readonly Announced[],
  steps: readonly SpokenStep[],
  silenceAfter: (token: Token) => number,
): readonly ReadPiece[] {
  const pieces: Building[] = [];
  const things = thingsNamed(talk.tokens);
  let chainCounts: boolean | null = null;
  let stitch = 'sc';
  let introFrom = 0;
  let passed = 0;
  chain.forEach((announced, n) => {
    const { candidate } = announced;
    const next = chain[n + 1]?.candidate.at ?? talk.tokens.length;
    while (passed < steps.length && steps[passed]!.at < candidate.end) passed += 1;
    const between = stepsUntil(steps, passed, next);
    const firstStep = between.find((step) => step.at > candidate.end);
    const to = endOfLine(talk, candidate.end, Math.min(next, firstStep?.trigger ?? next), silenceAfter);
    if (announced.begins) {
      const from = Math.max(introFrom, candidate.at - INTRO);
      chainCounts = n === 0 ? chainRule(talk.tokens.slice(from, candidate.at)) : chainCounts;
      pieces.push(beginPiece(talk, from, announced, pieces.length + 1, things));
    }
    const piece = pieces.at(-1)!;
    if (candidate.kind === 'foundation') {
      const many = candidate.lines.type === 'chain' ? candidate.lines.n : 0;
      piece.chains = many;
      piece.chainJoined = /\b(?:slip stitch|slip stitches|join|circle|ring|hoop)\b/.test(
        textOf(talk.tokens, candidate.end, next).slice(0, 160),
      );
      piece.entries.push({ type: 'line', kind: 'foundation', at: candidate.at, to, announced, read: foundation(many) });
    } else {
      chainCounts = chainRule(talk.tokens.slice(candidate.at, to)) ?? chainCounts;
      const line = withOwnChain(talk, announced, to, piece);
      piece.unit = candidate.unit ?? piece.unit;
      const kind = piece.unit ?? (piece.chains === null ? 'round' : 'row');
      const before = {
        piece: piece.lines,
        all: pieces.slice(-9, -1).map((one) => one.lines),
        chains: piece.chains,
        introFrom: piece.lines.length === 0 ? piece.introFrom : introFrom,
        stitch,
        chainCounts,
        chainJoined: piece.chainJoined,
        isRows: kind === 'row',
      };
      for (const read of readExpanded(talk, line, to, before)) {
        piece.lines.push(read);
        piece.entries.push({ type: 'line', kind, at: candidate.at, to, announced: line, read });
        stitch = mainStitch(read.units) ?? stitch;
      }
    }
    between.forEach((step, m) => {
      const { at, trigger, topic } = step;
      const to = endOfStep(step, Math.min(next, between[m + 1]?.at ?? next), talk.sentences);
      const textFrom = startOfTelling(
        talk.tokens,
        talk.sentences,
        step,
        Math.max(candidate.end, between[m - 1]?.end ?? 0),
      );
      piece.entries.push({ type: 'step', at, to, trigger, textFrom, topic });
    });
    introFrom = to === next ? afterWork(talk, candidate.end, to) : to;
  });
  return pieces.map(finish);
}

/** The end of the last sentence that still tells work: what comes after it may introduce the next piece. */
function afterWork({ tokens, sentences }: Talk, from: number, to: number): number {
  for (let i = to - 1; i >= from; i--) {
    if ('SPDtAE'.includes(tokens[i]!.kind)) return Math.min(to, sentences.endOf[i]!);
  }
  return from;
}

/**
 * `Row one. Chain twenty-five, slip stitch in the second chain from the hook`: a first row that makes its own chain gives
 * a foundation too, and is read from behind it.
 */
function withOwnChain(talk: Talk, announced: Announced, to: number, piece: Building): Announced {
  const { candidate } = announced;
  if (piece.lines.length > 0 || piece.chains !== null || candidate.unit !== 'row') return announced;
  const own = ownChain(talk.tokens, candidate.end, to);
  if (own === null) return announced;
  const { at, end, n } = own;
  const lines = { type: 'chain' as const, n };
  const chain: Announced = {
    ...announced,
    candidate: { ...candidate, kind: 'foundation', at, mark: at, end, lines },
    from: null,
    to: null,
  };
  piece.chains = n;
  piece.entries.push({
    type: 'line',
    kind: 'foundation',
    at: candidate.at,
    to: end,
    announced: chain,
    read: foundation(n),
  });
  return { ...announced, candidate: { ...candidate, end } };
}

/** The steps from one on that come before a token. */
function stepsUntil(steps: readonly SpokenStep[], from: number, before: number): readonly SpokenStep[] {
  let end = from;
  while (end < steps.length && steps[end]!.at < before) end += 1;
  return steps.slice(from, end);
}

function beginPiece(
  talk: Talk,
  from: number,
  announced: Announced,
  nth: number,
  things: ReadonlySet<string>,
): Building {
  const { candidate } = announced;
  const make = readMake(talk.tokens, from, candidate.mark, talk.sentences, nth === 1);
  const nameFrom = nth === 1 ? 0 : from;
  return {
    name:
      readPieceName(talk.tokens, { from: nameFrom, to: candidate.mark, sentences: talk.sentences, make, things }) ??
      `Piece ${nth}`,
    make,
    unit: candidate.unit,
    entries: [],
    lines: [],
    chains: null,
    chainJoined: false,
    introFrom: from,
  };
}

function endOfLine(talk: Talk, from: number, to: number, silenceAfter: (token: Token) => number): number {
  let hasWork = false;
  for (let i = from; i < to; i++) {
    const token = talk.tokens[i]!;
    if (token.kind === '|' && hasWork && silenceAfter(token) > LONG_SILENCE) return i + 1;
    if ('SPDFEBRM'.includes(token.kind)) hasWork = true;
  }
  return to;
}

function mainStitch(units: readonly Unit[]): string | null {
  const words = spell(units).filter((word) => /^(?:sc|hdc|dc|tr)$/.test(word));
  return words[0] ?? null;
}

function finish(piece: Building): ReadPiece {
  const text = piece.entries.some((entry) => entry.type === 'line' && entry.kind === 'row');
  return { name: piece.name, make: piece.make, worked: text ? 'rows' : 'spiral', entries: piece.entries };
}

function textOf(tokens: readonly Token[], from: number, to: number): string {
  return tokens
    .slice(from, to)
    .map((token) => token.text)
    .join(' ');
}
