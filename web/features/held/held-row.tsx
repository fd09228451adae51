import { Link } from 'react-router-dom';
import { type HeldLine, type HeldSide } from '#contract/held';
import { cx } from '../../lib/class-names.ts';
import { paths } from '../../lib/paths.ts';
import { formatMoment } from '../../lib/time.ts';
import { Figures } from '../../parts/totals.tsx';
import { VerdictLabel } from '../../parts/verdict-mark.tsx';
import { NowWords } from '../../parts/was-and-now.tsx';
import { Button } from '../../ui/button.tsx';
import { StateLabel, unlikeWords } from './held-state.tsx';

/** round | written over said ‖ total | verdict | how it fared | what can be done. */
export const HELD_GRID =
  'grid grid-cols-[70px_minmax(0,1fr)_58px_140px_168px_118px] gap-x-2 px-5 max-lg:grid-cols-[60px_minmax(0,1fr)_52px_30px_160px] max-sm:grid-cols-[56px_minmax(0,1fr)_48px] max-sm:px-4';

interface SideProps {
  side: HeldSide;
  isSaid?: boolean;
  /** The other side, where its words are to be told apart. */
  other?: HeldSide | null;
  isCounted: boolean;
  isOdd: boolean;
}

function Side({ side, isSaid = false, other, isCounted, isOdd }: SideProps) {
  return (
    <>
      <span className={cx('col-start-2 min-w-0', isSaid ? 'said text-[16px]! leading-6!' : 'wr')}>
        <span className="sr-only">{isSaid ? 'Said: ' : 'Written: '}</span>
        {other ? <NowWords was={other.text} now={side.text} /> : side.text || '–'}
      </span>
      <span className={cx('text-right leading-6!', isSaid ? 'said tn text-[16px]!' : 'wr tn')}>
        {isCounted &&
          (isOdd ? (
            <span className="boxed -mr-[7px]">{<Figures totals={side.total} />}</span>
          ) : (
            <Figures totals={side.total} />
          ))}
      </span>
      <span className="pl-3 leading-6 max-lg:w-[28px] max-lg:overflow-hidden max-sm:hidden">
        {isCounted && <VerdictLabel verdict={side.verdict} />}
      </span>
    </>
  );
}

interface HeldRowProps {
  patternId: string;
  line: HeldLine;
  mayTake: boolean;
  isBusy: boolean;
  onTake: (lineId: string) => void;
  onWrite: (key: string) => void;
  onFilm: (line: HeldLine & { lineId: string }, filmed: boolean) => void;
}

/** One thing at a time can be done with a line, by how it fared. */
function Deed({ line, mayTake, isBusy, onTake, onWrite, onFilm }: HeldRowProps) {
  const { lineId, said, state } = line;
  const name = line.name || 'this step';
  const held = isBusy ? { notYet: 'One moment.' } : {};
  if (line.isTaken)
    return <span className="small leading-6! text-walnut2">taken, {formatMoment(line.markMs ?? 0)}</span>;
  if (!mayTake) return null;
  if (lineId && said) {
    return (
      <Button size="row" aria-label={`Take the moment of ${name}`} onClick={() => onTake(lineId)} {...held}>
        Take {formatMoment(said.atMs)}
      </Button>
    );
  }
  if (said) {
    return (
      <Button size="row" aria-label={`Write ${name} in`} onClick={() => onWrite(said.key)} {...held}>
        Write it in
      </Button>
    );
  }
  if (!lineId) return null;
  const filmed = state === 'not-filmed';
  return (
    <Button
      size="row"
      kind="quiet"
      aria-label={`${name} is ${filmed ? 'to be filmed' : 'not filmed'}`}
      onClick={() => onFilm({ ...line, lineId }, filmed)}
      {...held}
    >
      {filmed ? 'To be filmed' : 'Not filmed'}
    </Button>
  );
}

/** A line as it is written over as it was said, and how it fared. */
export function HeldRow(props: HeldRowProps) {
  const { line, patternId } = props;
  const { written, said, state, unlike } = line;
  const isCounted = line.kind === 'round' || line.kind === 'row';
  const both = state === 'differently';
  const isOdd = unlike.includes('total');
  return (
    <li
      className={cx(
        HELD_GRID,
        'min-h-[33px] border-b border-feint py-1',
        both && 'bg-madderwash',
        state === 'not-written' && 'bg-weldwash',
      )}
    >
      {line.lineId ? (
        <Link
          to={paths.bench(patternId, line.lineId)}
          className="row-span-3 self-start leading-6 font-bold hover:text-woad"
        >
          {line.name || <span className="font-normal text-walnut2">{line.kind}</span>}
        </Link>
      ) : (
        <b className="row-span-3 leading-6">
          {line.name || <span className="font-normal text-walnut2">{line.kind}</span>}
        </b>
      )}
      {written && <Side side={written} isCounted={isCounted} isOdd={isOdd} />}
      {said && !written && <Side side={said} isSaid isCounted={isCounted} isOdd={false} />}
      <span className="leading-6 max-lg:row-start-1 max-lg:col-start-5 max-sm:col-start-2 max-sm:row-start-auto">
        <StateLabel state={state} />
      </span>
      <span className="max-lg:col-start-5 max-sm:col-start-2">
        <Deed {...props} />
      </span>
      {both && said && written && (
        <>
          <Side side={said} isSaid other={written} isCounted={isCounted} isOdd={isOdd} />
          <span className="small leading-6! text-walnut2 max-lg:col-start-5 max-sm:col-start-2">
            {unlikeWords(unlike)}
          </span>
        </>
      )}
      {said && (both || state === 'not-written') && said.words !== '' && (
        <p className="said col-start-2 col-end-4 text-walnut2">
          <span className="small mr-2 font-sans text-walnut3 not-italic">{formatMoment(said.atMs)}</span>“{said.words}”
        </p>
      )}
    </li>
  );
}
