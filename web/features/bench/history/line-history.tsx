import { keepPreviousData, useInfiniteQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { countPattern, type LineCount, printTotals, type Totals } from '#crochet';
import { toPatternInput } from '#contract/pattern-input';
import { type Line } from '#contract/rows';
import { formatRecent } from '../../../lib/days.ts';
import { VerdictLabel } from '../../../parts/verdict-mark.tsx';
import { Button } from '../../../ui/button.tsx';
import { ErrorNote } from '../../../ui/notes.tsx';
import { lineName } from '../desk/line-name.ts';
import { type Desk, useDesk } from '../desk/use-desk.ts';
import { rowHistoryQuery } from './history.queries.ts';
import { lineSteps, standsSo, type LineStep } from './steps.ts';

/** A line from the start: a thread hung upright, newest at the top, one knot a step. Restoring adds a step. */
export function LineHistory({ line }: { line: Line }) {
  const desk = useDesk();
  const { id: patternId, lastChange } = desk.pattern;
  const { data, error, fetchNextPage, hasNextPage, isFetching } = useInfiniteQuery({
    ...rowHistoryQuery(patternId, line.id, lastChange),
    placeholderData: keepPreviousData,
  });
  const steps = useMemo(() => lineSteps((data?.pages ?? []).flatMap(({ changes }) => changes)), [data]);
  const counts = useStepCounts(desk, line, steps);
  const name = lineName(line) || line.kind;

  if (error && !data) return <ErrorNote what="The history cannot be read just now.">Nothing of it is lost.</ErrorNote>;
  if (!data) return <p className="text-walnut2">Reading …</p>;
  return (
    <section aria-label={`${name} from the start`}>
      <ol className="relative before:absolute before:inset-y-3 before:left-[7px] before:border-l-[1.5px] before:border-edge">
        {steps.map((step) => (
          <li key={step.id} className="relative border-b border-feint py-2 pl-7 last:border-b-0">
            <span aria-hidden className="absolute top-[15px] left-[3px] size-[9px] rounded-full bg-woad" />
            <p className="small text-walnut2">
              <b className="text-walnut">{step.who ?? 'The reading'}</b> {step.did}
              {', '}
              <time dateTime={step.at}>{formatRecent(step.at)}</time>
            </p>
            <div className="flex flex-wrap items-center gap-x-4 gap-y-1">
              <span className="wr min-w-40 grow">
                {(step.stood.text ?? '') === '' ? <span className="text-walnut3">no words</span> : step.stood.text}
              </span>
              <Figures stood={step.stood} />
              <StepVerdict count={counts.get(step.id)} />
              <Restore line={line} step={step} name={name} />
            </div>
          </li>
        ))}
      </ol>
      {hasNextPage && (
        <Button
          size="row"
          onClick={() => void fetchNextPage()}
          {...(isFetching ? { notYet: 'Older steps are being read.' } : {})}
        >
          Older
        </Button>
      )}
    </section>
  );
}

/** How each step's words count where the line stands now; the words are the same far more often than not. */
function useStepCounts(desk: Desk, line: Line, steps: readonly LineStep[]): ReadonlyMap<number, LineCount> {
  const { pattern } = desk;
  const { count } = desk.bench;
  return useMemo(() => {
    const found = new Map<number, LineCount>();
    for (const { id, stood } of steps) {
      const lines = pattern.lines.map((one) => (one.id === line.id ? ({ ...one, ...stood } as Line) : one));
      const again = countPattern(toPatternInput({ ...pattern, lines }), count);
      const one = again.pieces.flatMap((piece) => piece.lines).find((counted) => counted.id === line.id);
      if (one) found.set(id, one);
    }
    return found;
  }, [steps, pattern, line.id, count]);
}

const VOICES = [
  ['said', 'said'],
  ['written', 'wr'],
] as const;

function Figures({ stood }: { stood: LineStep['stood'] }) {
  return VOICES.map(([voice, face]) => {
    const totals = stood[voice] as Totals | null | undefined;
    return (
      totals && (
        <span key={voice} className="small text-walnut2">
          {voice} <span className={face}>{printTotals(totals)}</span>
        </span>
      )
    );
  });
}

function StepVerdict({ count }: { count: LineCount | undefined }) {
  return count === undefined || count.count === null ? null : <VerdictLabel verdict={count.verdict} />;
}

function Restore({ line, step, name }: { line: Line; step: LineStep; name: string }) {
  const { bench, pattern, tellDone } = useDesk();
  if (standsSo(line, step)) return <span className="small text-walnut3">as it is now</span>;
  if (!pattern.mayEdit) return null;
  const when = formatRecent(step.at);
  return (
    <Button
      size="row"
      aria-label={`Restore ${name} as of ${when}`}
      onClick={() => {
        bench.edit('line', line.id, step.stood);
        tellDone(`${name} is as it was on ${when}`);
      }}
    >
      Restore
    </Button>
  );
}
