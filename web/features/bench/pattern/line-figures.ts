import { type LineCount, type Totals } from '#crochet';
import { type Line } from '#contract/rows';
import { totalLines } from '../../../parts/totals.tsx';
import { VERDICT_WORDS } from '../../../parts/verdict-mark.tsx';
import { spokenName } from '../desk/line-name.ts';

/** The whole line as a screen reader says it. */
export function spokenLine(line: Line, count: LineCount | undefined, follows: string | undefined): string {
  const say = (name: string, totals: Totals | null) => (totals ? [`${name} ${totalLines(totals).join(', ')}`] : []);
  const parts = [spokenName(line), line.text || 'nothing written yet'];
  if (!count) return parts.join(', ');
  parts.push(...say('said', count.said), ...say('written', count.written));
  if (count.count !== null) parts.push(`worked out ${count.count}`);
  parts.push(count.message ?? (follows ? `follows ${follows}` : VERDICT_WORDS[count.verdict]));
  return parts.join(', ').replace(/\s*×\s*/g, ' times ');
}
