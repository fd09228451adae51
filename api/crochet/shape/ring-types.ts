import { type Verdict } from '../count/result.ts';

/** A line worked in rounds, as the map needs it. */
export interface RingLine {
  readonly id: string;
  /** The number of its last round, as it stands in the seam. */
  readonly label: string;
  /** Stitches of each of its rounds; null where they cannot be counted. A range has several. */
  readonly counts: readonly (number | null)[];
  readonly verdict: Verdict;
  /** One entry a stitch of one round, in order: the places of the round before that it stands on. */
  readonly walk: readonly { readonly on: readonly number[]; readonly makes: number }[];
  readonly isDone: boolean;
}

export type RingState = 'done' | 'now' | 'to-come' | 'differs' | 'does-not-fit' | 'unread';

export interface Ring {
  readonly lineId: string;
  readonly key: string;
  readonly state: RingState;
  readonly isOpen: boolean;
  /** Inner edge and width of the band; the hit area. */
  readonly inner: number;
  readonly band: number;
  readonly stroke: number;
  /** SVG path data of the dashes, one a stitch, and of the stems of increases and decreases. */
  readonly dashes: string;
  readonly stems: string;
  readonly stemStroke: number;
  readonly label: { readonly text: string; readonly size: number } | null;
  readonly mark: { readonly verdict: Verdict; readonly size: number } | null;
  /** Distance of the dashes from the heart; label and mark stand there in the seam. */
  readonly radius: number;
}

export interface RingMapGeometry {
  readonly size: number;
  readonly heart: number;
  readonly rings: readonly Ring[];
}

export interface RingOptions {
  /** Edge of the square in px. */
  readonly size: number;
  readonly openId: string | null;
  /** How much wider the open ring's band is: 2.6 bench, 3.2 watch, 4 phone. */
  readonly openWeight?: number;
  /** Left-handed work grows the other way round. */
  readonly isMirrored?: boolean;
}
