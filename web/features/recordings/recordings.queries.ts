import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import * as z from 'zod';
import { PatternHead, type PatternCreate, type PatternEdit } from '#contract/patterns';
import {
  Cue,
  CueList,
  Recording,
  RecordingList,
  Transcript,
  TranscriptHead,
  type RecordingCreate,
  type RecordingEdit,
} from '#contract/recordings';
import { send, UnreachableError } from '../../lib/http.ts';

const LOOK_AGAIN_MS = 1_000;
const Nothing = z.undefined();

/** The server is still busy with something of it: a reading, or a clip that has arrived. */
const isBusy = ({ transcript, upload }: Recording) =>
  transcript?.reading.state === 'waiting' || upload?.state === 'completing';

/** The recordings of a pattern; asked again by itself while one of them is being read. */
export const recordingsQuery = (patternId: string) =>
  queryOptions({
    queryKey: ['patterns', patternId, 'recordings'],
    queryFn: ({ signal }) => send(RecordingList, `/api/patterns/${patternId}/recordings`, { signal }),
    refetchInterval: ({ state }) => (state.data?.recordings.some(isBusy) ? LOOK_AGAIN_MS : false),
  });

/** A pattern's own row. */
export const patternHeadQuery = (patternId: string) =>
  queryOptions({
    queryKey: ['patterns', patternId, 'head'],
    queryFn: ({ signal }) => send(PatternHead, `/api/patterns/${patternId}`, { signal }),
  });

/** A transcript with its file as it came; it never changes. */
export const transcriptQuery = (transcriptId: string) =>
  queryOptions({
    queryKey: ['transcripts', transcriptId, 'file'],
    queryFn: ({ signal }) => send(Transcript, `/api/transcripts/${transcriptId}`, { signal }),
    staleTime: Infinity,
  });

export const captionsQuery = (transcriptId: string) =>
  queryOptions({
    queryKey: ['transcripts', transcriptId, 'cues'],
    queryFn: ({ signal }) => send(CueList, `/api/transcripts/${transcriptId}/cues`, { signal }),
    staleTime: 60_000,
  });

export const createPattern = (body: PatternCreate) => send(PatternHead, '/api/patterns', { method: 'POST', body });
export const editPattern = (head: Pick<PatternHead, 'id' | 'version'>, body: PatternEdit) =>
  send(PatternHead, `/api/patterns/${head.id}`, { method: 'PATCH', version: head.version, body });
export const addRecording = (patternId: string, body: RecordingCreate) =>
  send(Recording, `/api/patterns/${patternId}/recordings`, { method: 'POST', body });

/** Sends a transcript's file; where no answer came it is sent once more under the same key, and kept once. */
export async function sendTranscript(recordingId: string, file: File): Promise<TranscriptHead> {
  const headers = globalThis.isSecureContext ? { 'Idempotency-Key': crypto.randomUUID() } : {};
  const attempt = () => {
    const body = new FormData();
    body.append('file', file, file.name);
    return send(TranscriptHead, `/api/recordings/${recordingId}/transcripts`, { method: 'POST', body, headers });
  };
  try {
    return await attempt();
  } catch (error) {
    if (!(error instanceof UnreachableError) || !globalThis.isSecureContext) throw error;
    return attempt();
  }
}

/** Reads everything about a pattern's recordings again, and the bench document with it. */
export function useRefresh(patternId: string | undefined) {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: ['patterns', patternId] });
}

type Of = Pick<Recording, 'id' | 'version'>;
const at = (patternId: string, { id }: Of) => `/api/patterns/${patternId}/recordings/${id}`;

/** What is done with the recordings of a pattern; afterwards they are read again, also where somebody was quicker. */
export function useRecordingDeeds(patternId: string) {
  const refresh = useRefresh(patternId);
  const onSettled = () => refresh();
  return {
    edit: useMutation({
      mutationFn: ({ of, edit }: { of: Of; edit: RecordingEdit }) =>
        send(Recording, at(patternId, of), { method: 'PATCH', version: of.version, body: edit }),
      onSettled,
    }),
    remove: useMutation({
      mutationFn: (of: Of) => send(Nothing, at(patternId, of), { method: 'DELETE', version: of.version }),
      onSettled,
    }),
    putBack: useMutation({
      mutationFn: (of: Of) =>
        send(Recording, `${at(patternId, of)}/put-back`, { method: 'POST', version: of.version, body: {} }),
      onSettled,
    }),
    removeClip: useMutation({
      mutationFn: ({ id }: Of) => send(Nothing, `/api/recordings/${id}/clip`, { method: 'DELETE' }),
      onSettled,
    }),
    letGo: useMutation({
      mutationFn: (uploadId: string) => send(Nothing, `/api/uploads/${uploadId}`, { method: 'DELETE' }),
      onSettled,
    }),
    readAgain: useMutation({
      mutationFn: ({ transcriptId, terms }: { transcriptId: string; terms?: 'US' | 'UK' | null }) =>
        send(TranscriptHead, `/api/transcripts/${transcriptId}/readings`, {
          method: 'POST',
          body: terms === undefined ? {} : { terms },
        }),
      onSettled,
    }),
  };
}

/** Corrects a caption beside what was heard; null takes the correction back. */
export function useCorrectCaption(transcriptId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ cue, corrected }: { cue: Cue; corrected: string | null }) =>
      send(Cue, `/api/cues/${cue.id}`, { method: 'PATCH', version: cue.version, body: { corrected } }),
    onSettled: () => client.invalidateQueries({ queryKey: captionsQuery(transcriptId).queryKey }),
  });
}
