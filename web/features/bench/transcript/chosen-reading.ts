import { readStretch, type StretchReading } from '#crochet';
import { type Line } from '#contract/rows';
import { isCounted } from '../desk/bench-count.ts';
import { type Desk, lineOf } from '../desk/use-desk.ts';
import { lastBegun } from './captions.ts';
import { type ChosenWords } from './choose-words.ts';

/** Places that the last round or row up to a line leaves; null where there is none, or it cannot be counted. */
function placesAfter(desk: Desk, line: Line | undefined): number | null {
  const own = desk.pattern.lines.filter(({ pieceId }) => pieceId === line?.pieceId);
  const upTo = own.slice(0, own.findIndex(({ id }) => id === line?.id) + 1);
  const last = upTo.findLast(({ kind }) => isCounted(kind));
  return (last && desk.counts.get(last.id)?.count) ?? null;
}

/** The line before in its piece. */
function lineBefore(desk: Desk, line: Line): Line | undefined {
  const own = desk.pattern.lines.filter(({ pieceId }) => pieceId === line.pieceId);
  return own[own.findIndex(({ id }) => id === line.id) - 1];
}

/**
 * What the chosen words would read: as the open line, else as a new one at its place in time. The server reads them the
 * same way when they are taken.
 */
export function readChosen(desk: Desk, words: ChosenWords): StretchReading | null {
  const { pattern, cues, captions, moments } = desk;
  const open = desk.isOpen ? lineOf(desk, desk.lineId) : undefined;
  const caption = captions.find(({ words: own }) => own.some(({ n }) => n >= words.firstWord));
  const mark = moments[lastBegun(moments, caption?.startMs ?? 0)];
  const before = open ? lineBefore(desk, open) : lineOf(desk, mark?.lineId ?? null);
  const piece = pattern.pieces.find(({ id }) => id === (open ?? before)?.pieceId) ?? pattern.pieces[0];
  const spoken = pattern.recordings.find(({ id }) => id === desk.recordingId)?.spokenTerms;
  return readStretch(cues, {
    ...words,
    unit: piece?.worked === 'rows' ? 'row' : 'round',
    base: placesAfter(desk, before),
    written: pattern.terms,
    ...(spoken && { spoken }),
  });
}
