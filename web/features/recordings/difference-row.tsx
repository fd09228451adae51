import { useId } from 'react';
import type { ComparedSide, LineDifference } from '#contract/readings';
import { cx } from '../../lib/class-names.ts';
import { formatMoment } from '../../lib/time.ts';
import { totalLines } from '../../parts/totals.tsx';
import { VerdictLabel } from '../../parts/verdict-mark.tsx';
import { NowWords, WasWords } from '../../parts/was-and-now.tsx';
import { whyKept } from './reading-choice.ts';

/** What a line is called: by its number, else by what it is. */
function nameOf({ is, would }: LineDifference): string {
  const names = [would?.label, is?.label, would?.kind, is?.kind];
  return names.find((name) => name !== undefined && name !== '') ?? 'line';
}

const figures = (totals: ComparedSide['said']) => (totals ? totalLines(totals).join(', ') : '–');

const isCounted = ({ kind }: ComparedSide) => kind === 'round' || kind === 'row';

/** The three totals of one side, each in its voice, and how they come out. */
function Totals({ side }: { side: ComparedSide }) {
  if (!isCounted(side)) return null;
  return (
    <span className="mt-0.5 flex flex-wrap items-baseline gap-x-3.5">
      <span className="small text-walnut2">
        said <span className="said tn text-[16px]! text-walnut">{figures(side.said)}</span>
      </span>
      <span className="small text-walnut2">
        written <span className="wr tn text-walnut">{figures(side.written)}</span>
      </span>
      <span className="small text-walnut2">
        worked out <span className="worked text-walnut">{side.count ?? '?'}</span>
      </span>
      <VerdictLabel verdict={side.verdict} />
    </span>
  );
}

const NOTHING = { new: 'not in the pattern', 'taken-away': 'deleted', gone: 'left out', changed: '' } as const;

function Side(props: {
  difference: LineDifference;
  which: 'is' | 'would';
  name: string;
  isChosen: boolean;
  mayTake: boolean;
  onChoose: () => void;
}) {
  const { difference, which, name, isChosen, mayTake, onChoose } = props;
  const side = difference[which];
  const other = difference[which === 'is' ? 'would' : 'is'];
  const label = nameOf(difference);
  const words =
    which === 'is'
      ? difference.change === 'gone'
        ? 'Keep it'
        : 'As it stands'
      : difference.change === 'gone'
        ? 'Leave it out'
        : 'Take this';
  return (
    <label
      className={cx(
        'relative block border-l border-feint px-3.5 py-2',
        isChosen && 'bg-woadwash before:absolute before:inset-y-0 before:left-0 before:w-1 before:bg-woad',
        mayTake && 'cursor-pointer',
      )}
    >
      <span className="wr block text-[16px] leading-[24px]">
        {!side && <span className="text-walnut2">{NOTHING[difference.change]}</span>}
        {side && !other && side.text}
        {side && other && which === 'is' && <WasWords was={side.text} now={other.text} />}
        {side && other && which === 'would' && <NowWords was={other.text} now={side.text} />}
      </span>
      {side && <Totals side={side} />}
      {mayTake && (
        <span className="mt-1 flex min-h-[24px] items-center gap-2 max-sm:min-h-11">
          <input
            type="radio"
            name={name}
            checked={isChosen}
            onChange={onChoose}
            aria-label={`${label}: ${words}`}
            className="size-[15px] accent-woad"
          />
          <span aria-hidden className={isChosen ? 'font-bold text-woad' : 'text-walnut2'}>
            {words}
          </span>
        </span>
      )}
    </label>
  );
}

/** One line: as it stands, and as it would read, each with its totals; one of them is chosen. */
export function DifferenceRow(props: {
  difference: LineDifference;
  isTaken: boolean;
  mayTake: boolean;
  onChoose: (take: boolean) => void;
}) {
  const { difference, isTaken, mayTake, onChoose } = props;
  const name = useId();
  const kept = whyKept(difference);
  const label = nameOf(difference);
  return (
    <li className="border-b border-feint">
      <div
        role="group"
        aria-label={label}
        className="grid grid-cols-[104px_minmax(0,1fr)_minmax(0,1fr)] max-sm:grid-cols-1"
      >
        <span className="px-3.5 py-2 leading-[24px] max-sm:pb-0">
          <b>{label}</b>
          {difference.atMs !== null && <span className="small ml-2 text-walnut3">{formatMoment(difference.atMs)}</span>}
          {kept !== null && <span className="small block text-weld max-sm:ml-2 max-sm:inline">{kept}</span>}
        </span>
        <Side {...{ difference, name, mayTake }} which="is" isChosen={!isTaken} onChoose={() => onChoose(false)} />
        <Side {...{ difference, name, mayTake }} which="would" isChosen={isTaken} onChoose={() => onChoose(true)} />
      </div>
    </li>
  );
}
