import { type Unit } from '../work/units.ts';

/** What a spoken phrase comes to, before it is known how the phrases of a line belong together. */
export type Event = {
  /** Token index at which it stands, and the sentence it is in. */
  readonly at: number;
  readonly end: number;
  readonly sentence: number;
} & (
  | {
      readonly type: 'unit';
      readonly options: readonly (readonly Unit[])[];
      readonly fills: boolean;
      /** The number is reached with what came before: `until you have fourteen`. */
      readonly reaches: boolean;
      /** Said to explain what went before: `so that's your chain three plus eleven more`. */
      readonly explains: boolean;
      /** Worked into the place of what went before: `a treble in the same stitch`. */
      readonly same: boolean;
    }
  | {
      readonly type: 'number';
      readonly n: number;
      readonly asTotal: number;
      readonly asItem: number;
      readonly asTimes: number;
    }
  | {
      readonly type: 'times';
      readonly n: number;
      /** Told as what it came to: `so that's your four lots`. */
      readonly explains: boolean;
    }
  | { readonly type: 'around' | 'oneplace' | 'corner' | 'here' | 'again' | 'plain' | 'correction' | 'edge' }
  /** The same at both ends of the line. */
  | { readonly type: 'ends'; readonly unit: Unit }
  /** All of the line in short: corner and side in turn; null is the corner. */
  | { readonly type: 'cycle'; readonly items: readonly (Unit | null)[] }
);

/** What stitch a bare number, an increase or a decrease is worked in. */
export const BARE = '?';

/** What a phrase works, where it is a single thing and can be taken in one way. */
export const only = (event: Event | undefined): Unit | undefined =>
  event?.type === 'unit' && event.options[0]!.length === 1 ? event.options[0]![0] : undefined;
