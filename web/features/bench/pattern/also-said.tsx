import { type LineCount } from '#crochet';
import { type Line } from '#contract/rows';
import { totalLines } from '../../../parts/totals.tsx';
import { useDesk } from '../desk/use-desk.ts';

const sameTotals = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);

/** What stands beside the count: a question it has, the figure it offers where nobody gave one, what was heard before it was corrected. */
export function AlsoSaid({ line, count }: { line: Line; count: LineCount | undefined }) {
  const { pattern, bench } = useDesk();
  const offered = count?.verdict === 'no-total' ? count.count : null;
  const wasCorrected = line.heardTotal !== null && !sameTotals(line.heardTotal, line.said);
  const asks = count?.asks ?? [];
  if (offered === null && !wasCorrected && asks.length === 0) return null;
  return (
    <div className="flex flex-wrap items-baseline gap-x-3.5 gap-y-1 py-1.5 text-walnut2">
      {asks.map((ask) => (
        <span key={ask.text}>{ask.text}</span>
      ))}
      {offered !== null && pattern.mayEdit && (
        <span>
          Worked out, <b className="text-walnut">{offered}</b>.{' '}
          <button type="button" className="link" onClick={() => bench.setWritten(line.id, { sts: [offered] })}>
            Write {offered}
          </button>
        </span>
      )}
      {wasCorrected && line.heardTotal && (
        <span>
          Heard <span className="said tn">{totalLines(line.heardTotal).join(', ')}</span>.{' '}
          {pattern.mayEdit && (
            <button
              type="button"
              className="link"
              onClick={() => bench.edit('line', line.id, { said: line.heardTotal })}
            >
              As it was heard
            </button>
          )}
        </span>
      )}
    </div>
  );
}
