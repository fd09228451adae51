import { Button } from '../../ui/button.tsx';
import { LoadingRows } from '../../ui/notes.tsx';
import { EntryRow } from './entry-row.tsx';
import type { Told } from './use-told.ts';

const plural = (n: number, one: string) => `${n} ${n === 1 ? one : `${one}s`}`;

/** The whole text told apart, in the order of the text; what is in doubt is asked. */
export function EntryList({ told, isBusy }: { told: Told; isBusy: boolean }) {
  const { entries, open, inHand, pick, decide, goOn } = told;
  const lines = entries.filter(({ role, isJoined }) => role === 'line' && !isJoined).length;
  const pieces = entries.filter(({ role, begins }) => role === 'piece' || begins !== null).length;
  return (
    <section aria-labelledby="told-heading" className="flex min-h-0 min-w-0 flex-col bg-sheet">
      <div className="panel-head flex-wrap gap-x-4 bg-chalk py-1">
        <h2 id="told-heading" className="h-panel">
          Told apart
        </h2>
        {entries.length > 0 && (
          <span className="text-walnut2">
            {plural(pieces, 'piece')}, {plural(lines, 'line')} of work
          </span>
        )}
        {open > 0 && (
          <>
            <b className="text-weld" role="status">
              {open} to confirm
            </b>
            <Button kind="quiet" size="row" keys={['N']} className="ml-auto" onClick={goOn}>
              Next
            </Button>
          </>
        )}
      </div>
      {entries.length === 0 ? (
        isBusy ? (
          <LoadingRows label="Reading" />
        ) : (
          <div className="ruled-paper grow px-5 pt-12 font-serif text-[17px] leading-[48px] text-walnut2">
            <p>Paste the pattern, or open its file.</p>
            <p>Pieces, rounds, steps, materials and notes are told apart here.</p>
            <p>What is in doubt is asked. Nothing is left out.</p>
          </div>
        )
      ) : (
        <ol aria-label="The text, told apart" className="min-h-0 grow overflow-y-auto max-lg:overflow-visible">
          {entries.map((entry, i) => (
            <EntryRow
              key={entry.id}
              entry={entry}
              isFirst={i === 0}
              isInHand={entry.id === inHand}
              onPick={pick}
              onDecide={decide}
            />
          ))}
        </ol>
      )}
    </section>
  );
}
