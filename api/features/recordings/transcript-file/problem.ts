import { type Cue } from '#crochet';

/** What was odd about a file, where, and what was done about it, in words for the person who uploaded it. */
export interface FileProblem {
  /** Counted from 1; 0 where it concerns the whole file. */
  readonly line: number;
  readonly what: string;
  readonly done: string;
}

/** A cue with the line of the file at which it begins, so that what is mended later can still be told by line. */
export interface CueAtLine extends Cue {
  readonly line: number;
}

export interface ReadCues {
  readonly cues: readonly CueAtLine[];
  readonly problems: readonly FileProblem[];
}
