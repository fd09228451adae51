import { type Line } from '#contract/rows';

type Named = Pick<Line, 'kind' | 'label' | 'from' | 'to'>;

/** The line's own number as it stands in its column: `R9`, `R5–8`, `R9 on` for an open range; its label where it has none. */
export function lineName({ kind, label, from, to }: Named): string {
  if (kind === 'foundation') return label || 'Chain';
  if (from === null || (kind !== 'round' && kind !== 'row')) return label;
  if (to === null) return `R${from} on`;
  return to > from ? `R${from}–${to}` : `R${from}`;
}

/** As a knot is labelled on the thread: the number alone. */
export const knotLabel = (line: Named): string => lineName(line).replace(/^R(?=\d)/, '');

/** As it is read out: "round 9", "rows 5 to 8". */
export function spokenName(line: Named): string {
  const { kind, from, to } = line;
  if (from === null || (kind !== 'round' && kind !== 'row')) return lineName(line) || kind;
  if (to === null) return `${kind} ${from} on`;
  return to > from ? `${kind}s ${from} to ${to}` : `${kind} ${from}`;
}

/** The number that a line added after `last` bears: one on from it. */
export const nextNumber = (last: Named | undefined): number => (last?.to ?? last?.from ?? 0) + 1;
