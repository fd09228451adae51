import { type Announced } from './announce/chain.ts';
import { basesAfter, type ReadSoFar } from './bases.ts';
import { foundation } from './foundation.ts';
import { resolve } from './instruct/resolve.ts';
import { textOf } from './instruct/spoken-of.ts';
import { type Before, type ReadLineResult, readSpokenLine, type Stretch, type Talk } from './read-line.ts';
import { linesNamed, patternsOf } from './references.ts';
import { countUnits } from './work/counted.ts';
import { merged } from './work/settle.ts';

/** Without full stops the words that say what lines are like stand so close before them. */
const LEAD_REACH = 6;

/** Several earlier lines named as a set give one line for each; otherwise the line is read as it stands. */
export function readExpanded(talk: Talk, announced: Announced, to: number, before: Before): readonly ReadLineResult[] {
  const { candidate, from, to: until } = announced;
  const stretch = { announced, from: candidate.at, to };
  const many = (until ?? 0) - (from ?? 0) + 1;
  const copied = from === 1 && many > 1 ? copiesOfPiece(talk, announced, to, before) : null;
  if (copied !== null) return copied;
  const start = talk.sentences.isPunctuated ? talk.sentences.startOf[candidate.at]! : candidate.at - LEAD_REACH;
  const named = many > 1 ? linesNamed(talk.tokens, Math.max(0, candidate.at - 40, start), to, from ?? 0) : [];
  if (named.length < 2) return shapedOneByOne(talk, stretch, before);
  const lines = [...before.piece];
  const out: ReadLineResult[] = [];
  for (let n = 0; n < many; n++) {
    const model = lines.findLast(
      (line) =>
        line.from !== null && line.from <= named[n % named.length]! && named[n % named.length]! <= (line.to ?? 0),
    );
    if (model === undefined) return [readSpokenLine(talk, stretch, before)];
    const whole = readSpokenLine(talk, stretch, before);
    const line: ReadLineResult = {
      ...whole,
      ...asNowFits(model, lines.at(-1), !before.isRows),
      from: from! + n,
      to: from! + n,
      said: null,
      verdict: 'no-total',
      loops: model.loops,
      count: null,
    };
    lines.push(line);
    out.push(line);
  }
  return out;
}

/** How many lines told at once are read one by one. */
const MOST_TOLD_AT_ONCE = 40;

/** `rows four, five and six: two at each end and one in all between`: where every line shapes, each is its own. */
function shapedOneByOne(talk: Talk, stretch: Stretch, before: Before): readonly ReadLineResult[] {
  const { announced } = stretch;
  const { from, to } = announced;
  const whole = readSpokenLine(talk, stretch, before);
  const many = from === null || to === null ? 1 : to - from + 1;
  const grows =
    whole.base !== null && whole.count !== null && whole.count !== whole.base && whole.verdict !== 'does-not-fit';
  const isOpen = whole.used.some(
    (event) => event.type === 'ends' || event.type === 'around' || (event.type === 'unit' && event.fills),
  );
  if (many < 2 || many > MOST_TOLD_AT_ONCE || !grows || !isOpen || whole.said !== null) return [whole];
  const out: ReadLineResult[] = [];
  for (let n = from!; n <= to!; n++) {
    const one = { ...stretch, announced: { ...announced, from: n, to: n } };
    out.push(readSpokenLine(talk, one, { ...before, piece: [...before.piece, ...out] }));
  }
  return out.every((line) => line.verdict !== 'does-not-fit' && line.verdict !== 'unread') ? out : [whole];
}

/** `rounds one through five of the pot over again`: the first lines of an earlier piece, one by one. */
function copiesOfPiece(
  talk: Talk,
  { candidate, to: until }: Announced,
  to: number,
  before: Before,
): readonly ReadLineResult[] | null {
  if (!/\b(?:over again|as for|same as|as on|again|just like|like the)\b/.test(textOf(talk.tokens, candidate.at, to)))
    return null;
  const model = before.all.findLast(
    (lines) => lines.some((line) => line.from === 1) && (lines.at(-1)?.to ?? 0) >= until!,
  );
  if (model === undefined) return null;
  const lines = model.filter((line) => line.from !== null && line.to! <= until!);
  return lines.map((line) => ({ ...foundation(0), ...line, verdict: 'no-total', said: null, isRing: line.from === 1 }));
}

/** A line worked again on other stitches: as it was, or with its plain stretch as long as now fits. */
function asNowFits(model: ReadSoFar, last: ReadSoFar | undefined, isRing: boolean): ReadSoFar {
  if (last === undefined) return model;
  const bases = basesAfter(last, false);
  const may = { mayImply: false, mayLeave: false };
  const fitting = patternsOf(model)
    .flatMap((units) => resolve(units, bases, [], may))
    .find((one) => one.fit === 'fits');
  if (fitting === undefined) return model;
  const units = merged(fitting.units);
  return { ...model, units, base: fitting.base, left: countUnits(units, fitting.base, isRing).left };
}
