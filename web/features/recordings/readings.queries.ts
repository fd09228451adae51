import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import * as z from 'zod';
import { Undone } from '#contract/changes';
import { CaptionCorrections, ReadingDifferences, type CorrectionsTake, type ReadingTake } from '#contract/readings';
import { ReadingTaken } from '#contract/recordings';
import { send } from '../../lib/http.ts';
import { captionsQuery, useRefresh } from './recordings.queries.ts';

/** A reading held against its pattern, line by line. */
export const differencesQuery = (patternId: string, readingId: string) =>
  queryOptions({
    queryKey: ['patterns', patternId, 'differences', readingId],
    queryFn: ({ signal }) =>
      send(ReadingDifferences, `/api/patterns/${patternId}/readings/${readingId}/differences`, { signal }),
  });

/** Trade words that were mis-heard in a transcript. */
export const correctionsQuery = (transcriptId: string) =>
  queryOptions({
    queryKey: ['transcripts', transcriptId, 'corrections'],
    queryFn: ({ signal }) => send(CaptionCorrections, `/api/transcripts/${transcriptId}/corrections`, { signal }),
  });

const Nothing = z.undefined();

/** What is taken of a reading, left out of the pattern again, and undone. */
export function useReadingDeeds(patternId: string) {
  const refresh = useRefresh(patternId);
  const onSettled = () => refresh();
  return {
    take: useMutation({
      mutationFn: ({ readingId, choice }: { readingId: string; choice: ReadingTake }) =>
        send(ReadingTaken, `/api/patterns/${patternId}/readings/${readingId}/take`, { method: 'POST', body: choice }),
      onSettled,
    }),
    leaveOut: useMutation({
      mutationFn: ({ id, version }: { id: string; version: number }) =>
        send(Nothing, `/api/pieces/${id}`, { method: 'DELETE', version }),
      onSettled,
    }),
    undo: useMutation({
      mutationFn: () => send(Undone, `/api/patterns/${patternId}/undo`, { method: 'POST', body: {} }),
      onSettled,
    }),
  };
}

/** Writes what was meant into captions, or puts captions back; the captions are read again. */
export function useCorrections(transcriptId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (asked: CorrectionsTake) =>
      send(CaptionCorrections, `/api/transcripts/${transcriptId}/corrections`, { method: 'POST', body: asked }),
    onSuccess: (told) => client.setQueryData(correctionsQuery(transcriptId).queryKey, told),
    // The captions follow; whoever goes on to the next word does not wait for them.
    onSettled: () => void client.invalidateQueries({ queryKey: captionsQuery(transcriptId).queryKey }),
  });
}
