import { type ReactNode } from 'react';
import { cx } from '../lib/class-names.ts';

/** Totals by kind, one figure a size, as the contract has them. */
export type TotalsByKind = Readonly<Record<string, readonly number[]>>;

/**
 * Totals as they stand in a column, one kind a line: `18`, or `12 dc` over `4 ch-2 sp`. Several sizes stand in brackets
 * after the first, as the trade writes them: `48 (54, 60)`.
 */
export function totalLines(totals: TotalsByKind): string[] {
  return Object.entries(totals).map(([kind, [first = 0, ...others]]) => {
    const figures = others.length > 0 ? `${first} (${others.join(', ')})` : String(first);
    return kind === 'sts' ? figures : `${figures} ${kind}`;
  });
}

export type Voice = 'said' | 'written' | 'worked';
const VOICES: Record<Voice, string> = { said: 'said tn text-[16px]!', written: 'wr tn', worked: 'worked' };

/** One cell of the totals triple: its voice by its face, boxed where this is the total that is out of step. */
export function TotalCell({
  voice,
  odd = false,
  className,
  children,
}: {
  voice: Voice;
  odd?: boolean;
  className?: string;
  children: ReactNode;
}) {
  return (
    <span className={cx('block pr-[13px] text-right leading-[21px]!', VOICES[voice], className)}>
      <span className="block">{odd ? <span className="boxed -mr-[7px]">{children}</span> : children}</span>
    </span>
  );
}

/** The figures inside a cell: "–" where nothing was said or written, never "missing". */
export function Figures({ totals, none = '–' }: { totals: TotalsByKind | null; none?: string }) {
  const lines = totals ? totalLines(totals) : [];
  if (lines.length === 0) return <>{none}</>;
  return (
    <>
      {lines.map((line) => (
        <span key={line} className="block">
          {line}
        </span>
      ))}
    </>
  );
}
