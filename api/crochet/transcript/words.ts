import { type Cue } from './cue.ts';

/** One spoken word with its moment, and the mark or the silence that parts it from its neighbours. */
export interface Word {
  readonly text: string;
  readonly startMs: number;
  readonly endMs: number;
  /** The mark that follows: a full stop stands for every mark that ends a sentence, a comma for every lesser one. */
  readonly mark: '' | ',' | '.';
  /** Silence before the word, in milliseconds, as far as the cues show it. */
  readonly silenceMs: number;
  /** Which cue it is from; the words of a paragraph have only roughly their own time. */
  readonly cue: number;
  readonly isInParagraph: boolean;
}

/** Nobody speaks slower than this for long, in characters a second; longer times hold a silence. */
const SLOWEST = 11;
const FASTEST = 15;
/** Cues of more characters or longer than this are paragraphs, whose times run across silences. */
const PARAGRAPH = 160;
const PARAGRAPH_MS = 12_000;

/**
 * Splits cues into words and gives each a time: its cue's start plus its share of the cue by length, but never slower
 * than people speak, so that a silence at the end of a cue does not stretch the words before it.
 */
export function wordsOf(cues: readonly Cue[]): readonly Word[] {
  const paragraphRate = speakingRate(cues);
  const words: Word[] = [];
  let spokenUntil: number | null = null;
  cues.forEach((cue, index) => {
    const texts = cue.text.split(/\s+/).filter((text) => /[\p{L}\p{N}]/u.test(text));
    const length = texts.reduce((sum, text) => sum + text.length + 1, 0);
    const isInParagraph = isParagraph(cue);
    const rate = isInParagraph ? paragraphRate : SLOWEST;
    const lasts = Math.min(cue.endMs - cue.startMs, (length * 1000) / rate);
    let passed = 0;
    for (const text of texts) {
      const startMs = Math.round(cue.startMs + (lasts * passed) / length);
      passed += text.length + 1;
      const endMs = Math.round(cue.startMs + (lasts * passed) / length);
      const silenceMs = spokenUntil === null ? 0 : Math.max(0, startMs - spokenUntil);
      words.push({
        text,
        startMs,
        endMs,
        mark: markAfter(text),
        silenceMs,
        cue: index,
        isInParagraph,
      });
      spokenUntil = endMs;
    }
  });
  return words;
}

const isParagraph = (cue: Cue): boolean => cue.text.length > PARAGRAPH || cue.endMs - cue.startMs > PARAGRAPH_MS;

/** Paragraphs without a silence show how fast a person speaks: nearly the fastest of them, within what people can. */
function speakingRate(cues: readonly Cue[]): number {
  const rates = cues
    .filter((cue) => cue.text.length > PARAGRAPH)
    .map((cue) => (cue.text.length * 1000) / Math.max(1, cue.endMs - cue.startMs))
    .sort((a, b) => a - b);
  const rate = rates[Math.floor(rates.length * 0.85)] ?? SLOWEST;
  return Math.min(FASTEST, Math.max(SLOWEST, rate));
}

function markAfter(text: string): Word['mark'] {
  if (/[.!?…]["'”’)\]]*$/.test(text)) return '.';
  return /[,;:–—]["'”’)\]]*$/.test(text) ? ',' : '';
}
