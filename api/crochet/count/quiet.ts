import { type LineInput } from './input.ts';
import { type LineCount } from './result.ts';

/** A line that is no work: a step or a note. */
export function quiet(line: LineInput): LineCount {
  return {
    id: line.id,
    verdict: 'no-total',
    base: null,
    uses: null,
    count: null,
    made: {},
    written: null,
    writtenSpan: null,
    said: null,
    odd: [],
    unread: [],
    atFault: null,
    message: null,
    follows: null,
    work: [],
    loops: 'both',
    rounds: null,
    rows: null,
    asks: [],
    countedWith: null,
    walk: [],
    sizes: [],
  };
}
