import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Cue, TranscriptHead } from '#contract/recordings';
import { cx } from '../../lib/class-names.ts';
import { formatTenths } from '../../lib/time.ts';
import { Button } from '../../ui/button.tsx';
import { TextField } from '../../ui/field.tsx';
import { ErrorNote, LoadingRows } from '../../ui/notes.tsx';
import { cuesAround, linesAround, momentOfLine } from './problem-view.ts';
import { captionsQuery, transcriptQuery, useCorrectCaption } from './recordings.queries.ts';

/** A caption as it was read; what it says can be corrected, and what the file said stays beside it. */
function Caption({ cue, transcriptId, mayEdit }: { cue: Cue; transcriptId: string; mayEdit: boolean }) {
  const correct = useCorrectCaption(transcriptId);
  const [words, setWords] = useState<string | null>(null);
  const save = (corrected: string | null) => correct.mutate({ cue, corrected }, { onSuccess: () => setWords(null) });
  return (
    <li className="grid grid-cols-[48px_minmax(0,1fr)] py-0.5">
      <span className="small border-r border-rule pr-2.5 text-right text-walnut3">{cue.ordinal}</span>
      <div className="min-w-0 pr-3.5 pl-3">
        <p className="small flex min-h-[26px] items-center gap-1 text-walnut2">
          <span className="mr-auto">
            {formatTenths(cue.startMs)} – {formatTenths(cue.endMs)}
          </span>
          {mayEdit && words === null && cue.corrected !== null && (
            <Button kind="quiet" size="row" onClick={() => save(null)}>
              Back to the file
            </Button>
          )}
          {mayEdit && words === null && (
            <Button
              kind="quiet"
              size="row"
              aria-label={`Change caption ${cue.ordinal}`}
              onClick={() => setWords(cue.corrected ?? cue.heard)}
            >
              Change
            </Button>
          )}
        </p>
        {words === null ? (
          <p className="said">{cue.corrected ?? cue.heard}</p>
        ) : (
          <TextField
            label={`Caption ${cue.ordinal}`}
            hideLabel
            rows={2}
            value={words}
            onChange={({ target }) => setWords(target.value)}
          />
        )}
        {cue.corrected !== null && words === null && <p className="small text-walnut2">The file has: {cue.heard}</p>}
        {correct.isError && (
          <ErrorNote what="Not saved.">Somebody else was quicker, or the connection was lost.</ErrorNote>
        )}
        {words !== null && (
          <p className="mt-1 flex gap-2">
            <Button size="row" onClick={() => save(words.trim() === cue.heard ? null : words.trim())}>
              Done
            </Button>
            <Button kind="quiet" size="row" onClick={() => setWords(null)}>
              Keep it as it was
            </Button>
          </p>
        )}
      </div>
    </li>
  );
}

interface SourceSideProps {
  transcript: TranscriptHead;
  chosen: number;
  mayEdit: boolean;
}

/** The file about the chosen problem, and the captions that were read there. */
export function SourceSide({ transcript, chosen, mayEdit }: SourceSideProps) {
  const file = useQuery(transcriptQuery(transcript.id));
  const captions = useQuery(captionsQuery(transcript.id));
  const line = Math.max(1, transcript.problems[chosen]?.line ?? 1);
  const source = file.data?.sourceText ?? '';
  const around = linesAround(source, line);
  const isProblem = transcript.problems[chosen] !== undefined && transcript.problems[chosen].line > 0;
  const [first, last] = [around[0]?.number ?? 1, around.at(-1)?.number ?? 1];
  return (
    <>
      <header className="panel-head bg-chalk">
        <h2 className="h-panel">As it was</h2>
        <span className="small ml-auto text-walnut2">
          lines {first} to {last}
        </span>
      </header>
      {file.isPending ? (
        <LoadingRows rows={8} label="Loading the file" />
      ) : (
        <ol className="border-b border-rule py-1.5" aria-label="Lines of the file">
          {around.map(({ number, text, isTime }) => (
            <li
              key={number}
              className={cx(
                'grid min-h-[23px] grid-cols-[48px_minmax(0,1fr)] items-center',
                isProblem && number === line && 'bg-weldwash',
              )}
            >
              <span className="small self-stretch border-r border-rule pr-2.5 text-right leading-[23px] text-walnut3">
                {number}
              </span>
              <span className={cx('min-w-0 truncate pl-3', isTime ? 'small' : 'said')} title={text}>
                {text}
              </span>
            </li>
          ))}
        </ol>
      )}
      <header className="panel-head bg-chalk">
        <h2 className="h-panel">As we read it</h2>
      </header>
      {captions.isPending ? (
        <LoadingRows rows={3} label="Loading the captions" />
      ) : (
        <ol className="py-1.5" aria-label="Captions as read">
          {cuesAround(captions.data?.cues ?? [], momentOfLine(source, line)).map((cue) => (
            <Caption key={cue.id} cue={cue} transcriptId={transcript.id} mayEdit={mayEdit} />
          ))}
        </ol>
      )}
    </>
  );
}
