import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Shelf, ShelfPart, ShelfPattern } from '#contract/shelf';
import { useToast } from '../../ui/toast.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { wordsOf } from '../../lib/use-contract-form.ts';
import { EmptyShelf } from './empty-shelf.tsx';
import { PartLinks } from './part-links.tsx';
import type { RowAction } from './row-actions.tsx';
import { ShelfLedger } from './shelf-ledger.tsx';
import { shelfQuery, useDuplicate, useShelfStep, type ShelfStep } from './shelf.queries.ts';
import { findPatterns, inState, type StateFilter } from './shelf-view.ts';
import { StateTabs } from './state-tabs.tsx';

const BACK: Readonly<Record<ShelfStep, ShelfStep>> = {
  bin: 'restore',
  restore: 'bin',
  archive: 'unarchive',
  unarchive: 'archive',
};
const DONE: Readonly<Record<ShelfStep, string>> = {
  bin: 'lies in the bin',
  restore: 'is back on the shelf',
  archive: 'is in the archive',
  unarchive: 'is back on the shelf',
};

/** What can be done with a row, each with its way back; a refusal stays on the page in words. */
function useRowActions(studioId: string) {
  const tell = useToast();
  const step = useShelfStep(studioId);
  const duplicate = useDuplicate(studioId);
  const take = (of: Pick<ShelfPattern, 'id' | 'version' | 'title'>, which: ShelfStep) => {
    duplicate.reset();
    step.mutate(
      { of, step: which },
      { onSuccess: (head) => tell(`${head.title} ${DONE[which]}`, () => take(head, BACK[which])) },
    );
  };
  const act = (pattern: ShelfPattern, action: RowAction) => {
    if (action !== 'duplicate') {
      take(pattern, action);
      return;
    }
    step.reset();
    duplicate.mutate(
      { id: pattern.id, key: crypto.randomUUID() },
      { onSuccess: (head) => tell(`${head.title} stands on the shelf`, () => take(head, 'bin')) },
    );
  };
  return { act, error: step.error ?? duplicate.error };
}

const NOTHING: Readonly<Record<ShelfPart, string>> = {
  shelf: 'Nothing on the shelf: it is all in the archive or in the bin.',
  archive: 'Nothing in the archive. What is archived stays published and keeps its addresses.',
  bin: 'The bin is empty.',
};

function nothingFound(shelf: Shelf, words: string, state: StateFilter): string {
  if (shelf.patterns.length === 0) return NOTHING[shelf.part];
  return words.trim() === ''
    ? `No pattern is ${state === 'in-proof' ? 'in proof' : state}.`
    : `No pattern is called “${words.trim()}”.`;
}

/** A studio's shelf, its archive or its bin, as a ledger. */
export function ShelfRoom({ studioId, part, words }: { studioId: string; part: ShelfPart; words: string }) {
  const { data: shelf } = useSuspenseQuery(shelfQuery(studioId, part));
  const [state, setState] = useState<StateFilter>('all');
  const { act, error } = useRowActions(studioId);
  const found = findPatterns(shelf.patterns, words);
  const shown = inState(found, state);

  if (part === 'shelf' && shelf.patterns.length === 0 && shelf.archived + shelf.binned === 0) {
    return <EmptyShelf mayCreate={shelf.mayCreate} />;
  }
  return (
    <>
      <div className="flex min-h-[45px] flex-wrap items-center justify-between gap-x-6 border-b border-rule px-5 max-sm:px-3">
        <div className="max-w-full max-sm:overflow-x-auto">
          <StateTabs patterns={found} chosen={state} onChoose={setState} />
        </div>
        <PartLinks shelf={shelf} />
      </div>
      {error && (
        <div className="px-5 py-3">
          <ErrorNote what="That was not done.">{wordsOf(error)}</ErrorNote>
        </div>
      )}
      <div className="grow bg-sheet">
        {shown.length > 0 ? (
          <ShelfLedger shelf={shelf} patterns={shown} onAct={act} />
        ) : (
          <p className="border-b border-feint px-5 py-6 font-serif text-[16px] text-walnut2" role="status">
            {nothingFound(shelf, words, state)}
          </p>
        )}
      </div>
    </>
  );
}
