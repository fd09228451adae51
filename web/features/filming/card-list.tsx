import { useEffect, useRef } from 'react';
import { cx } from '../../lib/class-names.ts';
import { type CardPiece } from './card-lines.ts';

/** Every line of the pattern, to go to: what is not filmed says so and is passed over. */
export function CardList({
  pieces,
  lineId,
  onGo,
}: {
  pieces: readonly CardPiece[];
  lineId: string;
  onGo: (lineId: string) => void;
}) {
  const chosen = useRef<HTMLButtonElement>(null);
  useEffect(() => {
    chosen.current?.scrollIntoView({ block: 'nearest' });
  }, [lineId]);
  return (
    <nav
      aria-label="All lines"
      className="w-[300px] flex-none overflow-y-auto border-l border-rule bg-sheet max-sm:w-full max-sm:border-l-0 print:hidden"
    >
      {pieces.map((piece) => (
        <section key={piece.id} aria-label={piece.name}>
          <h2 className="h-panel sticky top-0 border-b border-rule bg-sheet px-4 py-2">
            {piece.name}
            {piece.make > 1 && <span className="small ml-2 font-sans font-normal text-walnut2">make {piece.make}</span>}
          </h2>
          <ul>
            {piece.lines.map((line) => (
              <li key={line.id}>
                <button
                  ref={line.id === lineId ? chosen : undefined}
                  type="button"
                  aria-current={line.id === lineId ? 'true' : undefined}
                  disabled={!line.filmed}
                  onClick={() => onGo(line.id)}
                  className={cx(
                    'grid min-h-[34px] w-full grid-cols-[64px_minmax(0,1fr)_auto] items-center gap-x-2 border-b border-feint px-4 text-left max-sm:min-h-11',
                    line.id === lineId ? 'bar bg-woadwash' : 'enabled:hover:bg-hover',
                  )}
                >
                  <b className={line.filmed ? '' : 'font-normal text-walnut3'}>{line.name}</b>
                  <span className={cx('truncate font-serif', !line.filmed && 'text-walnut3')}>{line.text}</span>
                  <span className={line.filmed ? 'font-bold' : 'small text-walnut3'}>
                    {line.filmed ? line.total : 'not filmed'}
                  </span>
                </button>
              </li>
            ))}
          </ul>
        </section>
      ))}
    </nav>
  );
}
