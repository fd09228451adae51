import { infiniteQueryOptions } from '@tanstack/react-query';
import { ChangePage } from '#contract/changes';
import { send } from '../../../lib/http.ts';

const PAGE = 30;

/** What was done to one row, newest first; read anew when the pattern's last change is another. */
export const rowHistoryQuery = (patternId: string, entityId: string, lastChange: number) =>
  infiniteQueryOptions({
    queryKey: ['patterns', patternId, 'changes', entityId, lastChange],
    queryFn: ({ pageParam, signal }) => {
      const before = pageParam === null ? '' : `&before=${pageParam}`;
      return send(ChangePage, `/api/patterns/${patternId}/changes?entityId=${entityId}&limit=${PAGE}${before}`, {
        signal,
      });
    },
    initialPageParam: null as number | null,
    getNextPageParam: (page) => (page.more ? page.changes.at(-1)?.id : undefined),
  });
