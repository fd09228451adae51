import { ChevronLeft, ChevronRight, X } from 'lucide-react';
import { useQueryClient } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { WordsUsed, type WordsUse } from '#contract/readings';
import { ProblemError, send } from '../../../lib/http.ts';
import { useKeys } from '../../../lib/use-keys.ts';
import { Button, IconButton } from '../../../ui/button.tsx';
import { ErrorNote } from '../../../ui/notes.tsx';
import { patternQuery } from '../data/bench.queries.ts';
import { isCounted } from '../desk/bench-count.ts';
import { lineName } from '../desk/line-name.ts';
import { type Desk, lineOf, useDesk } from '../desk/use-desk.ts';
import { type ChosenWords, moveEnd } from './choose-words.ts';
import { readChosen } from './chosen-reading.ts';

const DONE: Readonly<Record<WordsUse, string>> = {
  line: 'A line is made',
  again: 'Read again',
  total: 'Its total is taken',
  step: 'A step is made',
  note: 'A note is made',
  material: 'A material is listed',
};

/** Has the server use the words; afterwards the line they went to lies open. */
function useWordsUse(desk: Desk, words: ChosenWords) {
  const client = useQueryClient();
  const [state, setState] = useState<{ isBusy: boolean; refusal: string | null }>({ isBusy: false, refusal: null });
  const transcriptId = desk.pattern.recordings.find(({ id }) => id === desk.recordingId)?.transcriptId;
  const use = async (as: WordsUse, lineId?: string) => {
    if (!transcriptId || state.isBusy) return;
    setState({ isBusy: true, refusal: null });
    try {
      await desk.bench.flush();
      const { firstWord, lastWord } = words;
      const body = { transcriptId, firstWord, lastWord, as, ...(lineId !== undefined && { lineId }) };
      const used = await send(WordsUsed, `/api/patterns/${desk.pattern.id}/heard-words`, { method: 'POST', body });
      await client.invalidateQueries({ queryKey: patternQuery(desk.pattern.id).queryKey, exact: true });
      desk.chooseWords(null);
      if (as !== 'material') desk.pick(used.id, true);
      desk.tellDone(DONE[as]);
    } catch (error) {
      const refusal = error instanceof ProblemError ? (error.problem.detail ?? error.problem.title) : null;
      setState({ isBusy: false, refusal: refusal ?? 'The connection was lost. The words are still chosen.' });
    }
  };
  return { ...state, use };
}

function Ends({ words, onChange }: { words: ChosenWords; onChange: (words: ChosenWords) => void }) {
  const move = (end: 'first' | 'last', by: 1 | -1) => () => onChange(moveEnd(words, end, by));
  return (
    <span className="flex flex-wrap items-center text-walnut2">
      <span className="small mr-1">begins</span>
      <IconButton icon={ChevronLeft} label="Begin a word earlier" onClick={move('first', -1)} />
      <IconButton icon={ChevronRight} label="Begin a word later" onClick={move('first', 1)} />
      <span className="small mr-1 ml-3">ends</span>
      <IconButton icon={ChevronLeft} label="End a word earlier" onClick={move('last', -1)} />
      <IconButton icon={ChevronRight} label="End a word later" onClick={move('last', 1)} />
    </span>
  );
}

/** What can be made of the chosen words, and what they would read as. */
export function WordsBar({ words }: { words: ChosenWords }) {
  const desk = useDesk();
  const { use, isBusy, refusal } = useWordsUse(desk, words);
  const open = desk.isOpen ? lineOf(desk, desk.lineId) : undefined;
  const name = open ? lineName(open) || open.kind : '';
  const { pattern, counts, cues, captions, moments, recordingId, lineId, isOpen } = desk;
  const read = useMemo(
    () => readChosen({ pattern, counts, cues, captions, moments, recordingId, lineId, isOpen }, words),
    [words, pattern, counts, cues, captions, moments, recordingId, lineId, isOpen],
  );
  useKeys({ Escape: () => desk.chooseWords(null) });
  if (!read) return null;
  const busy = isBusy ? { notYet: 'One moment.' } : {};
  const said = read.said === null ? '' : `, ${read.said} said`;
  return (
    <section aria-label="Chosen words" className="suggestion m-2.5 flex-none">
      <div className="flex items-start gap-2">
        <p className="said line-clamp-3 min-w-0 grow">“{read.words}”</p>
        <IconButton icon={X} label="Choose nothing" onClick={() => desk.chooseWords(null)} />
      </div>
      <p role="status" className="mt-0.5">
        <b className="font-serif text-[16px] font-semibold">{read.text || 'No instruction in these words'}</b>
        <span className="text-walnut2">{said}</span>
      </p>
      <Ends words={words} onChange={desk.chooseWords} />
      <div className="mt-1.5 flex flex-wrap gap-1.5">
        {open && (
          <Button size="row" onClick={() => void use('again', open.id)} {...busy}>
            Read {name} again as this
          </Button>
        )}
        {open && isCounted(open.kind) && read.said !== null && (
          <Button size="row" onClick={() => void use('total', open.id)} {...busy}>
            {name}’s total
          </Button>
        )}
        <Button size="row" onClick={() => void use('line')} {...busy}>
          Make a line of this
        </Button>
        <Button size="row" onClick={() => void use('step')} {...busy}>
          A step
        </Button>
        <Button size="row" onClick={() => void use('note')} {...busy}>
          A note
        </Button>
        <Button size="row" onClick={() => void use('material')} {...busy}>
          A material
        </Button>
      </div>
      {refusal !== null && <ErrorNote what="Not done.">{refusal}</ErrorNote>}
    </section>
  );
}
