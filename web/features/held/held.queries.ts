import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { Undone } from '#contract/changes';
import { type CutTake, Followed, HeldAgainst, NewCut } from '#contract/held';
import { ReadingTaken } from '#contract/recordings';
import { Line } from '#contract/rows';
import { send } from '../../lib/http.ts';

const at = (patternId: string, recordingId: string) => `/api/patterns/${patternId}/recordings/${recordingId}`;

/** A written pattern held against what was said in one of its recordings. */
export const heldQuery = (patternId: string, recordingId: string) =>
  queryOptions({
    queryKey: ['patterns', patternId, 'held', recordingId],
    queryFn: ({ signal }) => send(HeldAgainst, `${at(patternId, recordingId)}/held`, { signal }),
  });

/** How the moments of a recording lie in its newest transcript. */
export const cutQuery = (patternId: string, recordingId: string) =>
  queryOptions({
    queryKey: ['patterns', patternId, 'cut', recordingId],
    queryFn: ({ signal }) => send(NewCut, `${at(patternId, recordingId)}/cut`, { signal }),
  });

type Without<T> = T extends unknown ? Omit<T, 'lastChange'> : never;

/** What is done on this page; afterwards everything about the pattern is read again, also where somebody was quicker. */
export function useHeldDeeds(patternId: string, recordingId: string) {
  const client = useQueryClient();
  const onSettled = () => client.invalidateQueries({ queryKey: ['patterns', patternId] });
  const url = at(patternId, recordingId);
  return {
    take: useMutation({
      mutationFn: (body: { lastChange: number; lineIds?: string[] }) =>
        send(Followed, `${url}/held`, { method: 'POST', body }),
      onSettled,
    }),
    write: useMutation({
      mutationFn: ({ readingId, ...body }: { readingId: string; lastChange: number; lines: string[] }) =>
        send(ReadingTaken, `/api/patterns/${patternId}/readings/${readingId}/take`, { method: 'POST', body }),
      onSettled,
    }),
    film: useMutation({
      mutationFn: ({ lineId, version, filmed }: { lineId: string; version: number; filmed: boolean }) =>
        send(Line, `/api/lines/${lineId}`, { method: 'PATCH', version, body: { filmed } }),
      onSettled,
    }),
    cut: useMutation({
      mutationFn: (body: Without<CutTake> & { lastChange: number }) =>
        send(Followed, `${url}/cut`, { method: 'POST', body }),
      onSettled,
    }),
    undo: useMutation({
      mutationFn: () => send(Undone, `/api/patterns/${patternId}/undo`, { method: 'POST', body: {} }),
      onSettled,
    }),
  };
}
export type HeldDeeds = ReturnType<typeof useHeldDeeds>;
