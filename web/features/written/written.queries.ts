import { PatternHead } from '#contract/patterns';
import { type WrittenPattern } from '#contract/written';
import { send } from '../../lib/http.ts';

/** Makes the pattern. The id is the caller's, so that the same sent again makes no second one. */
export const sendWritten = (pattern: WrittenPattern): Promise<PatternHead> =>
  send(PatternHead, '/api/patterns/written', { method: 'POST', body: pattern });
