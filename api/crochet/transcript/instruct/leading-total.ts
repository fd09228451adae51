import { type Token } from '../tokens.ts';
import { type Event } from './event.ts';
import { textOf } from './spoken-of.ts';

const LEADS =
  /^(?:stitches |stitch |sts |again |still )*(?:for|on|in|at|makes|is)(?: each| every| all)?(?: one)?(?: of)?(?: the)?$/;

/** `Thirty four for round twelve`: a total told before its line is named. */
export function leadingTotal(tokens: readonly Token[], from: number, mark: number): readonly Event[] {
  for (let i = from; i < mark; i++) {
    const { kind, value } = tokens[i]!;
    const before = tokens[i - 1]?.kind ?? '.';
    if (kind !== 'N' || !'.|,&~='.includes(before) || !LEADS.test(textOf(tokens, i + 1, mark))) continue;
    const n = Number(value);
    return [{ type: 'number', at: i, end: i + 1, sentence: -1, n, asTotal: 2, asItem: -2, asTimes: -2 }];
  }
  return [];
}
