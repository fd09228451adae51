import { queryOptions } from '@tanstack/react-query';
import { readPattern } from './bench-api.ts';

/** The bench document. The bench itself keeps it fresh; other pages of a pattern read it from here too. */
export const patternQuery = (patternId: string) =>
  queryOptions({
    queryKey: ['patterns', patternId],
    queryFn: ({ signal }) => readPattern(patternId, signal),
  });
