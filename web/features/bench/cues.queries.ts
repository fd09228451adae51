import { queryOptions, useQueries } from '@tanstack/react-query';
import { type Pattern } from '#contract/patterns';
import { CueList } from '#contract/recordings';
import { send } from '../../lib/http.ts';
import { type CuesByRecording } from './desk/use-desk.ts';

/** Captions of one transcript. */
export const cuesQuery = (transcriptId: string) =>
  queryOptions({
    queryKey: ['transcripts', transcriptId, 'cues'],
    queryFn: ({ signal }) => send(CueList, `/api/transcripts/${transcriptId}/cues`, { signal }),
    staleTime: 60_000,
  });

export interface Cues {
  readonly byRecording: CuesByRecording;
  readonly isLoading: boolean;
  readonly hasFailed: boolean;
  readonly retry: () => void;
}

/** Captions of all recordings of a pattern; the bench can be worked at before they are there. */
export function useCues(recordings: Pattern['recordings']): Cues {
  const ids = recordings.flatMap(({ transcriptId }) => (transcriptId === null ? [] : [transcriptId]));
  return useQueries({
    queries: ids.map((id) => cuesQuery(id)),
    combine: (results) => ({
      byRecording: Object.fromEntries(
        results.flatMap(({ data }) => (data ? [[data.recordingId, data.cues] as const] : [])),
      ),
      isLoading: results.some((one) => one.isLoading),
      hasFailed: results.some((one) => one.isError),
      retry: () => results.forEach((one) => void (one.isError && one.refetch())),
    }),
  });
}
