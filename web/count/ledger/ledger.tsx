import { type KeyboardEvent, useEffect, useMemo, useRef } from 'react';
import { useStable } from '../../lib/use-stable.ts';
import { useDesk } from '../use-desk.ts';
import { usePrinting } from '../use-printing.ts';
import { type Chunk, chunksOf, rowsIn } from './chunks.ts';
import { FirstSteps } from './first-steps.tsx';
import { LedgerChunk } from './ledger-chunk.tsx';
import { Notes } from './notes.tsx';
import { Progress } from './progress.tsx';
import { Tally, WholeOffers } from './tally.tsx';

const holds = (chunk: Chunk, id: string | null) => id !== null && rowsIn(chunk).some((row) => row.id === id);

/** The heads of the totals are set in the voices they name. */
function ColumnHeads() {
  return (
    <div
      aria-hidden
      className="count-grid count-heads small sticky top-0 z-10 border-b border-rule bg-sheet text-walnut2"
    >
      <span>Round</span>
      <span>Instruction</span>
      <span className="wr double-before self-stretch pr-[13px] text-right text-[15px]! leading-[31px]! text-walnut">
        written
      </span>
      <span className="pr-[13px] text-right font-bold whitespace-nowrap text-walnut">worked out</span>
      <span className="pl-3">Verdict</span>
    </div>
  );
}

/** Every line with its totals and its verdict. Arrows go from line to line, one stop of the Tab key. */
export function Ledger() {
  const { written, counting, placed, open, pick } = useDesk();
  const pieces = counting.result?.pieces;
  const chunks = useMemo(() => chunksOf(pieces ?? []), [pieces]);
  const list = useRef<HTMLDivElement>(null);
  const isPrinted = usePrinting();
  const openId = open?.row.id ?? null;
  const stopId = openId ?? placed[0]?.row.id ?? null;
  /** The focus goes along: a line that opens or closes is another element. */
  const onPick = useStable((id: string | null) => {
    const focusId = id ?? openId;
    if (list.current?.contains(document.activeElement))
      requestAnimationFrame(() => list.current?.querySelector<HTMLElement>(`[data-line="${focusId}"]`)?.focus());
    pick(id, id !== null);
  });

  useEffect(() => {
    if (openId === null) return;
    const row = list.current?.querySelector<HTMLElement>(`[data-line="${openId}"]`);
    row?.scrollIntoView({ block: 'nearest' });
  }, [openId]);

  const press = (event: KeyboardEvent) => {
    const way = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (event.key === 'Escape' && openId !== null) {
      onPick(null);
      return;
    }
    if (way === undefined || event.altKey || event.ctrlKey || event.metaKey) return;
    const at = placed.findIndex(({ row }) => row.id === openId);
    const next = placed[at < 0 ? 0 : at + way];
    if (!next) return;
    event.preventDefault();
    onPick(next.row.id);
  };

  return (
    <section aria-label="Worked out" className="@container flex min-h-0 min-w-0 flex-col bg-sheet">
      <Tally />
      <Progress />
      <WholeOffers />
      {placed.length === 0 && (!counting.isBusy || written.text.trim() === '') ? (
        <FirstSteps />
      ) : (
        <div ref={list} className="count-scroll relative min-h-0 grow overflow-y-auto" onKeyDown={press}>
          {placed.length > 0 && <ColumnHeads />}
          {chunks.map((chunk, i) => (
            <LedgerChunk
              key={i}
              chunk={chunk}
              openId={holds(chunk, openId) ? openId : null}
              stopId={holds(chunk, stopId) ? stopId : null}
              isPrinted={isPrinted}
              onPick={onPick}
            />
          ))}
          <Notes />
        </div>
      )}
    </section>
  );
}
