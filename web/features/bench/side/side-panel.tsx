import { type ReactNode, useState } from 'react';
import { type Piece } from '#contract/rows';
import { cx } from '../../../lib/class-names.ts';
import { PatternPrint } from '../../../parts/pattern-print.tsx';
import { lineOf, useDesk } from '../desk/use-desk.ts';
import { PieceView } from './piece-view.tsx';
import { ringLines } from './ring-lines.ts';

/** What can be seen of it: the clip, under it what the totals make, at the foot the other pieces. */
export function SidePanel({ clip }: { clip: ReactNode }) {
  const desk = useDesk();
  const { pattern } = desk;
  const [chosen, setChosen] = useState<{ pieceId: string; atLine: string | null } | null>(null);
  // The drawing follows the line in hand; another piece chosen here stays until the hand goes on.
  const ofLine = lineOf(desk, desk.lineId)?.pieceId;
  const wanted = chosen?.atLine === desk.lineId ? chosen.pieceId : ofLine;
  const piece = pattern.pieces.find((one) => one.id === wanted) ?? pattern.pieces[0];
  return (
    <aside
      aria-label="Clip and shape"
      className="flex min-h-0 min-w-0 flex-col overflow-y-auto lg:border-l lg:border-rule"
    >
      {clip}
      {piece && <PieceView piece={piece} />}
      <div className="grow" />
      {piece && pattern.pieces.length > 1 && (
        <ul
          aria-label="Pieces"
          className="grid flex-none auto-cols-[minmax(88px,1fr)] grid-flow-col overflow-x-auto border-t border-rule"
        >
          {pattern.pieces.map((one) => (
            <li key={one.id} className="not-first:border-l not-first:border-feint">
              <PieceTab
                piece={one}
                isShown={one.id === piece.id}
                onShow={() => setChosen({ pieceId: one.id, atLine: desk.lineId })}
              />
            </li>
          ))}
        </ul>
      )}
    </aside>
  );
}

function PieceTab({ piece, isShown, onShow }: { piece: Piece; isShown: boolean; onShow: () => void }) {
  const { pattern, counts } = useDesk();
  const lines = ringLines(
    pattern.lines.filter((line) => line.pieceId === piece.id),
    counts,
    null,
  );
  const totals = lines.flatMap((line) => line.counts.map((n) => n ?? 0));
  return (
    <button
      type="button"
      aria-pressed={isShown}
      onClick={onShow}
      className={cx(
        'flex h-[82px] w-full flex-col items-center justify-center gap-1 focus-visible:outline-offset-[-2px]',
        isShown ? 'bg-woadwash shadow-[inset_0_3px_var(--color-woad)]' : 'hover:bg-hover',
      )}
    >
      <PatternPrint
        of={totals.some((n) => n > 0) ? { form: piece.worked === 'rows' ? 'rows' : 'rings', totals } : null}
        size={46}
      />
      <span className={cx('max-w-full truncate px-1', isShown && 'font-bold text-woad')}>
        {piece.name} {piece.make > 1 && <span className="small font-normal text-walnut2">make {piece.make}</span>}
      </span>
    </button>
  );
}
