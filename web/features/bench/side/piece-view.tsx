import { useMemo } from 'react';
import { type Piece } from '#contract/rows';
import { RingMap } from '../../../parts/ring-map/ring-map.tsx';
import { Staff } from '../../../parts/ring-map/staff.tsx';
import { VERDICT_WORDS } from '../../../parts/verdict-mark.tsx';
import { pieceStitches } from '../desk/bench-count.ts';
import { knotLabel, lineName, spokenName } from '../desk/line-name.ts';
import { lineOf, useDesk } from '../desk/use-desk.ts';
import { ringLines } from './ring-lines.ts';

const MAP_PX = 214;

/** What the open piece's totals make, beside the list and never instead of it. */
export function PieceView({ piece }: { piece: Piece }) {
  const desk = useDesk();
  const { pattern, counts, lineId, pick, goTo } = desk;
  const lines = useMemo(() => pattern.lines.filter((line) => line.pieceId === piece.id), [pattern.lines, piece.id]);
  const rings = useMemo(() => ringLines(lines, counts, lineId), [lines, counts, lineId]);
  const line = lineOf(desk, lineId);
  const last = lines.findLast((one) => one.to !== null && one.from !== null);
  const stitches = pieceStitches(lines, counts);
  const hasUnread = rings.find((ring) => ring.verdict === 'unread');
  const isRows = piece.worked === 'rows';
  const rounds = rings.reduce((sum, ring) => sum + ring.counts.length, 0);
  const open = (id: string) => {
    pick(id, true);
    goTo(id);
  };
  const nameOf = (id: string) => {
    const one = lineOf(desk, id);
    const count = counts.get(id);
    const n = count?.count;
    const name = one ? spokenName(one) : '';
    return `${name.slice(0, 1).toUpperCase()}${name.slice(1)}${typeof n === 'number' ? `, ${n} stitches` : ''}, ${VERDICT_WORDS[count?.verdict ?? 'no-total']}`;
  };
  if (rings.length === 0)
    return <p className="px-3.5 py-4 text-walnut2">Nothing to draw yet: the map grows with the first round.</p>;
  const shared = {
    lines: rings,
    openId: line?.pieceId === piece.id ? lineId : null,
    onOpen: open,
    nameOf,
    name: `${piece.name}, ${rounds} ${isRows ? 'rows' : 'rounds'}`,
  };
  return (
    <section aria-label={`${piece.name}, drawn`} className="border-b border-rule px-3.5 pt-2 pb-2.5">
      <div className="flex items-baseline justify-between">
        <h3 className="h-panel">{piece.name}</h3>
        <span className="text-walnut2">
          {line?.pieceId === piece.id && lineName(line)
            ? `${lineName(line)} of ${last ? knotLabel(last).replace(/^\d+–/, '') : rounds}`
            : stitches !== null && `${stitches} stitches`}
        </span>
      </div>
      <div className="flex justify-center pt-1 pb-1.5">
        {isRows ? <Staff {...shared} width={286} /> : <RingMap {...shared} size={MAP_PX} />}
      </div>
      <p className="small leading-[17px]! text-walnut2">
        One dash is one stitch{hasUnread ? `; ${isRows ? 'row' : 'R'}${hasUnread.label} is tacked until it counts` : ''}
        . {isRows ? 'The first row is at the foot.' : 'Rings are in working order, not in size.'}
      </p>
    </section>
  );
}
