/** One timed stretch of a transcript: what was said between two moments of the recording, in milliseconds. */
export interface Cue {
  readonly startMs: number;
  readonly endMs: number;
  readonly text: string;
}
