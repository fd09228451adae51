import { type Totals } from '#crochet';

/** The count's totals as the contract takes them. */
export const copyTotals = (totals: Totals | null): Record<string, number[]> | null =>
  totals && Object.fromEntries(Object.entries(totals).map(([kind, figures]) => [kind, [...figures]]));
