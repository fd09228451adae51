import { Link } from 'react-router-dom';
import type { ShelfPart, ShelfPattern } from '#contract/shelf';
import { cx } from '../../lib/class-names.ts';
import { paths } from '../../lib/paths.ts';
import { formatTouched } from '../../lib/time.ts';
import { PatternPrint } from '../../parts/pattern-print.tsx';
import { PatternState } from '../../parts/pattern-state.tsx';
import { COLUMNS } from './columns.ts';
import { Needs } from './needs.tsx';
import { RowActions, type RowAction } from './row-actions.tsx';
import { formatCount, namePieces } from './shelf-view.ts';

const STATE_WORDS: Readonly<Record<ShelfPattern['state'], string>> = {
  reading: 'reading',
  drafting: 'drafting',
  'in-proof': 'in proof',
  published: 'published',
};

function whereItIs({ state, edition }: ShelfPattern): string {
  if (state === 'published') return edition === null ? 'withdrawn' : `edition ${edition}`;
  if (state === 'reading') return 'its transcript';
  if (state === 'in-proof') return 'proofreading';
  return edition === null ? 'at the bench' : `edition ${edition + 1}`;
}

/** A figure of the ledger; the column's name is read out with it, and on a phone it is seen. */
function Figure({ of, unit }: { of: number | null; unit: string }) {
  return (
    <span
      className={cx(
        'text-right text-[15.5px] whitespace-nowrap max-sm:text-left max-sm:text-[14px] max-sm:text-walnut2',
        of === null && 'max-sm:hidden',
      )}
    >
      {of === null ? '–' : formatCount(of)}
      <span className="sm:sr-only"> {unit}</span>
    </span>
  );
}

function Name({ pattern, isLink }: { pattern: ShelfPattern; isLink: boolean }) {
  const { id, title, state, pieces } = pattern;
  const to = state === 'reading' ? paths.recording(id) : paths.bench(id);
  return (
    <span className="min-w-0 pr-4 max-sm:pr-10">
      <span className="block truncate font-serif text-[17px] leading-[24px] font-semibold max-sm:whitespace-normal">
        {isLink ? (
          <Link to={to} className="after:absolute after:inset-0 hover:underline focus-visible:outline-offset-1">
            {title}
          </Link>
        ) : (
          title
        )}
      </span>
      <span className="small block truncate text-walnut2 max-sm:whitespace-normal">
        {pieces.length > 0 ? namePieces(pieces) : 'no pieces yet'}
      </span>
    </span>
  );
}

/** One pattern in the ledger: its print, its name, where it stands, what it wants, and its figures. */
export function ShelfRow({
  pattern,
  part,
  onAct,
}: {
  pattern: ShelfPattern;
  part: ShelfPart;
  /** Absent where this person may not. */
  onAct?: (action: RowAction) => void;
}) {
  return (
    <li className={`relative min-h-[75px] border-b border-feint py-2 pl-5 hover:bg-hover max-sm:px-3 ${COLUMNS}`}>
      <span className="max-sm:row-span-2 max-sm:self-start">
        <PatternPrint of={pattern.print} />
      </span>
      <Name pattern={pattern} isLink={part !== 'bin'} />
      <span className="max-sm:col-start-2">
        <PatternState state={pattern.state}>
          <span className="block leading-[19px] text-walnut">{STATE_WORDS[pattern.state]}</span>
          <span className="small block text-walnut2 max-sm:sr-only">{whereItIs(pattern)}</span>
        </PatternState>
      </span>
      <div className="relative z-[1] pr-5 leading-[20px] max-sm:col-span-2 max-sm:col-start-1">
        <Needs pattern={pattern} />
      </div>
      <span className="contents max-sm:col-span-2 max-sm:flex max-sm:items-center max-sm:gap-4">
        <Figure of={pattern.lines === 0 ? null : pattern.lines} unit="lines" />
        <Figure of={pattern.stitches} unit="stitches" />
        <time
          dateTime={pattern.touchedAt}
          className="small text-right whitespace-nowrap text-walnut2 max-lg:hidden max-sm:block max-sm:text-left"
        >
          <span className="sr-only">touched </span>
          {formatTouched(pattern.touchedAt)}
        </time>
      </span>
      <span className="z-[1] justify-self-end pr-2 has-[[aria-expanded=true]]:z-20 max-sm:absolute max-sm:top-1 max-sm:right-0">
        {onAct && <RowActions title={pattern.title} part={part} onAct={onAct} />}
      </span>
    </li>
  );
}
