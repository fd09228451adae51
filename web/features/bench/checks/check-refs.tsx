import { useState } from 'react';
import { type Check, type CheckRef } from '#crochet';
import { type Desk, useDesk } from '../desk/use-desk.ts';

const SHOWN = 6;

/** The line that a reference leads to: its own, or the first of its piece. */
const lineIdOf = ({ pattern }: Desk, { lineId, pieceId }: CheckRef): string | null =>
  lineId ?? pattern.lines.find((line) => line.pieceId === pieceId)?.id ?? null;

/** What a check is about, each the way to its line, and what it says of them. */
export function CheckWords({ check: { refs, sentence } }: { check: Pick<Check, 'refs' | 'sentence'> }) {
  const desk = useDesk();
  const [isWhole, setWhole] = useState(false);
  const shown = isWhole || refs.length <= SHOWN + 1 ? refs : refs.slice(0, SHOWN);
  const open = (ref: CheckRef) => {
    const id = lineIdOf(desk, ref);
    if (id === null) return;
    desk.pick(id, true);
    desk.goTo(id);
  };
  return (
    <p className="max-w-[68ch]">
      {shown.map((ref, i) => (
        <span key={`${ref.lineId} ${i}`}>
          {i > 0 && ', '}
          <button type="button" className="font-bold hover:text-woad hover:underline" onClick={() => open(ref)}>
            {ref.name}
          </button>
        </span>
      ))}
      {shown.length < refs.length && (
        <>
          {' and '}
          <button type="button" className="link" onClick={() => setWhole(true)}>
            {refs.length - shown.length} more
          </button>
        </>
      )}{' '}
      {sentence}
    </p>
  );
}
