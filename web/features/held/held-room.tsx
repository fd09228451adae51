import { useSuspenseQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { paths } from '../../lib/paths.ts';
import { Button } from '../../ui/button.tsx';
import { LinkButton } from '../../ui/link-button.tsx';
import { EmptyPaper, ErrorNote } from '../../ui/notes.tsx';
import { useToast } from '../../ui/toast.tsx';
import { CutPanel } from './cut-panel.tsx';
import { HeldLedger, toTake } from './held-ledger.tsx';
import { StateLabel, STATES } from './held-state.tsx';
import { cutQuery, heldQuery, useHeldDeeds } from './held.queries.ts';

/** A recording and the pattern that was written before it, side by side, both ways. */
export function HeldRoom({ patternId, recordingId }: { patternId: string; recordingId: string }) {
  const { data: held } = useSuspenseQuery(heldQuery(patternId, recordingId));
  const { data: cut } = useSuspenseQuery(cutQuery(patternId, recordingId));
  const deeds = useHeldDeeds(patternId, recordingId);
  const toast = useToast();
  const all = [deeds.take, deeds.write, deeds.film, deeds.cut];
  const isBusy = all.some(({ isPending }) => isPending) || deeds.undo.isPending;
  const onDone = (words: string) =>
    toast(words, () =>
      deeds.undo.mutate(undefined, {
        onSuccess: () => toast('Undone'),
        onError: () => toast('It could not be undone: somebody has written there since.'),
      }),
    );
  const ids = held.pieces.flatMap(toTake);
  const take = (lineIds: string[], name: string) =>
    deeds.take.mutate({ lastChange: held.lastChange, lineIds }, { onSuccess: () => onDone(`${name} taken`) });
  const lines = held.pieces.flatMap((piece) => piece.lines);
  const tally = STATES.map((state) => ({ state, n: lines.filter((line) => line.state === state).length }));

  return (
    <main className="grid grow grid-cols-[minmax(0,1fr)_348px] max-lg:grid-cols-1">
      {held.readingId && lines.length > 0 ? (
        <HeldLedger patternId={patternId} held={held} deeds={deeds} isBusy={isBusy} onTake={take} onDone={onDone} />
      ) : (
        <EmptyPaper
          title={held.readingId ? 'Nothing is written yet' : 'Nothing was heard yet'}
          action={
            <LinkButton kind="primary" to={held.readingId ? paths.bench(patternId) : paths.recording(patternId)}>
              {held.readingId ? 'Write it at the bench' : 'To the recording'}
            </LinkButton>
          }
        >
          <p>
            A written pattern is held against the transcript of its recording: what was never said, what was said
            otherwise.
          </p>
        </EmptyPaper>
      )}
      <aside
        aria-label="How it was said"
        className="border-l border-rule bg-sheet max-lg:row-start-1 max-lg:border-b max-lg:border-l-0"
      >
        <header className="panel-head bg-chalk">
          <h2 className="h-panel">How it was said</h2>
          <Link to={paths.recording(patternId)} className="link ml-auto">
            To the recording
          </Link>
        </header>
        <div className="px-3.5 py-3">
          <ul aria-label="Lines by how they fared">
            {tally.map(({ state, n }) => (
              <li key={state} className="flex justify-between border-b border-feint py-1">
                <StateLabel state={state} />
                <b>{n}</b>
              </li>
            ))}
          </ul>
          {held.spokenTerms && held.spokenTerms !== held.terms && (
            <p className="mt-2.5">
              The recording speaks {held.spokenTerms} terms, the pattern is written in {held.terms}: what was said is
              shown in {held.terms}.
            </p>
          )}
          {held.mayTake && ids.length > 0 && (
            <>
              <p className="mt-3 mb-2.5 text-walnut2">
                Taking gives each line its moment, the words it was said in and the total that was said. Nothing that is
                written changes.
              </p>
              <Button
                kind="primary"
                onClick={() => take(ids, `${ids.length} lines`)}
                {...(isBusy ? { notYet: 'One moment.' } : {})}
              >
                {ids.length === 1 ? 'Take the line found' : `Take all ${ids.length} lines found`}
              </Button>
            </>
          )}
          {all.some(({ isError }) => isError) && (
            <div className="mt-3">
              <ErrorNote what="Not taken.">
                Somebody else was quicker, or the connection was lost. Look again, then take it.
              </ErrorNote>
            </div>
          )}
        </div>
        <CutPanel key={cut.newestTranscriptId} cut={cut} deeds={deeds} isBusy={isBusy} onDone={onDone} />
      </aside>
    </main>
  );
}
