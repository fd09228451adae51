import { useNavigate } from 'react-router-dom';
import type { PieceDifference } from '#contract/readings';
import type { ReadingPiece } from '#contract/recordings';
import { paths } from '../../lib/paths.ts';
import { PatternPrint } from '../../parts/pattern-print.tsx';
import { RingMap } from '../../parts/ring-map/ring-map.tsx';
import { Staff } from '../../parts/ring-map/staff.tsx';
import { VERDICT_WORDS, VerdictMark } from '../../parts/verdict-mark.tsx';
import { Button } from '../../ui/button.tsx';
import { pieceWords } from './draft-words.ts';

const MAP_PX = 112;
/** More rows than this grow taller than the words beside them: they are shown as the shelf shows them. */
const MOST_ROWS = 24;

/** The piece as its totals make it; a ring leads to the bench. */
function PieceMap({ patternId, piece }: { patternId: string; piece: ReadingPiece }) {
  const navigate = useNavigate();
  const unit = piece.worked === 'rows' ? 'Row' : 'Round';
  const lines = piece.rings.map(({ label, counts, verdict }, i) => ({
    id: String(i),
    label: label.replace(/^\d+–/, ''),
    counts,
    verdict,
    walk: [],
    isDone: true,
  }));
  const totals = piece.rings.flatMap(({ counts }) => counts.map((count) => count ?? 0));
  if (piece.worked === 'rows' && totals.length > MOST_ROWS)
    return <PatternPrint of={{ form: 'rows', totals }} size={MAP_PX} />;
  if (lines.length === 0) return <span className="small text-walnut2">No rounds to draw.</span>;
  const nameOf = (id: string) => {
    const ring = piece.rings[Number(id)];
    const count = ring?.counts.at(-1);
    const stitches = typeof count === 'number' ? `, ${count} stitches` : '';
    return `${unit} ${ring?.label ?? ''}${stitches}, ${VERDICT_WORDS[ring?.verdict ?? 'no-total']}`;
  };
  const shared = {
    lines,
    openId: null,
    name: pieceWords(piece),
    nameOf,
    onOpen: () => void navigate(paths.bench(patternId)),
  };
  return piece.worked === 'rows' ? <Staff {...shared} width={MAP_PX} /> : <RingMap {...shared} size={MAP_PX} />;
}

function Verdicts({ piece }: { piece: ReadingPiece }) {
  const agree = piece.rings.filter(({ verdict }) => verdict === 'agrees').length;
  const look = piece.rings.length - agree;
  return (
    <p className="mt-0.5 flex flex-wrap items-center gap-x-3 text-walnut2">
      {agree > 0 && (
        <span className="inline-flex items-center gap-1.5 text-moss">
          <VerdictMark verdict="agrees" />
          {agree} {agree === 1 ? 'agrees' : 'agree'}
        </span>
      )}
      {look > 0 && <span className="font-medium text-weld">{look} to look at</span>}
    </p>
  );
}

const linesWords = (n: number) => (n === 1 ? '1 line' : `${n} lines`);

/** How a drafted piece stands to the pattern, in words, with the one thing to do about it. */
function Standing(props: DraftPieceProps) {
  const { difference, mayTake, isBusy, onTake, onLeaveOut } = props;
  if (!difference) return null;
  const { piece, lines } = difference;
  const busy = isBusy ? { notYet: 'One moment.' } : {};
  if (!piece) {
    return (
      <p className="mt-1.5 flex flex-wrap items-center gap-x-3 gap-y-1">
        <span className="text-walnut2">Not in the pattern.</span>
        {mayTake && (
          <Button size="row" onClick={onTake} aria-label={`Take ${props.piece.name}`} {...busy}>
            Take it
          </Button>
        )}
      </p>
    );
  }
  const isRenamed = piece.name !== difference.name;
  return (
    <p className="mt-1.5 flex flex-wrap items-center gap-x-3 gap-y-1">
      <span className="inline-flex items-center gap-1.5">
        <svg width="14" height="12" viewBox="0 0 14 12" aria-hidden>
          <path d="M1 6.5 5 10.5 13 1.5" fill="none" stroke="var(--color-moss)" strokeWidth="1.8" />
        </svg>
        In the pattern{isRenamed ? ` as ${piece.name}` : ''}
        {lines.length > 0 ? `, ${linesWords(lines.length)} otherwise` : ''}.
      </span>
      {mayTake && (
        <Button
          kind="quiet"
          size="row"
          onClick={() => onLeaveOut(piece)}
          aria-label={`Leave ${props.piece.name} out`}
          {...busy}
        >
          Leave out
        </Button>
      )}
    </p>
  );
}

interface DraftPieceProps {
  patternId: string;
  piece: ReadingPiece;
  /** Undefined while it is being compared. */
  difference: PieceDifference | undefined;
  mayTake: boolean;
  isBusy: boolean;
  onTake: () => void;
  onLeaveOut: (piece: { id: string; version: number }) => void;
}

/** A drafted piece: its map, how much of it agrees, and whether the pattern has it. */
export function DraftPiece(props: DraftPieceProps) {
  const { patternId, piece } = props;
  return (
    <li className="grid grid-cols-[112px_minmax(0,1fr)] gap-x-3.5 border-b border-feint px-3.5 py-2.5">
      <PieceMap patternId={patternId} piece={piece} />
      <div className="self-center">
        <h3 className="h-panel">{piece.name}</h3>
        <p className="text-walnut2">{pieceWords(piece).slice(piece.name.length + 2)}</p>
        <Verdicts piece={piece} />
        <Standing {...props} />
      </div>
    </li>
  );
}
