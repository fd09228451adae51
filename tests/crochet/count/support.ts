import { countPattern, type LineCount, type PatternInput, type Terms } from '#crochet';

export interface Given {
  readonly terms?: Terms;
  readonly base?: number;
  readonly worked?: 'spiral' | 'joined' | 'rows';
  readonly sizes?: readonly string[];
}

/** Lines of one piece as an input; `F: ch 14` is a foundation, `R7-12: …` keeps its numbers. */
export function inputFor(lines: readonly string[], given: Given = {}): PatternInput {
  return {
    terms: given.terms ?? 'US',
    sizes: given.sizes ?? [],
    base: given.base ?? null,
    pieces: [
      {
        id: 'piece',
        name: 'Piece',
        make: 1,
        worked: given.worked ?? 'joined',
        lines: lines.map((text, i) => {
          const label = /^R(\d+)(?:[-–](\d+))?/.exec(text);
          const from = label ? Number(label[1]) : i + 1;
          const isFoundation = text.startsWith('F: ');
          return {
            id: `line-${String(i)}`,
            kind: isFoundation
              ? ('foundation' as const)
              : given.worked === 'rows'
                ? ('row' as const)
                : ('round' as const),
            label: `R${String(from)}`,
            from: isFoundation ? null : from,
            to: isFoundation ? null : label?.[2] ? Number(label[2]) : from,
            text: isFoundation ? text.slice(3) : text,
            written: null,
            said: null,
          };
        }),
      },
    ],
  };
}

export const countLines = (lines: readonly string[], given: Given = {}): readonly LineCount[] =>
  countPattern(inputFor(lines, given)).pieces[0]!.lines;

/** `24 18 agrees`: base, count and verdict in three words. */
export const inShort = ({ base, count, verdict }: Pick<LineCount, 'base' | 'count' | 'verdict'>): string =>
  `${String(base ?? '-')} ${String(count ?? '-')} ${verdict}`;
