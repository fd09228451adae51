import { memo } from 'react';
import { type LineCount } from '#crochet';
import { type Line } from '#contract/rows';
import { cx } from '../../../lib/class-names.ts';
import { VerdictLabel } from '../../../parts/verdict-mark.tsx';
import { isCounted } from '../desk/bench-count.ts';
import { lineName } from '../desk/line-name.ts';
import { workedFigure } from '../../../parts/worked-figure.ts';
import { spokenLine } from '../pattern/line-figures.ts';
import { type LineRowProps } from '../pattern/line-row.tsx';
import { MarkedText } from '../../../parts/marked-text.tsx';

const isFault = (count: LineCount | undefined) => count?.verdict === 'differs' || count?.verdict === 'does-not-fit';

/** A neighbour of the open line: its number, its words, its total, how it came out. */
export const PhoneLine = memo(function PhoneLine({
  line,
  count,
  follows,
  isInHand,
  isPlaying,
  onPick,
}: Omit<LineRowProps, 'atMs'>) {
  const figure = workedFigure(count);
  return (
    <button
      type="button"
      data-line={line.id}
      aria-label={spokenLine(line, count, follows)}
      aria-expanded={false}
      onClick={() => onPick(line.id)}
      className={cx(
        'relative flex min-h-11 w-full items-center gap-3 border-b border-feint px-4 text-left focus-visible:outline-offset-[-2px]',
        isInHand || isPlaying ? 'bg-woadwash' : isFault(count) ? 'bg-madderwash' : 'bg-sheet',
        isInHand && 'bar',
      )}
    >
      <b className="w-10 flex-none whitespace-nowrap">{lineName(line)}</b>
      <Words line={line} count={count} />
      {count && isCounted(line.kind) && (
        <>
          <span className={cx('ml-auto flex-none', figure.isOdd ? 'boxed' : 'worked')}>{figure.text.join(', ')}</span>
          <span className="flex-none">
            <VerdictLabel verdict={count.verdict} follows={follows} />
          </span>
        </>
      )}
    </button>
  );
});

function Words({ line, count }: { line: Line; count: LineCount | undefined }) {
  return (
    <span className="wr min-w-0 truncate">
      {line.text ? <MarkedText text={line.text} count={count} /> : <span className="text-walnut3">nothing yet</span>}
    </span>
  );
}
