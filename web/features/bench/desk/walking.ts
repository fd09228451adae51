import { lastBegun } from '../transcript/captions.ts';
import { wordsOfCaption } from '../transcript/choose-words.ts';
import { nextToLook } from './bench-count.ts';
import { focusLine } from './focus-line.ts';
import { heardSpan, mainMark } from './moments.ts';
import { type Desk } from './use-desk.ts';

/** The hand goes to the line above or below; an open line stays open on the way. */
export function walkLines(desk: Desk, way: 1 | -1): void {
  const { lines } = desk.pattern;
  const at = lines.findIndex((line) => line.id === desk.lineId);
  const next = at < 0 ? lines[way > 0 ? 0 : lines.length - 1] : lines[at + way];
  if (!next) return;
  desk.pick(next.id, desk.isOpen);
  if (!desk.isOpen) focusLine(next.id);
}

/** The playhead goes to the caption before or after the one that is spoken. */
export function walkCaptions(desk: Desk, way: 1 | -1): void {
  const { captions, player } = desk;
  const now = player.getState().positionMs;
  const at = lastBegun(captions, now);
  // A second press within the first second goes on to the one before, as everywhere a clip is played.
  const isJustBegun = now - (captions[at]?.startMs ?? 0) < 1000;
  const target = captions[way > 0 ? at + 1 : isJustBegun ? at - 1 : at];
  if (target) player.request({ kind: 'seek', toMs: target.startMs });
}

/** Opens the next line that wants a look, worst first, and goes to its moment. */
export function walkFaults(desk: Desk): void {
  const next = nextToLook(desk.pattern.lines, desk.counts, desk.lineId);
  if (!next) return;
  desk.pick(next, true);
  desk.goTo(next);
}

/** Plays what was said for the line in hand, and stops. */
export function hearLine(desk: Desk): void {
  if (!desk.lineId) return;
  const span = spanToHear(desk, desk.lineId);
  if (!span) return;
  desk.goTo(desk.lineId);
  desk.player.request({ kind: 'hear', span });
}

/** What `hearLine` would play. */
export const spanToHear = (desk: Desk, lineId: string) =>
  heardSpan(mainMark(desk.pattern.marks, lineId), desk.pattern.evidence, desk.moments, desk.lastMs);

/** Chooses the words of the caption that is spoken; buttons beside them move the ends. */
export function chooseSpoken(desk: Desk): void {
  const { captions, player, pattern } = desk;
  const caption = captions[Math.max(0, lastBegun(captions, player.getState().positionMs))];
  if (caption && pattern.mayEdit) desk.chooseWords(wordsOfCaption(caption));
}
