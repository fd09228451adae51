import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { PatternHead } from '#contract/patterns';
import type { Recording, RecordingCreate } from '#contract/recordings';
import { addRecording, createPattern, editPattern, patternHeadQuery, recordingsQuery } from './recordings.queries.ts';
import { nameOfFile } from './use-recording-files.ts';

/** An id of our own, so that a request sent twice makes one thing; where the browser makes none, the server does. */
function ownId(): { id?: string } {
  return globalThis.isSecureContext ? { id: crypto.randomUUID() } : {};
}

type Elsewhere = Pick<RecordingCreate, 'publicUrl' | 'publicOffsetMs'>;

/** Whoever asks first makes it; all who ask meanwhile wait for the same. */
function useOnce<T>() {
  const pending = useRef<Promise<T> | null>(null);
  return (make: () => Promise<T>): Promise<T> => {
    pending.current ??= make().finally(() => (pending.current = null));
    return pending.current;
  };
}

/**
 * A pattern that is being set up. It is made when the first thing is given (a file, an address, or the wish to write
 * by hand) and then stands in the address of the page, so that a reload loses nothing.
 */
export function useNewPattern(studioId: string) {
  const [search, setSearch] = useSearchParams();
  const patternId = search.get('pattern') ?? undefined;
  const client = useQueryClient();
  // What was made is known here at once, before the address of the page has followed.
  const made = useRef<{ pattern?: PatternHead; recording?: Recording }>({});
  const head = useQuery({ ...patternHeadQuery(patternId ?? ''), enabled: patternId !== undefined });
  const list = useQuery({ ...recordingsQuery(patternId ?? ''), enabled: patternId !== undefined });
  const [ids] = useState(() => ({ pattern: ownId(), recording: ownId() }));
  const [typed, setTyped] = useState<{ title?: string; terms?: 'US' | 'UK' }>({});
  const [chosenId, setChosenId] = useState<string>();
  const patternOnce = useOnce<PatternHead>();
  const recordingOnce = useOnce<Recording>();

  const recordings = list.data?.recordings ?? [];
  const chosen = recordings.find(({ id }) => id === chosenId) ?? recordings[0];
  const title = typed.title ?? head.data?.title ?? '';
  const terms = typed.terms ?? head.data?.terms;

  const ensurePattern = (fallback: string): Promise<PatternHead> =>
    patternOnce(async () => {
      const present = head.data ?? made.current.pattern;
      if (present) return present;
      if (patternId !== undefined) return client.query(patternHeadQuery(patternId));
      const pattern = await createPattern({
        ...ids.pattern,
        studioId,
        title: title.trim() || fallback,
        ...(terms !== undefined && { terms }),
      });
      made.current.pattern = pattern;
      client.setQueryData(patternHeadQuery(pattern.id).queryKey, pattern);
      setTyped({});
      setSearch({ pattern: pattern.id }, { replace: true });
      return pattern;
    });

  const save = async (edit: { title?: string; terms?: 'US' | 'UK' }) => {
    setTyped((before) => ({ ...before, ...edit }));
    if (patternId === undefined) return;
    const present = await client.query({ ...patternHeadQuery(patternId), staleTime: 0 });
    client.setQueryData(patternHeadQuery(patternId).queryKey, await editPattern(present, edit));
    setTyped({});
  };

  const ensureRecording = async (name: string, elsewhere: Elsewhere = {}) => {
    const pattern = await ensurePattern(name);
    const recording = await recordingOnce(async () => {
      const present = chosen ?? made.current.recording;
      if (present) return present;
      made.current.recording = await addRecording(pattern.id, { ...ids.recording, title: name, ...elsewhere });
      return made.current.recording;
    });
    return { recordingId: recording.id, patternId: pattern.id, title: recording.title };
  };

  return {
    patternId,
    title,
    terms,
    list: list.data,
    recordings,
    chosen,
    refresh: () => {
      const id = patternId ?? made.current.pattern?.id;
      void client.invalidateQueries({ queryKey: ['patterns', id] });
    },
    type: (newTitle: string) => setTyped((before) => ({ ...before, title: newTitle })),
    save,
    choose: setChosenId,
    ensurePattern,
    /** The chosen recording; the first is made, named after its file, when it is needed. */
    ensureRecording: (fileName: string, elsewhere?: Elsewhere) => ensureRecording(nameOfFile(fileName), elsewhere),
    addAnother: async () => {
      const { id } = await ensurePattern('New pattern');
      const another = await addRecording(id, { ...ownId(), title: `Part ${recordings.length + 1}` });
      await client.invalidateQueries({ queryKey: recordingsQuery(id).queryKey });
      setChosenId(another.id);
    },
  };
}
