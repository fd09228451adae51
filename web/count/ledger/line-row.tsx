import { memo } from 'react';
import { cx } from '../../lib/class-names.ts';
import { MarkedText } from '../../parts/marked-text.tsx';
import { type Row } from '../worker/protocol.ts';
import { GRID, VerdictCell, WorkedCell, WrittenCell } from './row-cells.tsx';
import { spokenRow } from './spoken-row.ts';

/** A line at rest: pressed, it is taken in hand and shown in the text. */
export const LineRow = memo(function LineRow({
  row,
  isStop,
  onPick,
}: {
  row: Row;
  /** The one stop of the Tab key while no line is open. */
  isStop: boolean;
  onPick: (lineId: string) => void;
}) {
  const isFault = row.verdict === 'differs' || row.verdict === 'does-not-fit';
  const isQuiet = row.kind === 'note' || row.kind === 'step';
  return (
    <button
      type="button"
      data-line={row.id}
      tabIndex={isStop ? 0 : -1}
      aria-label={spokenRow(row)}
      aria-expanded={false}
      onClick={() => onPick(row.id)}
      className={cx(
        GRID,
        'relative w-full border-b border-feint text-left focus-visible:z-10 focus-visible:outline-offset-[-2px]',
        isQuiet && 'count-quiet',
        isFault ? 'bg-madderwash' : 'hover:bg-hover',
      )}
    >
      <span className="count-name truncate font-bold">{row.name}</span>
      <span className={cx('count-words wr', isQuiet && 'text-walnut2')}>
        <MarkedText text={row.text} count={row} />
      </span>
      <WrittenCell row={row} />
      <WorkedCell row={row} />
      <VerdictCell row={row} />
    </button>
  );
});
