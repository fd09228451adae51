import { memo, useEffect, useRef } from 'react';
import { cx } from '../../lib/class-names.ts';
import { Button } from '../../ui/button.tsx';
import type { Decision } from './decide.ts';
import { DECISIONS, roleWords } from './role-words.ts';
import type { Entry } from './told-apart.ts';

const GRID = 'grid grid-cols-[112px_minmax(0,1fr)] items-baseline gap-x-3 px-3.5 py-1 max-sm:grid-cols-1';

const faceOf = ({ role, isJoined }: Entry) =>
  cx(
    'wr break-words',
    role === 'piece' && 'font-semibold',
    role === 'line' && !isJoined ? 'text-walnut' : role !== 'piece' && role !== 'title' && 'text-walnut2',
  );

interface RowProps {
  entry: Entry;
  isInHand: boolean;
  isFirst: boolean;
  onPick: (id: string) => void;
  onDecide: (id: string, decision: Decision) => void;
}

/** One stretch of the text, what it was taken for, and in hand: what else it may be, one key each. */
export const EntryRow = memo(function EntryRow({ entry, isInHand, isFirst, onPick, onDecide }: RowProps) {
  const { id, text, question } = entry;
  const root = useRef<HTMLLIElement>(null);
  useEffect(() => {
    if (isInHand) root.current?.scrollIntoView({ block: 'nearest' });
  }, [isInHand]);
  const words = (
    <>
      <span className={cx('font-bold', entry.isJoined && 'text-walnut2', question !== null && 'text-weld')}>
        {roleWords(entry)}
        {question !== null && '?'}
      </span>
      <span className={faceOf(entry)}>{text}</span>
    </>
  );
  if (!isInHand) {
    return (
      <li ref={root} className="[contain-intrinsic-size:auto_33px] [content-visibility:auto]">
        <button
          type="button"
          onClick={() => onPick(id)}
          className={cx(
            GRID,
            'w-full border-b border-feint text-left hover:bg-hover focus-visible:outline-offset-[-2px]',
            question !== null && 'bg-weldwash hover:bg-weldwash',
          )}
        >
          {words}
        </button>
      </li>
    );
  }
  return (
    <li ref={root} aria-current="true" className="bar border-y-[1.5px] border-woad bg-sheet pb-2">
      <div className={GRID}>{words}</div>
      <p role="status" className={cx('px-3.5 pb-1.5 sm:pl-[137px]', question === null ? 'text-walnut2' : 'text-weld')}>
        {question ?? 'Not in doubt. It can still be changed.'}
      </p>
      <div className="flex flex-wrap gap-2 px-3.5 sm:pl-[137px]">
        {DECISIONS.filter(({ decision }) => !(isFirst && decision === 'joined')).map(
          ({ key, decision, words: name }) => (
            <Button key={key} size="row" keys={[key]} onClick={() => onDecide(id, decision)}>
              {name}
            </Button>
          ),
        )}
      </div>
    </li>
  );
});
