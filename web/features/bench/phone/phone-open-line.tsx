import { type ReactNode, useId, useState } from 'react';
import { type LineCount } from '#crochet';
import { type Line } from '#contract/rows';
import { cx } from '../../../lib/class-names.ts';
import { formatMoment } from '../../../lib/time.ts';
import { Figures } from '../../../parts/totals.tsx';
import { VerdictLabel } from '../../../parts/verdict-mark.tsx';
import { Button } from '../../../ui/button.tsx';
import { isCounted } from '../desk/bench-count.ts';
import { lineName } from '../desk/line-name.ts';
import { mainMark } from '../desk/moments.ts';
import { useRepair, useRepairing } from '../desk/repairing.ts';
import { useDesk } from '../desk/use-desk.ts';
import { AlsoSaid } from '../pattern/also-said.tsx';
import { copyTotals } from '../pattern/copy-totals.ts';
import { Heard } from '../pattern/heard.tsx';
import { InstructionField } from '../pattern/instruction-field.tsx';
import { isRow } from '../pattern/line-cells.tsx';
import { workedFigure } from '../../../parts/worked-figure.ts';
import { LeaveAsIs } from '../pattern/leave-as-is.tsx';
import { LineTools } from '../pattern/line-tools.tsx';
import { Moment } from '../pattern/moment.tsx';
import { Suggestion } from '../../../parts/suggestion.tsx';
import { TotalField } from '../pattern/total-field.tsx';

/** The open line under the thumb: its words large, the three totals as three equal fields of one row, the offer full width. */
export function PhoneOpenLine({
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
  const { bench, pattern } = desk;
  const { mayEdit } = pattern;
  const name = lineName(line) || line.kind;
  const mark = mainMark(pattern.marks, line.id);
  const message = isCounted(line.kind) ? count?.message : null;

  return (
    <section
      aria-label={`${name}, open`}
      data-line={line.id}
      className="bar -mt-px border-y-[1.5px] border-woad bg-sheet"
    >
      <div className="px-4 pt-2.5 pb-3">
        <div className="mb-2 flex items-center">
          <b className="w-[52px] text-[16px]">{lineName(line)}</b>
          <span className="small text-walnut3">{mark ? formatMoment(mark.startMs) : 'no moment'}</span>
          <span className="ml-auto">
            {count && isCounted(line.kind) && <VerdictLabel verdict={count.verdict} follows={follows} />}
          </span>
        </div>
        <InstructionField
          big
          name={name}
          text={line.text}
          count={count}
          describedBy={messageId}
          readOnly={!mayEdit}
          onType={(text) => bench.edit('line', line.id, { text })}
          onDone={() => desk.pick(line.id)}
        />
        <p
          id={messageId}
          role="status"
          className={cx(message && 'pt-2', count?.verdict === 'unread' ? 'text-weld' : 'text-madder')}
        >
          {message}
        </p>
        {isRow(line) && <Totals line={line} count={count} />}
      </div>
      {repair && mayEdit && <Suggestion repair={repair} lineName={null} onUse={() => takeIt(repair)} />}
      <div className="border-t border-feint px-4 py-1.5">
        <AlsoSaid line={line} count={count} />
        <LeaveAsIs line={line} count={count} />
        <Heard lineId={line.id} />
      </div>
      <div className="flex items-center justify-between border-t border-feint px-2">
        <Moment lineId={line.id} />
        {mayEdit && (
          <Button kind="quiet" aria-expanded={hasTools} onClick={() => setTools(!hasTools)}>
            {hasTools ? 'Less' : 'More'}
          </Button>
        )}
      </div>
      {hasTools && mayEdit && (
        <div className="px-4">
          <LineTools line={line} />
        </div>
      )}
    </section>
  );
}

function Totals({ line, count }: { line: Line; count: LineCount | undefined }) {
  const { bench, pattern } = useDesk();
  const name = lineName(line) || line.kind;
  const figure = workedFigure(count);
  const field = 'h-11! border-transparent! bg-transparent! px-1! text-center! text-[20px]! focus:border-edge!';
  const cell = (heading: ReactNode, body: ReactNode) => (
    <div className="flex flex-1 flex-col items-center text-center not-last:border-r not-last:border-feint">
      {heading}
      {body}
    </div>
  );
  const written = count?.written ?? line.written;
  return (
    <div className="mt-2.5 flex">
      {cell(
        <span className="said text-[14px]! leading-[18px]! text-walnut2">said</span>,
        <TotalField
          name={name}
          voice="said"
          totals={line.said}
          isOdd={count?.odd.includes('said') ?? false}
          readOnly={!pattern.mayEdit}
          className={field}
          onChange={(said) => bench.edit('line', line.id, { said: copyTotals(said) })}
        />,
      )}
      {cell(
        <span className="wr text-[14px]! leading-[18px]! text-walnut2">written</span>,
        <TotalField
          name={name}
          voice="written"
          totals={written}
          isOdd={count?.odd.includes('written') ?? false}
          readOnly={!pattern.mayEdit}
          className={field}
          onChange={(totals) => bench.setWritten(line.id, copyTotals(totals))}
        />,
      )}
      {cell(
        <span className="small text-walnut2">worked out</span>,
        <span
          className={cx(
            'flex min-h-11 items-center font-bold',
            figure.isOdd ? 'text-madder' : 'text-[21px]',
            figure.text[0] === '?' && 'text-walnut3',
          )}
        >
          {isCounted(line.kind) ? figure.text.join(', ') : <Figures totals={null} />}
        </span>,
      )}
    </div>
  );
}
