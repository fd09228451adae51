import type { View } from './scenes.ts';

/** One caption of a film: what is said, what is shown meanwhile, and how long the hands go on in silence afterwards. */
export interface Shot {
  readonly say: string;
  readonly view: View;
  readonly pause?: number; // seconds; 0.8 where it is left out
}

/** A film of the demo. Its captions become the transcript, word for word. */
export interface Story {
  readonly name: string; // of the files it becomes
  readonly shots: readonly Shot[];
}

type Piece = Extract<View, { show: 'round' }>['piece'];

/**
 * The captions of one round, its stitches spread evenly over them.
 * @param pause seconds of silent work after the last of them
 */
export function roundOf(piece: Piece, round: number, says: readonly string[], pause = 2.6): Shot[] {
  return says.map((say, i) => ({
    say,
    view: { show: 'round', piece, round, from: i / says.length, to: (i + 1) / says.length },
    ...(i === says.length - 1 && { pause }),
  }));
}
