import { type CardLine, type CardPiece } from './card-lines.ts';
import { useFit } from './use-fit.ts';

const makeWords = ({ name, make }: CardPiece) => (make > 1 ? `${name}, make ${make}` : name);

/** What to say so that the reading finds the line again. */
function SayHint({ line }: { line: CardLine }) {
  if (line.spoken === null) return <>Say it in your own words, between its rounds.</>;
  const total = line.total === '' ? null : line.total;
  return (
    <>
      Say <i className="said">{line.spoken}</i> first
      {total && (
        <>
          , <i className="said">{total}</i> last
        </>
      )}
      : the reading finds the round by its number.
    </>
  );
}

/** The line in hand, `size` px large or as large as it fits, its total ruled off after it; under it the next one. */
export function CardNow({
  line,
  piece,
  next,
  size,
}: {
  line: CardLine;
  piece: CardPiece;
  next: CardLine | undefined;
  size: number;
}) {
  const box = useFit(size, `${line.id} ${line.text} ${line.total}`);
  return (
    <>
      <section
        aria-labelledby="card-now"
        aria-live="polite"
        className="flex min-h-0 grow flex-col px-[5vw] pt-[3vh] max-sm:px-4 max-sm:pt-3"
      >
        <div ref={box} className="relative min-h-0 grow overflow-y-auto leading-[1.16]">
          <h2 className="flex flex-wrap items-baseline gap-x-[0.5em] pb-[0.2em] text-[max(20px,0.42em)] leading-[1.25]">
            <span id="card-now" className="font-extrabold">
              {line.name}
            </span>
            <span className="text-walnut2">{makeWords(piece)}</span>
          </h2>
          <div className="flex flex-wrap items-baseline gap-x-[0.7em]">
            <p className="min-w-0 font-serif font-medium tracking-[-0.012em] text-balance">{line.text || '–'}</p>
            {line.total !== '' && (
              <p className="ml-auto pt-[0.08em] pb-[0.16em]">
                <span className="ruled-off pl-[0.4em] font-extrabold after:h-[0.06em]! after:min-h-[4px]">
                  {line.total}
                </span>
              </p>
            )}
          </div>
          {line.note !== '' && <p className="mt-2 text-[max(18px,0.34em)] leading-[1.35] text-walnut2">{line.note}</p>}
        </div>
        <p className="small flex-none pt-2 pb-3 text-walnut2 max-sm:pb-2">
          <SayHint line={line} />
        </p>
      </section>
      <section
        aria-label="Next"
        className="grid flex-none grid-cols-[auto_minmax(0,1fr)_auto] items-baseline gap-x-5 border-t border-rule bg-sheet px-[5vw] py-3.5 max-sm:gap-x-3 max-sm:px-4 max-sm:py-2.5"
      >
        {next ? (
          <>
            <span className="text-[18px] leading-7 text-walnut2">
              Next <b className="text-walnut">{next.name}</b>
            </span>
            <span className="line-clamp-2 font-serif text-[clamp(19px,2.3vw,34px)] leading-[1.3]">
              {next.text || '–'}
            </span>
            <b className="text-[clamp(19px,2.3vw,34px)] leading-[1.3]">{next.total}</b>
          </>
        ) : (
          <span className="col-span-3 text-[18px] leading-7 text-walnut2">This is the last line.</span>
        )}
      </section>
    </>
  );
}
