import {
  closestCenter,
  DndContext,
  type DragEndEvent,
  KeyboardSensor,
  PointerSensor,
  useSensor,
  useSensors,
} from '@dnd-kit/core';
import { sortableKeyboardCoordinates } from '@dnd-kit/sortable';
import { Plus } from 'lucide-react';
import { useEffect, useRef } from 'react';
import { Button } from '../../../ui/button.tsx';
import { ChecksPanel } from '../checks/checks-panel.tsx';
import { lineName } from '../desk/line-name.ts';
import { lineOf, useDesk } from '../desk/use-desk.ts';
import { ClashBox } from './clash-box.tsx';
import { LINE_GRID } from './line-cells.tsx';
import { NoLines } from './no-lines.tsx';
import { PieceSection } from './piece-section.tsx';
import { Tally } from './tally.tsx';

/** What is being made: pieces, their lines, and how each came out. */
export function PatternPanel() {
  const desk = useDesk();
  const { pattern, bench, lineId, isOpen } = desk;
  const list = useRef<HTMLDivElement>(null);
  const sensors = useSensors(
    useSensor(PointerSensor, { activationConstraint: { distance: 4 } }),
    useSensor(KeyboardSensor, { coordinateGetter: sortableKeyboardCoordinates }),
  );

  useEffect(() => {
    list.current?.querySelector(`[data-line="${lineId}"]`)?.scrollIntoView({ block: 'nearest' });
  }, [lineId, isOpen]);

  const drop = ({ active, over }: DragEndEvent) => {
    const moved = lineOf(desk, String(active.id));
    const target = lineOf(desk, over ? String(over.id) : null);
    if (!moved || !target || moved.id === target.id) return;
    const others = pattern.lines.filter((line) => line.pieceId === target.pieceId && line.id !== moved.id);
    const at = others.findIndex((line) => line.id === target.id);
    const fromAbove = moved.pieceId === target.pieceId && pattern.lines.indexOf(moved) < pattern.lines.indexOf(target);
    bench.edit('line', moved.id, {
      pieceId: target.pieceId,
      after: fromAbove ? target.id : (others[at - 1]?.id ?? null),
    });
  };
  const nameById = (id: string | number) => {
    const line = lineOf(desk, String(id));
    return line ? lineName(line) || line.kind : '';
  };

  return (
    <section aria-labelledby="pattern-heading" className="@container flex min-h-0 min-w-0 flex-col bg-sheet">
      <h2 id="pattern-heading" className="sr-only">
        Pattern
      </h2>
      <Tally checksId="checks" />
      {desk.isChecking && <ChecksPanel id="checks" />}
      {bench.conflicts.length > 0 && (
        <div className="max-h-[45%] flex-none overflow-y-auto border-b border-rule">
          {bench.conflicts.map((conflict) => (
            <ClashBox key={conflict.id} conflict={conflict} />
          ))}
        </div>
      )}
      <div ref={list} className="relative min-h-0 grow overflow-y-auto max-sm:overflow-visible">
        <ColumnHeads />
        <DndContext
          sensors={sensors}
          collisionDetection={closestCenter}
          onDragEnd={drop}
          accessibility={{
            announcements: {
              onDragStart: ({ active }) => `${nameById(active.id)} taken.`,
              onDragOver: ({ active, over }) =>
                over ? `${nameById(active.id)} at the place of ${nameById(over.id)}.` : undefined,
              onDragEnd: ({ active, over }) =>
                over ? `${nameById(active.id)} put at the place of ${nameById(over.id)}.` : undefined,
              onDragCancel: ({ active }) => `${nameById(active.id)} put back.`,
            },
          }}
        >
          {pattern.pieces.map((piece) => (
            <PieceSection key={piece.id} piece={piece} />
          ))}
        </DndContext>
        {pattern.pieces.length === 0 && <NoLines />}
        {pattern.mayEdit && pattern.pieces.length > 0 && (
          <div className="px-2 py-2.5">
            <Button
              kind="quiet"
              icon={Plus}
              onClick={() => bench.add('piece', { name: `Piece ${pattern.pieces.length + 1}` })}
            >
              Add a piece
            </Button>
          </div>
        )}
      </div>
    </section>
  );
}

/** The heads of the totals are set in the voices they name. */
function ColumnHeads() {
  return (
    <div
      aria-hidden
      className={`${LINE_GRID} small sticky top-0 z-10 h-[31px] items-center border-b border-rule bg-sheet text-walnut2 max-sm:hidden!`}
    >
      <span className="overflow-hidden">At</span>
      <span>Round</span>
      <span>Instruction</span>
      <span className="said double-before self-stretch pr-[13px] text-right leading-[31px]! text-walnut">said</span>
      <span className="wr pr-[13px] text-right text-[15px]! text-walnut">written</span>
      <span className="pr-[13px] text-right font-bold whitespace-nowrap text-walnut">worked out</span>
      <span className="overflow-hidden pl-3">Verdict</span>
    </div>
  );
}
