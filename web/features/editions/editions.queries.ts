import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { EditionList, PublishDesk, type Publish } from '#contract/editions';
import { send } from '../../lib/http.ts';

const root = (patternId: string) => ['patterns', patternId, 'editions'] as const;

/** Every edition of a pattern, newest first. */
export const editionsQuery = (patternId: string) =>
  queryOptions({
    queryKey: [...root(patternId), 'list'],
    queryFn: ({ signal }) => send(EditionList, `/api/patterns/${patternId}/editions`, { signal }),
  });

/**
 * What the next edition would be, and what holds it back.
 * @param version number of the pattern's newest change: asked anew after every save
 */
export const publishDeskQuery = (patternId: string, version: number) =>
  queryOptions({
    queryKey: [...root(patternId), 'next', version],
    queryFn: ({ signal }) => send(PublishDesk, `/api/patterns/${patternId}/next-edition`, { signal }),
    staleTime: 0,
  });

/** Freezes the next edition, as long as nothing changed since `lastChange`. */
export function usePublish(patternId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ lastChange, ...body }: Publish & { lastChange: number }) =>
      send(EditionList, `/api/patterns/${patternId}/editions`, { method: 'POST', version: lastChange, body }),
    onSuccess: async (list) => {
      client.setQueryData(editionsQuery(patternId).queryKey, list);
      await client.invalidateQueries({ queryKey: ['patterns', patternId] });
    },
    onError: () => client.invalidateQueries({ queryKey: [...root(patternId), 'next'] }),
  });
}

/** Withdraws an edition with a reason, or brings it back (`reason` null). */
export function useWithdraw(patternId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ number, reason }: { number: number; reason: string | null }) => {
      const url = `/api/patterns/${patternId}/editions/${number}/withdrawal`;
      return reason === null
        ? send(EditionList, url, { method: 'DELETE' })
        : send(EditionList, url, { method: 'PUT', body: { reason } });
    },
    onSuccess: (list) => client.setQueryData(editionsQuery(patternId).queryKey, list),
  });
}
