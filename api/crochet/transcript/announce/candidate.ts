/** A place where a line of the pattern may be announced, with how surely; the chain decides which of them are. */
export interface Candidate {
  readonly kind: 'line' | 'foundation';
  /** Token at which its first words stand, and the token after its numbers. */
  readonly at: number;
  readonly end: number;
  /** Token at which its numbers begin: from there to `end` nothing is instruction. */
  readonly mark: number;
  readonly unit: 'round' | 'row' | null;
  /** The lines named, or how many follow the line before, or the last line that is reached. */
  readonly lines:
    | { readonly type: 'named'; readonly from: number; readonly to: number }
    | { readonly type: 'next'; readonly many: number }
    | { readonly type: 'until'; readonly last: number }
    | { readonly type: 'chain'; readonly n: number };
  readonly strength: number;
  /** Only right after a starting chain (`slip stitch in the second chain …`) or where a piece begins. */
  readonly needs: 'chain' | 'start' | null;
}
