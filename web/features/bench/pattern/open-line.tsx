import { useId, useState } from 'react';
import { type LineCount } from '#crochet';
import { type Line, type LineEdit } from '#contract/rows';
import { cx } from '../../../lib/class-names.ts';
import { formatMoment } from '../../../lib/time.ts';
import { Button } from '../../../ui/button.tsx';
import { focusLine } from '../desk/focus-line.ts';
import { isCounted } from '../desk/bench-count.ts';
import { lineName } from '../desk/line-name.ts';
import { mainMark } from '../desk/moments.ts';
import { type Desk, lineOf, useDesk } from '../desk/use-desk.ts';
import { AlsoSaid } from './also-said.tsx';
import { Heard } from './heard.tsx';
import { InstructionField } from './instruction-field.tsx';
import { isRow, LINE_GRID, VerdictCell, WorkedCell } from './line-cells.tsx';
import { LeaveAsIs } from './leave-as-is.tsx';
import { LineTools } from './line-tools.tsx';
import { Moment } from './moment.tsx';
import { Suggestion } from '../../../parts/suggestion.tsx';
import { TotalField } from './total-field.tsx';
import { copyTotals } from './copy-totals.ts';
import { useRepair, useRepairing } from '../desk/repairing.ts';

/** The one loud thing on the screen: the line that is being written. */
export function OpenLine({
  line,
  count,
  follows,
}: {
  line: Line;
  count: LineCount | undefined;
  follows: string | undefined;
}) {
  const desk = useDesk();
  const messageId = useId();
  const [hasTools, setTools] = useState(false);
  const repair = useRepair(desk, line.id);
  const takeIt = useRepairing(desk);
  const { mayEdit, marks } = desk.pattern;
  const edit = (fields: LineEdit) => desk.bench.edit('line', line.id, fields);
  const name = lineName(line) || line.kind;
  const mark = mainMark(marks, line.id);
  const indent = 'ml-[124px] mr-3.5 @max-[600px]:ml-3.5';

  return (
    <section
      aria-label={`${name}, open`}
      data-line={line.id}
      className="bar relative -mt-px border-y-[1.5px] border-woad bg-sheet"
    >
      <div className={cx(LINE_GRID, 'items-start pt-[7px]')}>
        <span className="small overflow-hidden leading-[34px]! text-walnut3">
          {mark ? formatMoment(mark.startMs) : ''}
        </span>
        <span className="truncate leading-[34px] font-bold">{lineName(line)}</span>
        <div className="mr-2 pb-[7px]">
          <InstructionField
            name={name}
            text={line.text}
            count={count}
            describedBy={messageId}
            readOnly={!mayEdit}
            onType={(text) => edit({ text })}
            onDone={() => closeLine(desk)}
          />
        </div>
        <div className="double-before self-stretch pr-1">
          {isRow(line) && (
            <TotalField
              name={name}
              voice="said"
              totals={line.said}
              isOdd={count?.odd.includes('said') ?? false}
              readOnly={!mayEdit}
              className="ml-auto block w-auto! min-w-11 border-transparent! bg-transparent! px-[9px]! hover:border-edge!"
              onChange={(said) => edit({ said: copyTotals(said) })}
            />
          )}
        </div>
        <div className="pr-1">
          {isRow(line) && (
            <TotalField
              name={name}
              voice="written"
              totals={count?.written ?? line.written}
              isOdd={count?.odd.includes('written') ?? false}
              readOnly={!mayEdit}
              className="ml-auto block w-auto! min-w-12 px-[9px]!"
              onChange={(written) => desk.bench.setWritten(line.id, copyTotals(written))}
            />
          )}
        </div>
        <div className="pt-[7px]">
          <WorkedCell line={line} count={count} />
        </div>
        <div className="pt-[7px]">
          <VerdictCell line={line} count={count} follows={follows} />
        </div>
      </div>
      <p
        id={messageId}
        role="status"
        className={cx(
          indent,
          count?.message && isCounted(line.kind) && 'pb-1.5',
          count?.verdict === 'unread' ? 'text-weld' : 'text-madder',
        )}
      >
        {isCounted(line.kind) ? count?.message : ''}
      </p>
      <div className={indent}>
        {repair && mayEdit && (
          <Suggestion
            repair={repair}
            lineName={repair.lineId === line.id ? null : nameOf(desk, repair.lineId)}
            onUse={() => takeIt(repair)}
          />
        )}
        <AlsoSaid line={line} count={count} />
        <LeaveAsIs line={line} count={count} />
        <Heard lineId={line.id} />
      </div>
      <div className="flex min-h-[38px] flex-wrap items-center gap-x-3.5 gap-y-1 border-t border-feint px-3.5 py-1">
        <Moment lineId={line.id} />
        <span className="grow" />
        {mayEdit && (
          <Button kind="quiet" size="row" aria-expanded={hasTools} onClick={() => setTools(!hasTools)}>
            {hasTools ? 'Less' : 'More'}
          </Button>
        )}
        <Button size="row" keys={['Enter']} onClick={() => closeLine(desk)}>
          Done
        </Button>
      </div>
      {hasTools && mayEdit && (
        <div className="px-3.5">
          <LineTools line={line} />
        </div>
      )}
    </section>
  );
}

const nameOf = (desk: Desk, lineId: string): string | null => {
  const line = lineOf(desk, lineId);
  return line ? lineName(line) : null;
};

/** Closes the line; the hand, and the focus, stay on it. */
export function closeLine(desk: Desk): void {
  const { lineId } = desk;
  desk.pick(lineId);
  focusLine(lineId);
}
