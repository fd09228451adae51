import { useQuery } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import type { CaptionCorrection } from '#contract/readings';
import type { Recording } from '#contract/recordings';
import { formatMoment } from '../../lib/time.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { useToast } from '../../ui/toast.tsx';
import { correctionsQuery, useCorrections } from './readings.queries.ts';

/** How long a place is played, in milliseconds. */
const HEAR_MS = 5_000;

/** Plays a few seconds of the clip from a moment on; null where there is no clip. */
function useHear(clipUrl: string | undefined): ((atMs: number) => void) | null {
  const sound = useRef<HTMLAudioElement | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  useEffect(
    () => () => {
      clearTimeout(timer.current);
      sound.current?.pause();
    },
    [],
  );
  if (clipUrl === undefined) return null;
  return (atMs) => {
    sound.current ??= new Audio(clipUrl);
    const audio = sound.current;
    audio.currentTime = Math.max(0, atMs / 1000 - 1);
    void audio.play().catch(() => undefined);
    clearTimeout(timer.current);
    timer.current = setTimeout(() => audio.pause(), HEAR_MS);
  };
}

function Row(props: {
  correction: CaptionCorrection;
  mayTake: boolean;
  hear: ((atMs: number) => void) | null;
  onTake: () => void;
}) {
  const { correction: one, mayTake, hear, onTake } = props;
  const at = formatMoment(one.atMs);
  return (
    <li className="grid min-h-[44px] grid-cols-[56px_minmax(0,1fr)_auto] items-center gap-x-3 border-b border-feint px-6 py-1.5 max-sm:px-4">
      {hear ? (
        <button
          type="button"
          className="small min-h-11 text-left text-woad underline-offset-2 hover:underline"
          aria-label={`Hear it at ${at}`}
          onClick={() => hear(one.atMs)}
        >
          {at}
        </button>
      ) : (
        <span className="small text-walnut3">{at}</span>
      )}
      <p className="said min-w-0">
        <span className="text-walnut2">{one.before} </span>
        <s className="text-walnut2">{one.heard}</s> <b className="border-b-[1.5px] border-woad">{one.meant}</b>
        <span className="text-walnut2"> {one.after}</span>
      </p>
      {mayTake && (
        <Button
          size="row"
          data-correction={one.key}
          aria-label={`Write ${one.meant} for ${one.heard}, at ${at}`}
          onClick={onTake}
        >
          Write it
        </Button>
      )}
    </li>
  );
}

const SHOWN = 12;

/**
 * Trade words that were mis-heard, each with its moment and its neighbours. Enter writes one and goes on to the next; what
 * the file said is kept and comes back by Undo.
 */
export function CorrectionsPanel({ recording, mayEdit }: { recording: Recording; mayEdit: boolean }) {
  const transcriptId = recording.transcript?.id ?? '';
  const { data } = useQuery(correctionsQuery(transcriptId));
  const write = useCorrections(transcriptId);
  const hear = useHear(recording.clip?.url);
  const toast = useToast();
  const list = useRef<HTMLUListElement>(null);
  const [showsAll, setAll] = useState(false);
  const open = data?.corrections.filter(({ isTaken }) => !isTaken) ?? [];
  const done = (data?.corrections.length ?? 0) - open.length;
  if (!data || data.corrections.length === 0) return null;

  const take = (taken: readonly CaptionCorrection[]) => {
    const at = open.findIndex(({ key }) => key === taken[0]?.key);
    const next = taken.length === 1 ? (open[at + 1] ?? open[at - 1])?.key : undefined;
    write.mutate(
      { take: taken.map(({ key }) => key) },
      {
        onSuccess: ({ was }) => {
          const words = taken.length === 1 ? `“${taken[0]!.meant}” written` : `${taken.length} places written`;
          toast(words, () => write.mutate({ putBack: was }, { onSuccess: () => toast('Put back') }));
          if (next !== undefined) list.current?.querySelector<HTMLElement>(`[data-correction="${next}"]`)?.focus();
        },
      },
    );
  };
  const shown = showsAll ? open : open.slice(0, SHOWN);
  const mayTake = mayEdit && data.mayTake;
  return (
    <section aria-labelledby="misheard-heading">
      <div className="flex flex-wrap items-center gap-x-3 gap-y-1 border-b border-rule px-6 py-2.5 max-sm:px-4">
        <h3 id="misheard-heading" className="h-panel">
          Words that were mis-heard
        </h3>
        <span role="status" className="text-walnut2">
          {open.length === 0 ? 'All are put right in the captions.' : `${open.length} to put right`}
          {open.length > 0 && done > 0 ? `, ${done} done` : ''}
        </span>
        {mayTake && open.length > 1 && (
          <Button
            size="row"
            className="ml-auto"
            onClick={() => take(open)}
            {...(write.isPending ? { notYet: 'They are being written.' } : {})}
          >
            Write all {open.length}
          </Button>
        )}
      </div>
      {write.isError && (
        <div className="px-6 py-2 max-sm:px-4">
          <ErrorNote what="Not written.">The connection was lost. The captions are as they were.</ErrorNote>
        </div>
      )}
      <ul ref={list} aria-label="Words to put right">
        {shown.map((one) => (
          <Row key={one.key} correction={one} mayTake={mayTake} hear={hear} onTake={() => take([one])} />
        ))}
      </ul>
      {open.length > shown.length && (
        <p className="border-b border-feint px-6 py-1.5 max-sm:px-4">
          <Button kind="quiet" size="row" onClick={() => setAll(true)}>
            Show the other {open.length - shown.length}
          </Button>
        </p>
      )}
    </section>
  );
}
