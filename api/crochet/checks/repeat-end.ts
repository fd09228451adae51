import { relativeOf } from '../count/relative.ts';
import { type Check, finding } from './check.ts';
import { isCounted, type Scan, type ScanLine } from './scan.ts';

/** The number of the last round before this line, or null where it is not known. */
const lastBefore = (lines: readonly ScanLine[], i: number): number | null => {
  const before = lines.slice(0, i).findLast(({ line }) => isCounted(line));
  return before ? (before.count.rows?.at(-1)?.to ?? before.line.to) : null;
};

/** Rows told as a repeat that would end on another row of the repeat than the words say. */
export function checkRepeatEnds(scan: Scan): Check[] {
  return scan.pieces.flatMap(({ lines }) =>
    lines.flatMap((one, i): Check[] => {
      const told = one.read && relativeOf(one.read.tree);
      const ending = told?.ending ?? null;
      if (!told || ending === null || told.lines.length === 0) return [];
      const rows = one.count.rows;
      const before = lastBefore(lines, i);
      const until = told.until ?? rows?.at(-1)?.to ?? null;
      if (until === null || before === null || until <= before) return [];
      const source = told.lines[(until - before - 1) % told.lines.length]!;
      if (source === ending) return [];
      return [
        finding('repeat-end', `says it ends with row ${ending}; row ${until} is a row ${source}.`, {
          subject: one.line.id,
          refs: [one.ref],
        }),
      ];
    }),
  );
}
