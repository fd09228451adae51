import { memo } from 'react';
import { type LineCount } from '#crochet';
import { type Line } from '#contract/rows';
import { cx } from '../../../lib/class-names.ts';
import { formatMoment } from '../../../lib/time.ts';
import { lineName } from '../desk/line-name.ts';
import { LINE_GRID, SaidCell, VerdictCell, WorkedCell, WrittenCell } from './line-cells.tsx';
import { spokenLine } from './line-figures.ts';
import { MarkedText } from '../../../parts/marked-text.tsx';

export interface LineRowProps {
  line: Line;
  count: LineCount | undefined;
  /** Name of the line whose slip this one only follows. */
  follows: string | undefined;
  atMs: number | null;
  isInHand: boolean;
  isPlaying: boolean;
  onPick: (lineId: string) => void;
}

const isFault = (count: LineCount | undefined) => count?.verdict === 'differs' || count?.verdict === 'does-not-fit';

/** A line at rest: pressed, it opens and the clip goes to its moment. */
export const LineRow = memo(function LineRow({
  line,
  count,
  follows,
  atMs,
  isInHand,
  isPlaying,
  onPick,
}: LineRowProps) {
  return (
    <button
      type="button"
      data-line={line.id}
      aria-label={spokenLine(line, count, follows)}
      aria-expanded={false}
      onClick={() => onPick(line.id)}
      className={cx(
        LINE_GRID,
        'relative min-h-[31px] w-full items-center border-b text-left focus-visible:z-10 focus-visible:outline-offset-[-2px]',
        isInHand || isPlaying
          ? 'border-woadwash bg-woadwash'
          : isFault(count)
            ? 'border-feint bg-madderwash'
            : 'border-feint hover:bg-hover',
        isInHand && 'bar',
      )}
    >
      <span className={cx('small overflow-hidden', isPlaying ? 'font-bold text-woad' : 'text-walnut3')}>
        {atMs === null ? '' : formatMoment(atMs)}
      </span>
      <span className="truncate font-bold">{lineName(line)}</span>
      <span className={cx('wr truncate pr-2', line.kind === 'note' && 'text-walnut2')}>
        {line.text ? (
          <MarkedText text={line.text} count={count} />
        ) : (
          <span className="text-walnut3">nothing written yet</span>
        )}
      </span>
      <SaidCell line={line} count={count} />
      <WrittenCell line={line} count={count} />
      <WorkedCell line={line} count={count} />
      <VerdictCell line={line} count={count} follows={follows} />
    </button>
  );
});
