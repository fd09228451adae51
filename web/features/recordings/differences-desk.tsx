import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { LineDifference, ReadingDifferences } from '#contract/readings';
import { paths } from '../../lib/paths.ts';
import { formatTenths } from '../../lib/time.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { useToast } from '../../ui/toast.tsx';
import { DifferenceRow } from './difference-row.tsx';
import { allDifferences, differenceWords, offered } from './reading-choice.ts';
import { useReadingDeeds } from './readings.queries.ts';

interface GroupProps {
  title: string;
  beside: string;
  lines: readonly LineDifference[];
  chosen: ReadonlySet<string>;
  mayTake: boolean;
  onChoose: (key: string, take: boolean) => void;
}

function Group({ title, beside, lines, chosen, mayTake, onChoose }: GroupProps) {
  return (
    <section aria-label={title}>
      <div className="flex flex-wrap items-baseline gap-x-3 border-b border-rule bg-chalk px-3.5 py-1.5">
        <h2 className="h-panel">{title}</h2>
        <span className="text-walnut2">{beside}</span>
      </div>
      <ul>
        {lines.map((difference) => (
          <DifferenceRow
            key={difference.key}
            difference={difference}
            isTaken={chosen.has(difference.key)}
            mayTake={mayTake}
            onChoose={(take) => onChoose(difference.key, take)}
          />
        ))}
      </ul>
    </section>
  );
}

/** Moments that people set by the words of another transcript: where they are, and where their words stand now. */
function Moments({
  told,
  follows,
  onFollow,
}: {
  told: ReadingDifferences;
  follows: boolean;
  onFollow: (on: boolean) => void;
}) {
  const { moments, mayTake } = told;
  if (moments.length === 0) return null;
  return (
    <section aria-label="Moments set by hand">
      <div className="flex flex-wrap items-baseline gap-x-3 border-b border-rule bg-chalk px-3.5 py-1.5">
        <h2 className="h-panel">Moments set by hand</h2>
        {mayTake && (
          <label className="inline-flex min-h-[30px] items-center gap-2 max-sm:min-h-11">
            <input
              type="checkbox"
              checked={follows}
              onChange={({ target }) => onFollow(target.checked)}
              className="size-[15px] accent-woad"
            />
            Let them follow their words
          </label>
        )}
      </div>
      <ul>
        {moments.map(({ markId, isMs, wouldMs }) => (
          <li key={markId} className="border-b border-feint px-3.5 py-1.5">
            <span className="tn">{formatTenths(isMs)}</span>{' '}
            <span className="text-walnut2">
              {wouldMs === null ? 'stays: its words are not in this transcript' : 'goes to '}
            </span>
            {wouldMs !== null && <b className="tn">{formatTenths(wouldMs)}</b>}
          </li>
        ))}
      </ul>
    </section>
  );
}

const rest = (n: number) => (n === 0 ? 'new' : `${n} ${n === 1 ? 'line stands' : 'lines stand'} as heard`);

/** A reading held against the pattern, line by line; each line is taken or left, and all of it is one step. */
export function DifferencesDesk({ patternId, told }: { patternId: string; told: ReadingDifferences }) {
  const [choice, setChoice] = useState<ReadonlySet<string>>();
  const [follows, setFollows] = useState(true);
  const { take, undo } = useReadingDeeds(patternId);
  const toast = useToast();
  const all = allDifferences(told);
  const chosen = new Set([...(choice ?? offered(told))].filter((key) => all.some((one) => one.key === key)));
  const choose = (key: string, on: boolean) => {
    const next = new Set(chosen);
    if (on) next.add(key);
    else next.delete(key);
    setChoice(next);
  };
  const taking = () =>
    take.mutate(
      { readingId: told.readingId, choice: { lines: [...chosen], moments: follows, lastChange: told.lastChange } },
      {
        onSuccess: () => {
          setChoice(undefined);
          toast(
            chosen.size === 1 ? 'One line taken' : `${chosen.size} lines taken`,
            () =>
              void undo.mutateAsync().then(
                () => toast('Undone'),
                () => toast('It could not be undone.'),
              ),
          );
        },
      },
    );
  const moves = follows && told.moments.some(({ wouldMs }) => wouldMs !== null);
  const nothing = all.length === 0 && told.moments.length === 0;
  const shared = { chosen, mayTake: told.mayTake, onChoose: choose };
  return (
    <>
      <main className="grow bg-sheet">
        <div className="flex flex-wrap items-center gap-x-4 gap-y-2 border-b border-rule px-5 py-3 max-sm:px-3.5">
          <div className="grow">
            <h2 className="h-piece">As it stands, as it would read</h2>
            <p className="text-walnut2">
              {differenceWords(told)}, in {told.recordingTitle}. What somebody wrote by hand is kept unless you take it.
            </p>
          </div>
          {told.mayTake && all.length > 1 && (
            <span className="flex flex-wrap gap-2">
              <Button onClick={() => setChoice(new Set())}>All as it stands</Button>
              <Button onClick={() => setChoice(offered(told))}>All that is offered</Button>
            </span>
          )}
        </div>
        {take.isError && (
          <div className="px-5 py-2.5 max-sm:px-3.5">
            <ErrorNote what="Not taken.">
              The pattern has changed meanwhile, or the connection was lost. Look once more, then take it again.
            </ErrorNote>
          </div>
        )}
        {nothing && (
          <p className="px-5 py-6 max-sm:px-3.5">
            Nothing would change.{' '}
            <Link className="link" to={paths.bench(patternId)}>
              Back to the bench
            </Link>
          </p>
        )}
        {told.pieces
          .filter(({ lines }) => lines.length > 0)
          .map(({ index, name, piece, same, lines }) => (
            <Group
              key={index}
              title={piece && piece.name !== name ? `${piece.name} (heard as ${name})` : name}
              beside={piece ? rest(same) : 'a new piece'}
              lines={lines}
              {...shared}
            />
          ))}
        {told.gone.length > 0 && (
          <Group title="No longer heard" beside="they stay unless you leave them out" lines={told.gone} {...shared} />
        )}
        <Moments told={told} follows={follows} onFollow={setFollows} />
      </main>
      {told.mayTake && !nothing && (
        <footer className="sticky bottom-0 z-10 flex min-h-[58px] flex-wrap items-center gap-x-3.5 gap-y-2 border-t border-rule bg-chalk px-5 py-2 max-sm:px-3.5">
          <p role="status" className="text-walnut2">
            {chosen.size} of {all.length} taken{moves ? ', and the moments follow' : ''}. It is one step, and can be
            undone.
          </p>
          <Button
            kind="primary"
            className="ml-auto"
            onClick={taking}
            {...(take.isPending
              ? { notYet: 'It is being taken.' }
              : chosen.size === 0 && !moves
                ? { notYet: 'Nothing is chosen.' }
                : {})}
          >
            {chosen.size === 0
              ? moves
                ? 'Take the moments'
                : 'Take'
              : chosen.size === 1
                ? 'Take one line'
                : `Take ${chosen.size} lines`}
          </Button>
        </footer>
      )}
    </>
  );
}
