import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { PatternHead } from '#contract/patterns';
import type { Recording, RecordingCreate } from '#contract/recordings';
import {
  addRecording,
  createPattern,
  editPattern,
  patternHeadQuery,
  recordingsQuery,
  useRefresh,
} from './recordings.queries.ts';
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
  const refresh = useRefresh(patternId);
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
      if (head.data) return head.data;
      if (patternId !== undefined) return client.query(patternHeadQuery(patternId));
      const made = await createPattern({
        ...ids.pattern,
        studioId,
        title: title.trim() || fallback,
        ...(terms !== undefined && { terms }),
      });
      client.setQueryData(patternHeadQuery(made.id).queryKey, made);
      setTyped({});
      setSearch({ pattern: made.id }, { replace: true });
      return made;
    });

  const save = async (edit: { title?: string; terms?: 'US' | 'UK' }) => {
    setTyped((before) => ({ ...before, ...edit }));
    if (patternId === undefined) return;
    const present = await client.query({ ...patternHeadQuery(patternId), staleTime: 0 });
    client.setQueryData(patternHeadQuery(patternId).queryKey, await editPattern(present, edit));
    setTyped({});
  };

  const ensureRecording = (name: string, elsewhere: Elsewhere = {}): Promise<Recording & { patternId: string }> => {
    const made = recordingOnce(async () => {
      if (chosen) return chosen;
      const { id } = await ensurePattern(name);
      return addRecording(id, { ...ids.recording, title: name, ...elsewhere });
    });
    return made.then(async (recording) => ({ ...recording, patternId: (await ensurePattern(name)).id }));
  };

  return {
    patternId,
    title,
    terms,
    list: list.data,
    recordings,
    chosen,
    refresh: () => void refresh(),
    type: (newTitle: string) => setTyped((before) => ({ ...before, title: newTitle })),
    save,
    choose: setChosenId,
    ensurePattern,
    /** The chosen recording; the first is made, named after its file, when it is needed. */
    ensureRecording: async (fileName: string, elsewhere?: Elsewhere) => {
      const { id, title: name, patternId: of } = await ensureRecording(nameOfFile(fileName), elsewhere);
      return { recordingId: id, patternId: of, title: name };
    },
    addAnother: async () => {
      const { id } = await ensurePattern('New pattern');
      const made = await addRecording(id, { ...ownId(), title: `Part ${recordings.length + 1}` });
      await client.invalidateQueries({ queryKey: recordingsQuery(id).queryKey });
      setChosenId(made.id);
    },
  };
}

export type NewPattern = ReturnType<typeof useNewPattern>;
