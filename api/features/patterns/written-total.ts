import { countPattern, placeTotal, printTotals, type LineCount, type LineInput } from '#crochet';
import type { Fields, Row } from './entities.ts';
import { isSame } from './deed.service.ts';

const ALONE: LineInput = {
  id: 'line',
  kind: 'round',
  label: '',
  from: null,
  to: null,
  text: '',
  written: null,
  said: null,
};

/** A line read by itself: whether its text holds a total of its own. */
function readAlone(kind: unknown, text: string): LineCount | undefined {
  const line = { ...ALONE, kind: kind as LineInput['kind'], text };
  const piece = { id: 'piece', name: '', make: 1, worked: 'spiral' as const, lines: [line] };
  return countPattern({ terms: 'US', sizes: [], pieces: [piece] }).pieces[0]?.lines[0];
}

/**
 * A total typed in the instruction lives there, and nowhere else; any other is stored beside it. So a new written total
 * goes into the text where one stands in it.
 * @param fields what is to be saved of the line; @param row the line as it is
 */
export function placeWritten(fields: Fields, row?: Row): Fields {
  if (!('written' in fields) && !('text' in fields)) return fields;
  const text = (fields.text ?? row?.text ?? '') as string;
  const own = readAlone(fields.kind ?? row?.kind, text);
  if (!own?.writtenSpan) return fields;
  const isAsked = 'written' in fields && (row !== undefined || fields.written !== null);
  if (!isAsked || isSame(fields.written, own.written)) return { ...fields, written: null };
  const printed = fields.written === null ? null : printTotals(fields.written as Parameters<typeof printTotals>[0]);
  return { ...fields, written: null, text: placeTotal(text, own.writtenSpan, printed) };
}
