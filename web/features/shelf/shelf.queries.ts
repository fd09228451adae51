import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { PatternHead } from '#contract/patterns';
import { Shelf, type ShelfPart, type ShelfPattern } from '#contract/shelf';
import { send } from '../../lib/http.ts';

/** While something is being read, the shelf looks again by itself. */
const READING_MS = 4_000;

/** A studio's shelf, its archive or its bin. Read anew at each visit: what was written at the bench changes its counts. */
export const shelfQuery = (studioId: string, part: ShelfPart) =>
  queryOptions({
    queryKey: ['shelf', studioId, part],
    queryFn: ({ signal }) => send(Shelf, `/api/patterns?studioId=${studioId}&part=${part}`, { signal }),
    staleTime: 0,
    refetchInterval: ({ state }) =>
      state.data?.patterns.some((pattern) => pattern.state === 'reading') ? READING_MS : false,
  });

export type ShelfStep = 'bin' | 'restore' | 'archive' | 'unarchive';
type Of = Pick<ShelfPattern, 'id' | 'version'>;

/** Binning, archiving and their way back. The list is read again also after a refusal: somebody else was quicker. */
export function useShelfStep(studioId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ of, step }: { of: Of; step: ShelfStep }) =>
      send(PatternHead, `/api/patterns/${of.id}/${step}`, { method: 'POST', version: of.version, body: {} }),
    onSettled: () => client.invalidateQueries({ queryKey: ['shelf', studioId] }),
  });
}

/** A copy to work on, under a code of its own. */
export function useDuplicate(studioId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, key }: { id: string; key: string }) =>
      send(PatternHead, `/api/patterns/${id}/duplicate`, {
        method: 'POST',
        headers: { 'Idempotency-Key': key },
        body: {},
      }),
    onSettled: () => client.invalidateQueries({ queryKey: ['shelf', studioId] }),
  });
}
