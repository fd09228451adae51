import type { LineText } from '#crochet';

type Named = Pick<LineText, 'kind' | 'label' | 'from' | 'to'>;

/** `R5–8`, `Row 3`; the label as written where there is no number. */
export function nameOf({ kind, label, from, to }: Named): string {
  if (kind === 'foundation') return label || 'Chain';
  if (from === null || (kind !== 'round' && kind !== 'row')) return label;
  const R = kind === 'row' ? 'Row ' : 'R';
  if (to === null) return `${R}${from} on`;
  return to > from ? `${R}${from}–${to}` : `${R}${from}`;
}

/** As it is read out. */
export function spokenNameOf(line: Named): string {
  const { kind, from, to } = line;
  if (from === null || (kind !== 'round' && kind !== 'row')) return nameOf(line) || kind;
  const word = kind === 'row' ? 'row' : 'round';
  if (to === null) return `${word} ${from} on`;
  return to > from ? `${word}s ${from} to ${to}` : `${word} ${from}`;
}
