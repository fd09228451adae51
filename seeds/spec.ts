import type { PatternEdit } from '../api/contract/patterns.ts';
import type { MaterialCreate } from '../api/contract/pattern-details.ts';

/** A line as the demo wants it to stand. */
export interface LineSpec {
  readonly kind: 'foundation' | 'round' | 'row' | 'step';
  /** Numbers of a round or row; `to` where it is a range. */
  readonly from?: number;
  readonly to?: number;
  readonly text: string;
  /** The written total: stitches of the line, of each round in a range. */
  readonly total?: number;
  readonly note?: string;
  /** How the caption begins in which it is announced; gives a line that no reading found its moment. */
  readonly heard?: string;
  /** What was meant, where the speaker made a slip that is left as it is. */
  readonly spokenSlip?: string;
  /** Why it goes out although its totals are not equal. */
  readonly putAsideReason?: string;
}

export interface PieceSpec {
  readonly name: string;
  readonly make: number;
  readonly worked: 'spiral' | 'joined' | 'rows';
  readonly lines: readonly LineSpec[];
}

export interface RecordingSpec {
  readonly title: string;
  /** File of the transcript in `clips`. */
  readonly transcript: string;
  /** File of the clip in `clips`; or where it stands elsewhere. */
  readonly clip?: string;
  readonly publicUrl?: string;
  readonly publicOffsetMs?: number;
}

export interface PatternSpec {
  readonly id: string; // uuid, so that putting the demo in again finds it
  readonly title: string;
  readonly recordings?: readonly RecordingSpec[];
  readonly pieces: readonly PieceSpec[];
  readonly details: NonNullable<PatternEdit['details']>;
  readonly materials: readonly MaterialCreate[];
  readonly notes: readonly string[];
}

/** The usual name of a line: R9, R5–8, Row 1; steps have none. */
export function labelOf({ kind, from, to }: LineSpec): string {
  if (from === undefined) return '';
  const numbers = to === undefined || to === from ? String(from) : `${from}–${to}`;
  if (kind === 'round') return `R${numbers}`;
  return to === undefined || to === from ? `Row ${numbers}` : `Rows ${numbers}`;
}
