import { Figures, TotalCell } from '../../parts/totals.tsx';
import { VerdictLabel } from '../../parts/verdict-mark.tsx';
import { workedFigure } from '../../parts/worked-figure.ts';
import { isCounted } from '../find-row.ts';
import { type Row } from '../worker/protocol.ts';

/** round | instruction ‖ written | worked out | verdict; where it is narrow the instruction has a line of its own. */
export const GRID = 'count-grid';

export function WrittenCell({ row }: { row: Row }) {
  return (
    <TotalCell voice="written" odd={row.odd.includes('written')} className="count-written double-before self-stretch">
      {(isCounted(row) || row.written) && <Figures totals={row.written} />}
    </TotalCell>
  );
}

export function WorkedCell({ row }: { row: Row }) {
  const figure = workedFigure(row);
  if (!isCounted(row)) return <span className="count-worked" />;
  const look = figure.isOdd ? 'text-[15px]!' : figure.text[0] === '?' ? 'text-walnut2' : '';
  return (
    <TotalCell voice="worked" odd={figure.isOdd} className={`count-worked ${look}`}>
      {figure.text.map((text) => (
        <span key={text} className="block">
          {text}
        </span>
      ))}
    </TotalCell>
  );
}

export function VerdictCell({ row }: { row: Row }) {
  if (!isCounted(row)) return <span className="count-verdict" />;
  return (
    <span className="count-verdict flex flex-wrap items-center gap-x-2.5 pl-3">
      <VerdictLabel verdict={row.verdict} follows={row.follows ?? undefined} />
      {row.asks.length > 0 && <span className="small rounded-2 bg-weldwash px-1.5 text-weld">asks</span>}
    </span>
  );
}
