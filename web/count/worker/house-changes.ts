import { countPattern, houseStyle, type PatternInput, type PieceCount, type PieceText } from '#crochet';
import { type Change } from './protocol.ts';

/**
 * The instructions of a piece in house style. Each is offered only if the piece comes out with it exactly as it did:
 * style never changes a count.
 */
export function houseChanges(of: PieceText, input: PatternInput, before: PieceCount): Change[] {
  const piece = input.pieces[0]!;
  const styled = piece.lines.map((line, i) =>
    before.lines[i]!.unread.length === 0 && line.kind !== 'note' && line.kind !== 'step'
      ? houseStyle(line.text, input.terms)
      : null,
  );
  if (styled.every((text) => text === null)) return [];
  const lines = piece.lines.map((line, i) => ({ ...line, text: styled[i] ?? line.text }));
  const after = countPattern({ ...input, pieces: [{ ...piece, lines }] }).pieces[0]!;
  return styled.flatMap((text, i): Change[] => {
    const [was, is] = [before.lines[i]!, after.lines[i]!];
    const isAsBefore =
      was.verdict === is.verdict && was.count === is.count && JSON.stringify(was.work) === JSON.stringify(is.work);
    const { textSpan } = of.lines[i]!;
    return text !== null && isAsBefore ? [{ span: textSpan, text }] : [];
  });
}
