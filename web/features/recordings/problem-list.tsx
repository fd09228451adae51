import type { TranscriptProblem } from '#contract/recordings';
import { cx } from '../../lib/class-names.ts';
import { kindOf, type ProblemKind } from './problem-view.ts';

const MARKS: Readonly<Record<ProblemKind, { word: string; shape: React.ReactNode }>> = {
  mended: {
    word: 'mended',
    shape: (
      <>
        <rect
          x=".7"
          y=".7"
          width="13.6"
          height="13.6"
          fill="var(--color-weldfill)"
          stroke="var(--color-unreadring)"
          strokeWidth="1.2"
        />
        <path d="M3.4 10.6 10.6 3.4M3.4 6.4l3-3M8.6 11.6l3-3" stroke="#2b221b" strokeWidth="1.3" fill="none" />
      </>
    ),
  },
  'left-out': {
    word: 'left out',
    shape: (
      <>
        <rect x=".7" y=".7" width="13.6" height="13.6" fill="none" stroke="var(--color-unreadring)" strokeWidth="1.2" />
        <path d="M4.2 4.2l6.6 6.6M10.8 4.2l-6.6 6.6" stroke="var(--color-weld)" strokeWidth="1.4" />
      </>
    ),
  },
  left: {
    word: 'left as it is',
    shape: (
      <>
        <rect x=".7" y=".7" width="13.6" height="13.6" fill="none" stroke="var(--color-edge)" strokeWidth="1.2" />
        <path d="M3.6 7.5h7.8" stroke="var(--color-walnut2)" strokeWidth="1.4" />
      </>
    ),
  },
};

interface ProblemListProps {
  problems: readonly TranscriptProblem[];
  chosen: number;
  onChoose: (index: number) => void;
}

/** What was odd about a transcript, line by line, with what was done. The chosen one shows its lines in the file. */
export function ProblemList({ problems, chosen, onChoose }: ProblemListProps) {
  return (
    <ul aria-label="What was found in the file">
      {problems.map(({ line, what, done }, index) => {
        const mark = MARKS[kindOf({ line, what, done })];
        const isChosen = index === chosen;
        return (
          <li key={index}>
            <button
              type="button"
              aria-pressed={isChosen}
              onClick={() => onChoose(index)}
              className={cx(
                'relative grid min-h-[58px] w-full grid-cols-[33px_88px_minmax(0,1fr)] border-b border-feint px-6 py-2 text-left max-sm:grid-cols-[28px_minmax(0,1fr)] max-sm:px-4',
                isChosen
                  ? 'bg-weldwash before:absolute before:inset-y-0 before:left-0 before:w-1 before:bg-unreadring'
                  : 'hover:bg-hover',
              )}
            >
              <svg width="15" height="15" viewBox="0 0 15 15" className="mt-[3px]" role="img" aria-label={mark.word}>
                {mark.shape}
              </svg>
              <span className="max-sm:col-start-2">
                <b>{line === 0 ? 'The file' : `line ${line}`}</b>
                <br className="max-sm:hidden" />
                <span className="small text-walnut2 max-sm:ml-2">{mark.word}</span>
              </span>
              <span className="max-sm:col-start-2">
                <b>{what}</b>
                <br />
                <span className="text-walnut2">{done}</span>
              </span>
            </button>
          </li>
        );
      })}
    </ul>
  );
}
