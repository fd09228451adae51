import { readStretch, type StretchReading } from '#crochet';
import { type Line } from '#contract/rows';
import { isCounted } from '../desk/bench-count.ts';
import { type Desk, lineOf } from '../desk/use-desk.ts';
import { lastBegun } from './captions.ts';
import { type ChosenWords } from './choose-words.ts';

/** What of the desk the reading of chosen words depends on; the desk itself is new with every moment of the clip. */
export type Scene = Pick<
  Desk,
  'pattern' | 'counts' | 'cues' | 'captions' | 'moments' | 'recordingId' | 'lineId' | 'isOpen'
>;

/** Places that the last round or row up to a line leaves; null where there is none, or it cannot be counted. */
function placesAfter(scene: Scene, line: Line | undefined): number | null {
  const own = scene.pattern.lines.filter(({ pieceId }) => pieceId === line?.pieceId);
  const upTo = own.slice(0, own.findIndex(({ id }) => id === line?.id) + 1);
  const last = upTo.findLast(({ kind }) => isCounted(kind));
  return (last && scene.counts.get(last.id)?.count) ?? null;
}

/** The line before in its piece. */
function lineBefore(scene: Scene, line: Line): Line | undefined {
  const own = scene.pattern.lines.filter(({ pieceId }) => pieceId === line.pieceId);
  return own[own.findIndex(({ id }) => id === line.id) - 1];
}

/**
 * What the chosen words would read: as the open line, else as a new one at its place in time. The server reads them the
 * same way when they are taken.
 */
export function readChosen(scene: Scene, words: ChosenWords): StretchReading | null {
  const { pattern, cues, captions, moments } = scene;
  const open = scene.isOpen ? lineOf(scene, scene.lineId) : undefined;
  const caption = captions.find(({ words: own }) => own.some(({ n }) => n >= words.firstWord));
  const mark = moments[lastBegun(moments, caption?.startMs ?? 0)];
  const before = open ? lineBefore(scene, open) : lineOf(scene, mark?.lineId ?? null);
  const piece = pattern.pieces.find(({ id }) => id === (open ?? before)?.pieceId) ?? pattern.pieces[0];
  const spoken = pattern.recordings.find(({ id }) => id === scene.recordingId)?.spokenTerms;
  return readStretch(cues, {
    ...words,
    unit: piece?.worked === 'rows' ? 'row' : 'round',
    base: placesAfter(scene, before),
    written: pattern.terms,
    ...(spoken && { spoken }),
  });
}
