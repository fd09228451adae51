import { queryOptions } from '@tanstack/react-query';
import { z } from 'zod';
import { ChangePage } from '#contract/changes';
import { send } from '../../../lib/http.ts';
import { readPattern } from './bench-api.ts';

/** The bench document. The bench itself keeps it fresh; other pages of a pattern read it from here too. */
export const patternQuery = (patternId: string) =>
  queryOptions({
    queryKey: ['patterns', patternId],
    queryFn: ({ signal }) => readPattern(patternId, signal),
  });

/** One row from the start ("R14 from the start"), newest first. */
export const rowHistoryQuery = (patternId: string, rowId: string) =>
  queryOptions({
    queryKey: ['patterns', patternId, 'changes', rowId],
    queryFn: ({ signal }) =>
      send(ChangePage, `/api/patterns/${z.uuid().parse(patternId)}/changes?entityId=${rowId}&limit=200`, { signal }),
  });
