import { memo, useEffect, useRef, useState } from 'react';
import { type Row } from '../worker/protocol.ts';
import { type Chunk, isSameChunk, rowsIn, type Segment } from './chunks.ts';
import { LineRow } from './line-row.tsx';
import { OpenRow } from './open-row.tsx';

const ROW_PX = 33;
const SEEN_FROM = '800px';

interface ChunkProps {
  chunk: Chunk;
  /** Only where it lies in this chunk. */
  openId: string | null;
  /** The line that the Tab key stops at, if it lies here. */
  stopId: string | null;
  isPrinted: boolean;
  onPick: (lineId: string | null) => void;
}

const WORKED = { spiral: 'worked in a spiral', joined: 'worked in joined rounds', rows: 'worked in rows' } as const;

/** Name of a piece, how it is worked, how many stitches it has. A text without headings has one without a name. */
function PieceHead({ piece }: { piece: Segment['piece'] }) {
  if (piece.name === '' && piece.make === 1) return null;
  return (
    <div className="flex min-h-[40px] flex-wrap items-baseline gap-x-3 border-b border-feint px-3.5 pt-2">
      <h3 className="h-piece">{piece.name || 'Piece'}</h3>
      <span className="text-walnut2">
        make {piece.make}, {WORKED[piece.worked]}
      </span>
      {piece.stitches !== null && piece.stitches > 0 && (
        <span className="ml-auto text-walnut2">
          {piece.stitches} stitches{piece.make > 1 && ' each'}
        </span>
      )}
    </div>
  );
}

function Lines({ segment, ...props }: { segment: Segment } & Pick<ChunkProps, 'openId' | 'stopId' | 'onPick'>) {
  const { piece, from, to } = segment;
  const { openId, stopId, onPick } = props;
  return (
    <ol aria-label={piece.name || 'Lines'}>
      {piece.rows.slice(from, to).map((row: Row) => (
        <li key={row.id}>
          {row.id === openId ? (
            <OpenRow row={row} onClose={() => onPick(null)} />
          ) : (
            <LineRow row={row} isStop={row.id === stopId} onPick={onPick} />
          )}
        </li>
      ))}
    </ol>
  );
}

/** Some sixty lines, drawn only where they are seen; else their height is kept. */
export const LedgerChunk = memo(
  function LedgerChunk({ chunk, openId, stopId, isPrinted, onPick }: ChunkProps) {
    const root = useRef<HTMLDivElement>(null);
    const [isNear, setNear] = useState(false);
    const [height, setHeight] = useState<number | null>(null);
    const isDrawn = isNear || isPrinted || openId !== null;
    useEffect(() => {
      const element = root.current;
      if (!element) return undefined;
      const observer = new IntersectionObserver(
        ([entry]) => {
          if (!entry) return;
          if (!entry.isIntersecting && element.childElementCount > 0) setHeight(element.offsetHeight);
          setNear(entry.isIntersecting);
        },
        { rootMargin: SEEN_FROM },
      );
      observer.observe(element);
      return () => observer.disconnect();
    }, []);
    return (
      <div ref={root} style={isDrawn ? undefined : { height: height ?? rowsIn(chunk).length * ROW_PX }}>
        {isDrawn &&
          chunk.map((segment) => (
            <div key={segment.piece.id} role="group" aria-label={segment.piece.name || 'Pattern'}>
              {segment.from === 0 && <PieceHead piece={segment.piece} />}
              <Lines segment={segment} openId={openId} stopId={stopId} onPick={onPick} />
            </div>
          ))}
      </div>
    );
  },
  (a, b) =>
    isSameChunk(a.chunk, b.chunk) &&
    a.openId === b.openId &&
    a.stopId === b.stopId &&
    a.isPrinted === b.isPrinted &&
    a.onPick === b.onPick,
);
