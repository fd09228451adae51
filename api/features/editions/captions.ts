import type { PublicEdition } from '#crochet';
import { AppError } from '../../http/problem.ts';

const two = (n: number) => String(n).padStart(2, '0');

/** "01:02:03.456", as WebVTT wants it. */
function cueTime(ms: number): string {
  const s = Math.floor(ms / 1000);
  const rest = String(ms % 1000).padStart(3, '0');
  return `${two(Math.floor(s / 3600))}:${two(Math.floor(s / 60) % 60)}:${two(s % 60)}.${rest}`;
}

/** A cue's words: what would end the cue or begin a tag is written as the format's own references. */
const cueText = (text: string) =>
  text
    .replace(/&/g, '&amp;')
    .replace(/</g, '&lt;')
    .replace(/>/g, '&gt;')
    .replace(/\s*\n\s*/g, '\n')
    .trim();

/**
 * The captions of one recording of an edition as WebVTT.
 * @throws AppError not-found where the edition has none for it
 */
export function captionFile(edition: PublicEdition, recordingNumber: number): string {
  const cues = edition.captions.filter((caption) => caption.recordingNumber === recordingNumber);
  if (cues.length === 0) throw new AppError('not-found');
  const blocks = cues.map(({ startMs, endMs, text }) => `${cueTime(startMs)} --> ${cueTime(endMs)}\n${cueText(text)}`);
  return `WEBVTT\n\n${blocks.join('\n\n')}\n`;
}
