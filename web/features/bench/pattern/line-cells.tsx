import { type LineCount } from '#crochet';
import { type Line } from '#contract/rows';
import { Figures, TotalCell } from '../../../parts/totals.tsx';
import { VerdictLabel } from '../../../parts/verdict-mark.tsx';
import { isCounted } from '../desk/bench-count.ts';
import { workedFigure } from '../../../parts/worked-figure.ts';

/** at | round | instruction ‖ said | written | worked out | verdict. Narrow desks drop the first and the verdict's word. */
export const LINE_GRID =
  'grid grid-cols-[50px_60px_minmax(0,1fr)_54px_66px_84px_140px] pl-3.5 @max-[600px]:grid-cols-[0_52px_minmax(0,1fr)_48px_58px_78px_34px]';

export const isRow = (line: Line) => isCounted(line.kind) || line.kind === 'foundation';

export function SaidCell({ line, count }: { line: Line; count: LineCount | undefined }) {
  return (
    <TotalCell
      voice="said"
      odd={count?.odd.includes('said') ?? false}
      className="double-before flex flex-col justify-center self-stretch"
    >
      {isRow(line) && <Figures totals={line.said} />}
    </TotalCell>
  );
}

export function WrittenCell({ line, count }: { line: Line; count: LineCount | undefined }) {
  return (
    <TotalCell voice="written" odd={count?.odd.includes('written') ?? false}>
      {isRow(line) && <Figures totals={count?.written ?? line.written} />}
    </TotalCell>
  );
}

export function WorkedCell({ line, count }: { line: Line; count: LineCount | undefined }) {
  const figure = workedFigure(count);
  if (!isCounted(line.kind)) return <span />;
  return (
    <TotalCell
      voice="worked"
      odd={figure.isOdd}
      className={figure.isOdd ? 'text-[15px]!' : figure.text[0] === '?' ? 'text-walnut2' : ''}
    >
      {figure.text.map((text) => (
        <span key={text} className="block">
          {text}
        </span>
      ))}
    </TotalCell>
  );
}

export function VerdictCell({
  line,
  count,
  follows,
}: {
  line: Line;
  count: LineCount | undefined;
  follows: string | undefined;
}) {
  if (!count || !isCounted(line.kind)) return <span />;
  return (
    <span className="flex items-center pl-3 @max-[600px]:w-[28px] @max-[600px]:overflow-hidden">
      <VerdictLabel verdict={count.verdict} follows={follows} />
    </span>
  );
}
