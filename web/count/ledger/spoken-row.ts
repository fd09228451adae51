import type { Totals } from '#crochet';
import { totalLines } from '../../parts/totals.tsx';
import { VERDICT_WORDS } from '../../parts/verdict-mark.tsx';
import { isCounted } from '../find-row.ts';
import { type Row } from '../worker/protocol.ts';

const say = (name: string, totals: Totals | null) => (totals ? [`${name} ${totalLines(totals).join(', ')}`] : []);

/** A line of the ledger as a screen reader says it. */
export function spokenRow(row: Row): string {
  const parts = [row.spoken, row.text];
  if (!isCounted(row)) return parts.join(', ');
  parts.push(...say('written', row.written));
  if (row.count !== null) parts.push(`worked out ${row.count}`);
  parts.push(row.message ?? (row.follows ? `follows ${row.follows}` : VERDICT_WORDS[row.verdict]));
  if (row.asks.length > 0) parts.push('has a question');
  return parts.join(', ').replace(/\s*[×]\s*/g, ' times ');
}
