import { type LineInput, type PatternInput, type PieceInput } from '../count/input.ts';

/** A line as the checks read it: beside what is counted, what stands round it. */
export interface CheckLine extends LineInput {
  readonly note: string;
  /** False where the creator says that the line is not in the recording. */
  readonly filmed: boolean;
  /** Why the line stays as it is although its totals do not agree; null where nothing was settled. */
  readonly putAsideReason: string | null;
}

export interface CheckPiece extends PieceInput {
  readonly lines: readonly CheckLine[];
}

export interface CheckMaterial {
  readonly kind: 'yarn' | 'hook' | 'notion' | 'filling';
  readonly name: string;
  readonly details: {
    readonly amount?: string | undefined;
    readonly colour?: string | undefined;
    /** Yarn weight, 0 lace to 7 jumbo. */
    readonly weight?: number | undefined;
    readonly sizeMm?: number | undefined;
  };
}

/** A moment of a line; times in milliseconds from the start of its recording. */
export interface CheckMark {
  readonly id: string;
  readonly lineId: string | null;
  readonly recordingId: string;
  readonly startMs: number;
  readonly endMs: number | null;
  readonly main: boolean;
}

export type CheckUse = 'hot' | 'carried' | 'sleep' | 'chewed' | 'pet';

/** Everything of a pattern that the checks look at, every list in its order. */
export interface CheckSource extends PatternInput {
  readonly title: string;
  readonly pieces: readonly CheckPiece[];
  readonly details: {
    readonly introduction: string;
    readonly gauge: string;
    readonly finishedSize: string;
    readonly level: string | null;
    readonly uses: readonly CheckUse[];
  };
  readonly materials: readonly CheckMaterial[];
  readonly notes: readonly { readonly text: string }[];
  /** Cautions as printed; `id` is null for one in the usual words. */
  readonly cautions: readonly { readonly id: string | null; readonly kind: string; readonly text: string }[];
  readonly marks: readonly CheckMark[];
  readonly recordings: readonly {
    readonly id: string;
    readonly title: string;
    readonly durationMs: number | null;
  }[];
}
