import type { LineKind } from '../count/input.ts';

interface Numbered {
  readonly kind: LineKind;
  readonly label: string;
  readonly from: number | null;
  readonly to: number | null;
}

/** "R5–8", "Row 1", "Rows 2–5", "R9 on" for an open range; what was typed where the line has no number. */
export function lineLabel({ kind, label, from, to }: Numbered): string {
  if (kind === 'step' || kind === 'note') return '';
  if (from === null || (kind !== 'round' && kind !== 'row')) return label;
  const several = to !== null && to > from;
  const numbers = several ? `${from}–${to}` : to === null ? `${from} on` : `${from}`;
  return kind === 'round' ? `R${numbers}` : `${several ? 'Rows' : 'Row'} ${numbers}`;
}

/** How many rounds or rows a line stands for; 1 for a step, a foundation, and where the end is open. */
export function roundsOf({ from, to }: Pick<Numbered, 'from' | 'to'>): number {
  return from !== null && to !== null && to > from ? to - from + 1 : 1;
}
