import { type Terms } from '../span.ts';
import { type Totals } from '../language/tree.ts';
import { type Verdict } from '../count/result.ts';
import { type Unit } from './work/units.ts';

/** Words of the transcript that a line was drafted from, by their part in it. */
export interface Evidence {
  readonly role: 'announcement' | 'work' | 'total' | 'unread';
  /** Indices of the first and the last word, over the whole transcript. */
  readonly firstWord: number;
  readonly lastWord: number;
  readonly startMs: number;
  readonly endMs: number;
  readonly words: string;
}

/** How sure the reading of a line is, which says what to look at first. */
export type Confidence = 'sure' | 'look' | 'ask';

export interface DraftLine {
  readonly kind: 'foundation' | 'round' | 'row' | 'step';
  readonly label: string;
  readonly from: number | null;
  readonly to: number | null;
  /** The instruction in shorthand, in house style; for a step the words themselves. */
  readonly text: string;
  readonly said: Totals | null;
  readonly startMs: number;
  readonly endMs: number;
  readonly evidence: readonly Evidence[];
  /** What was said and not understood. */
  readonly unread: { readonly quote: string; readonly atMs: number } | null;
  readonly confidence: Confidence;
  readonly verdict: Verdict;
  readonly count: number | null;
  readonly loops: 'both' | 'back' | 'front';
  readonly units: readonly Unit[];
  /** For a step: stuff, eyes, finish, sew … */
  readonly topic: string | null;
}

export interface DraftPiece {
  readonly name: string;
  readonly make: number;
  readonly worked: 'spiral' | 'joined' | 'rows';
  readonly lines: readonly DraftLine[];
}

export interface Suggestion {
  readonly kind: 'hook' | 'yarn' | 'notion' | 'caution' | 'technique' | 'gauge';
  readonly text: string;
  readonly atMs: number;
}

export interface WordCorrection {
  readonly firstWord: number;
  readonly lastWord: number;
  readonly heard: string;
  readonly meant: string;
  readonly atMs: number;
}

/** A pattern drafted from a transcript, with everything uncertain shown. */
export interface Draft {
  readonly terms: Terms;
  readonly termsReason: string;
  readonly pieces: readonly DraftPiece[];
  readonly suggestions: readonly Suggestion[];
  /** Mis-heard trade words, to be taken into the captions. */
  readonly corrections: readonly WordCorrection[];
  /** Set where the transcript does not seem to be English crochet talk: nothing could be drafted. */
  readonly notice: string | null;
}
