/** A yarn weight of the trade. Figures are what is usual and no rule: a gauge outside them is no fault. */
export interface YarnWeight {
  readonly number: number;
  readonly name: string;
  /** Single crochet over 4 inches (10 cm), fewest and most; lace is measured in double crochet. */
  readonly stitches: readonly [fewest: number, most: number];
  readonly measuredIn: 'sc' | 'dc';
  /** Regular hooks in millimetres, smallest and largest; null where there is no largest. */
  readonly hookMm: readonly [smallest: number, largest: number | null];
}

/** Yarn weights by their number, 0 to 7. */
export const YARN_WEIGHTS: readonly YarnWeight[] = [
  { number: 0, name: 'lace', stitches: [32, 42], measuredIn: 'dc', hookMm: [1.4, 2.25] },
  { number: 1, name: 'super fine', stitches: [21, 32], measuredIn: 'sc', hookMm: [2.25, 3.5] },
  { number: 2, name: 'fine', stitches: [16, 20], measuredIn: 'sc', hookMm: [3.5, 4.5] },
  { number: 3, name: 'light', stitches: [12, 17], measuredIn: 'sc', hookMm: [4.5, 5.5] },
  { number: 4, name: 'medium', stitches: [11, 14], measuredIn: 'sc', hookMm: [5.5, 6.5] },
  { number: 5, name: 'bulky', stitches: [8, 11], measuredIn: 'sc', hookMm: [6.5, 9] },
  { number: 6, name: 'super bulky', stitches: [7, 9], measuredIn: 'sc', hookMm: [9, 15] },
  { number: 7, name: 'jumbo', stitches: [1, 6], measuredIn: 'sc', hookMm: [15, null] },
];

/** "light" for 3; empty for a number that is no weight. */
export const weightName = (number: number): string => YARN_WEIGHTS[number]?.name ?? '';
