import { type Token } from '../tokens.ts';
import { type Event } from './event.ts';

/**
 * Takes out what the speaker took back: `thirty five, no, thirty six`, `three maroon, sorry, four maroon`. What was
 * said before the correction goes where something of the same kind follows it.
 */
export function withoutCorrected(events: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  const out: Event[] = [];
  let corrected = false;
  for (const event of events) {
    if (event.type === 'correction') {
      corrected = true;
      continue;
    }
    const before = out.at(-1);
    if (before !== undefined) {
      const saidNo = before.type === event.type && isTakenBack(tokens, before.end, event.at);
      if (saidNo || (corrected && event.at - before.end < 14)) takeBack(out, event);
    }
    corrected = false;
    out.push(event);
  }
  return out;
}

function isTakenBack(tokens: readonly Token[], from: number, to: number): boolean {
  const between = tokens.slice(from, to);
  return (
    between.length < 4 && between.some((one) => one.text === 'no') && between.every((one) => 'n,~Y'.includes(one.kind))
  );
}

const KIND: Readonly<Record<string, string>> = { unit: 'work', number: 'number', times: 'number' };

function takeBack(out: Event[], event: Event): void {
  const kind = KIND[event.type];
  const isLike = (one: Event) => KIND[one.type] === kind || (kind === 'work' && one.type === 'number');
  if (kind === undefined) return;
  if (kind === 'number') {
    if (isLike(out.at(-1)!)) out.pop();
    return;
  }
  const sentence = out.at(-1)!.sentence;
  while (out.length > 0 && out.at(-1)!.sentence === sentence && isLike(out.at(-1)!)) out.pop();
}
