import { type HeldAgainst, type HeldPiece } from '#contract/held';
import { Button } from '../../ui/button.tsx';
import { HELD_GRID, HeldRow } from './held-row.tsx';
import { type HeldDeeds } from './held.queries.ts';

/** Lines that were said and whose moment is not taken yet. */
export const toTake = ({ lines }: HeldPiece): string[] =>
  lines.flatMap(({ lineId, said, isTaken }) => (lineId && said && !isTaken ? [lineId] : []));

interface HeldLedgerProps {
  patternId: string;
  held: HeldAgainst;
  deeds: HeldDeeds;
  isBusy: boolean;
  /** Takes the moments of these lines; `name` is told. */
  onTake: (lineIds: string[], name: string) => void;
  onDone: (words: string) => void;
}

function about({ make, saidName, recordings }: HeldPiece): string {
  return [
    ...(make > 1 ? [`make ${make}`] : []),
    ...(saidName ? [`said as “${saidName}”`] : []),
    ...(recordings.length > 0 ? [`moments in recording ${recordings.join(' and ')}`] : []),
  ].join(', ');
}

/** The pattern in its order, each line as it is written over as it was said. */
export function HeldLedger({ patternId, held, deeds, isBusy, onTake, onDone }: HeldLedgerProps) {
  return (
    <div className="min-w-0 bg-sheet">
      <div
        aria-hidden
        className={`${HELD_GRID} small h-[31px] items-center border-b border-rule text-walnut2 max-sm:hidden`}
      >
        <span>Round</span>
        <span>
          <span className="wr text-[15px]! text-walnut">written</span> over <span className="said">said</span>
        </span>
        <span className="text-right">total</span>
        <span className="pl-3 max-lg:invisible">Verdict</span>
        <span>In the recording</span>
      </div>
      {held.pieces.map((piece, n) => {
        const ids = toTake(piece);
        return (
          <section key={piece.pieceId ?? `said-${n}`} aria-label={piece.name}>
            <div className="flex min-h-[38px] flex-wrap items-center gap-x-2.5 border-b border-rule px-5 max-sm:px-4">
              <h2 className="h-piece">{piece.name}</h2>
              <span className="text-walnut2">{piece.pieceId ? about(piece) : 'filmed, not written'}</span>
              {held.mayTake && ids.length > 0 && held.pieces.length > 1 && (
                <Button
                  size="row"
                  className="ml-auto"
                  onClick={() => onTake(ids, piece.name)}
                  {...(isBusy ? { notYet: 'One moment.' } : {})}
                >
                  Take {piece.name}
                </Button>
              )}
            </div>
            <ul>
              {piece.lines.map((line) => (
                <HeldRow
                  key={line.lineId ?? line.said?.key}
                  patternId={patternId}
                  line={line}
                  mayTake={held.mayTake}
                  isBusy={isBusy}
                  onTake={(lineId) => onTake([lineId], line.name || 'The step')}
                  onWrite={(key) =>
                    held.readingId &&
                    deeds.write.mutate(
                      { readingId: held.readingId, lastChange: held.lastChange, lines: [key] },
                      { onSuccess: () => onDone(`${line.name || 'The step'} is written in`) },
                    )
                  }
                  onFilm={({ lineId, version }, filmed) =>
                    deeds.film.mutate(
                      { lineId, version, filmed },
                      {
                        onSuccess: () =>
                          onDone(`${line.name || 'The step'} is ${filmed ? 'to be filmed' : 'not filmed'}`),
                      },
                    )
                  }
                />
              ))}
            </ul>
          </section>
        );
      })}
    </div>
  );
}
