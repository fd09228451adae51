import { type ReactNode } from 'react';
import { cx } from '../lib/class-names.ts';

export type VerdictName = 'agrees' | 'differs' | 'does-not-fit' | 'unread' | 'no-total';

export const VERDICT_WORDS: Record<VerdictName, string> = {
  agrees: 'agrees',
  differs: 'differs',
  'does-not-fit': 'does not fit',
  unread: 'not understood',
  'no-total': 'no total',
};

/** Worst first: the order in which the bench walks and counts them. */
export const VERDICTS: readonly VerdictName[] = ['unread', 'does-not-fit', 'differs', 'agrees', 'no-total'];

const COLOURS: Record<VerdictName, string> = {
  agrees: 'text-moss',
  differs: 'font-bold text-madder',
  'does-not-fit': 'font-bold text-madder',
  unread: 'font-bold text-weld',
  'no-total': 'text-walnut3',
};

const LEVEL_BARS = 'M5.4 6.7h5.2M5.4 9.3h5.2';

/** Five different outlines on a 16 grid, so that they survive grey print. Drawn with the colour of the text around. */
const SHAPES: Record<VerdictName, ReactNode> = {
  agrees: (
    <g fill="none" stroke="currentColor" strokeWidth="1.3">
      <circle cx="8" cy="8" r="6.2" />
      <path d={LEVEL_BARS} />
    </g>
  ),
  differs: (
    <>
      <path d="M8 .8 15.2 8 8 15.2.8 8Z" fill="var(--color-madder)" />
      <path d="M5.2 6.8h5.6M5.2 9.2h5.6M9.6 5 6.4 11" stroke="var(--color-field)" strokeWidth="1.2" />
    </>
  ),
  'does-not-fit': (
    <>
      <path d="M1 3h8v10H1Z" fill="var(--color-madder)" />
      <path d="M3 8h11M11.5 5.4 14.4 8l-2.9 2.6" fill="none" stroke="var(--color-madder)" strokeWidth="1.5" />
      <path d="M3 8h6" stroke="var(--color-field)" strokeWidth="1.4" />
    </>
  ),
  unread: (
    <>
      <rect
        x="1.4"
        y="1.4"
        width="13.2"
        height="13.2"
        fill="var(--color-weldfill)"
        stroke="var(--color-unreadring)"
        strokeWidth="1.2"
      />
      <path d="M3.6 8h3.9M9.1 8h3.4" fill="none" stroke="#2b221b" strokeWidth="1.7" />
    </>
  ),
  'no-total': (
    <g fill="none" stroke="currentColor" strokeWidth="1.3">
      <circle cx="8" cy="8" r="6.2" strokeDasharray="1.6 1.65" />
      <path d="M5.4 8h5.2" />
    </g>
  ),
};

/** The inside of the mark alone, for other drawings (ring map, thread): place it in an `<svg viewBox="0 0 16 16">`. */
export const verdictShape = (verdict: VerdictName): ReactNode => SHAPES[verdict];

/** The mark by itself. It never stands without its word: use `VerdictLabel` unless the word is beside it already. */
export function VerdictMark({ verdict, size = 16 }: { verdict: VerdictName; size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 16 16" aria-hidden>
      {SHAPES[verdict]}
    </svg>
  );
}

/** Mark and word. A line that only follows another's slip says so, quietly, and counts as agreeing. */
export function VerdictLabel({
  verdict,
  follows,
  children,
}: {
  verdict: VerdictName;
  follows?: string | undefined;
  children?: ReactNode;
}) {
  const isQuiet = follows !== undefined && verdict === 'agrees';
  return (
    <span
      className={cx(
        'inline-flex items-center gap-2 align-middle whitespace-nowrap',
        isQuiet ? 'text-walnut3' : COLOURS[verdict],
      )}
    >
      <VerdictMark verdict={verdict} />
      <span>
        {isQuiet ? `follows ${follows}` : VERDICT_WORDS[verdict]}
        {children}
      </span>
    </span>
  );
}
