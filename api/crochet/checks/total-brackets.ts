import { type Span } from '../span.ts';
import { type Check, finding, listed, many } from './check.ts';
import { refsOf, type Scan, type ScanLine } from './scan.ts';

const CLOSING: Readonly<Record<string, string>> = { '(': ')', '[': ']', '{': '}', '<': '>' };

interface Framed {
  readonly at: ScanLine;
  /** "(", "[" … or empty for a total without brackets. */
  readonly bracket: string;
  /** The total with its brackets, or with the dash and spaces before it. */
  readonly whole: Span;
  readonly inner: string;
}

function framed(at: ScanLine): Framed | null {
  const span = at.count.writtenSpan;
  if (!span) return null;
  const { text } = at.line;
  const around = { start: span.start - 1, end: span.end + 1 };
  for (const whole of [span, around]) {
    const bracket = text.charAt(whole.start);
    if (whole.start >= 0 && CLOSING[bracket] === text.charAt(whole.end - 1))
      return { at, bracket, whole, inner: text.slice(whole.start + 1, whole.end - 1).trim() };
  }
  const sign = /[\s,;:=–—-]*$/u.exec(text.slice(0, span.start))?.[0].length ?? 0;
  const whole = { start: span.start - sign, end: text.charAt(span.end) === '.' ? span.end + 1 : span.end };
  const inner = text.slice(span.start, span.end).replace(/^[\s=–—-]+|[.\s]+$/gu, '');
  return { at, bracket: '', whole, inner };
}

const shown = (bracket: string) => (bracket === '' ? 'no brackets' : `${bracket} ${CLOSING[bracket] ?? ''}`);

/** Totals that stand in other brackets than most. One deed puts them all alike; round brackets where it is even. */
export function checkTotalBrackets(scan: Scan): Check[] {
  const all = scan.lines.flatMap((line) => framed(line) ?? []);
  const tally = new Map<string, number>();
  for (const { bracket } of all) tally.set(bracket, (tally.get(bracket) ?? 0) + 1);
  if (tally.size < 2) return [];
  const usual = [...tally].reduce((a, b) => (b[1] > a[1] || (b[1] === a[1] && b[0] === '(') ? b : a))[0] || '(';
  const odd = all.filter(({ bracket }) => bracket !== usual);
  const close = CLOSING[usual]!;
  const [only] = odd;
  if (!only) return [];
  const ways = listed([...new Set(odd.map(({ bracket }) => shown(bracket)))]);
  return [
    finding(
      'total-brackets',
      `${many(odd.length, 'gives its total', 'give their totals')} in ${ways}, the others in ${shown(usual)}.`,
      {
        refs: refsOf(odd.map(({ at }) => at)),
        mend: {
          words: odd.length === 1 ? `Make it ${usual}${only.inner}${close}` : `Make all totals ${shown(usual)}`,
          done: `All totals stand in ${shown(usual)}`,
          changes: odd.map(({ at, whole, inner }) => {
            const before = at.line.text.slice(0, whole.start).trimEnd();
            const text = `${before} ${usual}${inner}${close}${at.line.text.slice(whole.end)}`.trim();
            return { op: 'edit', row: 'line', id: at.line.id, fields: { text } };
          }),
        },
      },
    ),
  ];
}
