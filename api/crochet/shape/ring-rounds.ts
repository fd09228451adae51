import { type RingLine, type RingOptions } from './ring-types.ts';

/** One ring to be drawn: a round of a line, or a bundle of five. */
export interface Round {
  readonly line: RingLine;
  readonly n: number;
  readonly isLast: boolean;
  readonly isFirst: boolean;
  readonly label: string;
}

const BUNDLE_OVER = 40;
const BUNDLE_BELOW_PX = 300;
const BUNDLE = 5;

/** Every round of every line; where there are too many, those away from the open one bundled in fives. */
export function roundsOf(lines: readonly RingLine[], { size, openId }: RingOptions): Round[] {
  const rounds = lines.flatMap((line) =>
    line.counts.map((n, i): Round => {
      const isLast = i === line.counts.length - 1;
      return { line, n: n ?? 0, isLast, isFirst: i === 0, label: isLast ? line.label : '' };
    }),
  );
  if (rounds.length <= BUNDLE_OVER || size >= BUNDLE_BELOW_PX) return rounds;
  const open = rounds.findIndex(({ line }) => line.id === openId);
  const bundled: Round[] = [];
  for (let at = 0; at < rounds.length;) {
    const group = rounds.slice(at, at + BUNDLE);
    const last = group.at(-1);
    const isNear = open >= 0 && at <= open + 2 && at + BUNDLE > open - 2;
    if (isNear || !last || group.length < BUNDLE) bundled.push(...group);
    else bundled.push({ ...last, isFirst: false, isLast: true, label: `${String(at + 1)}–${String(at + BUNDLE)}` });
    at += BUNDLE;
  }
  return bundled;
}
