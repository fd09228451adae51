import { useMemo } from 'react';
import type { RingLine } from '#crochet/shape';
import { useWidth } from '../lib/use-width.ts';
import { RingMap } from '../parts/ring-map/ring-map.tsx';
import { Staff } from '../parts/ring-map/staff.tsx';
import { VERDICT_WORDS } from '../parts/verdict-mark.tsx';
import { useDesk } from './use-desk.ts';
import { type PieceRows } from './worker/protocol.ts';

const LARGEST_PX = 300;
const MARGIN_PX = 32;
/** More rings than these are no drawing any more: those near the open one are drawn. */
const MOST_RINGS = 150;
const MOST_ROWS = 60;

/** The lines near the one in hand, as many as can be drawn. */
function nearOpen(lines: readonly RingLine[], openId: string | null, most: number): readonly RingLine[] {
  if (lines.length <= most) return lines;
  const at = Math.max(
    0,
    lines.findIndex((line) => line.id === openId),
  );
  const from = Math.max(0, Math.min(lines.length - most, at - Math.floor(most / 2)));
  return lines.slice(from, from + most);
}

function Drawing({ piece, lines }: { piece: PieceRows; lines: readonly RingLine[] }) {
  const { open, pick } = useDesk();
  const [measure, width] = useWidth();
  const openId = open?.row.id ?? null;
  const isRows = piece.worked === 'rows';
  const shown = useMemo(() => nearOpen(lines, openId, isRows ? MOST_ROWS : MOST_RINGS), [lines, openId, isRows]);
  const size = Math.min(LARGEST_PX, width - MARGIN_PX);
  const rings = lines.reduce((sum, line) => sum + line.counts.length, 0);
  const nameOf = (id: string) => {
    const row = piece.rows.find((one) => one.id === id);
    if (!row) return '';
    const name = `${row.spoken.slice(0, 1).toUpperCase()}${row.spoken.slice(1)}`;
    return `${name}${row.count === null ? '' : `, ${row.count} stitches`}, ${VERDICT_WORDS[row.verdict]}`;
  };
  const shared = {
    lines: shown,
    openId,
    name: `${piece.name || 'The piece'}, ${rings} ${isRows ? 'rows' : 'rounds'}`,
    nameOf,
    onOpen: (id: string) => pick(id, true),
  };
  return (
    <div ref={measure}>
      <div className="flex justify-center px-4 pt-1 pb-2">
        {size > 0 && (isRows ? <Staff {...shared} width={size} /> : <RingMap {...shared} size={size} />)}
      </div>
      <p className="small px-4 pb-3 text-walnut2">
        One dash is one stitch. {isRows ? 'The first row is at the foot.' : 'Rings are in working order, not in size.'}
        {shown.length < lines.length && ` Drawn: the ${shown.length} lines about the open one.`}
      </p>
    </div>
  );
}

/** What the totals make: the ring map of a piece in rounds, the staff of one in rows; and the way to the other pieces. */
export function SidePanel() {
  const { counting, open, pick } = useDesk();
  const pieces = counting.result?.pieces ?? [];
  const pieceId = open?.pieceId ?? pieces[0]?.id;
  const piece = pieces.find(({ id }) => id === pieceId)?.rows;
  const lines = counting.drawn && counting.drawn.pieceId === pieceId ? counting.drawn.lines : [];
  return (
    <section
      aria-labelledby="drawn-heading"
      className="count-side flex min-h-0 flex-col border-rule bg-chalk lg:border-l"
    >
      <div className="panel-head gap-x-3 px-4!">
        <h2 id="drawn-heading" className="h-panel min-w-0 truncate">
          {piece === undefined || piece.name === '' ? 'Drawn' : piece.name}
        </h2>
        {typeof piece?.stitches === 'number' && piece.stitches > 0 && (
          <span className="ml-auto whitespace-nowrap text-walnut2">{piece.stitches} stitches</span>
        )}
      </div>
      <div className="count-scroll min-h-0 grow overflow-y-auto pt-2">
        {piece && lines.length > 0 ? (
          <Drawing piece={piece} lines={lines} />
        ) : (
          <p className="px-4 py-3 text-walnut2">
            The drawing grows with the first round: one ring a round, one dash a stitch.
          </p>
        )}
        {pieces.length > 1 && (
          <label className="block px-4 pb-4 print:hidden">
            <span className="label">Piece</span>
            <select
              className="field max-sm:h-11!"
              value={pieceId}
              onChange={({ target }) => {
                const first = pieces.find(({ id }) => id === target.value)?.rows.rows[0];
                if (first) pick(first.id, true);
              }}
            >
              {pieces.map(({ id, rows }, i) => (
                <option key={id} value={id}>
                  {rows.name || `Piece ${i + 1}`}
                  {rows.make > 1 ? `, make ${rows.make}` : ''}
                </option>
              ))}
            </select>
          </label>
        )}
      </div>
    </section>
  );
}
