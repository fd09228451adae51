import { type Before } from './read-line.ts';
import { type Unit } from './work/units.ts';

/** How many pieces back a speaker may mean. */
const PIECES_BACK = 3;

/** The corner of an earlier line, in the stitch of this one. */
export function cornerBefore(before: Before, stitch: string): Unit | null {
  for (const line of [...before.all.slice(-PIECES_BACK).flat(), ...before.piece].reverse()) {
    const parts = cornerIn(line.units);
    if (parts !== null)
      return { type: 'oneplace', parts: parts.map((part) => (part === 'ch' ? part : stitch)), times: 1 };
  }
  return null;
}

function cornerIn(units: readonly Unit[]): readonly string[] | null {
  for (const unit of units) {
    const parts = unit.type === 'repeat' ? cornerIn(unit.units) : unit.type === 'oneplace' ? unit.parts : null;
    if (parts?.includes('ch') === true) return parts;
  }
  return null;
}

/** What the line before did at its ends, where that is no plain stitch, in the stitch of this one. */
export function edgeBefore(before: Before, stitch: string): Unit | null {
  const first = before.piece.at(-1)?.units[0];
  if (first?.type === 'stitch' && first.inOne > 1) return { ...first, stitch, times: 1 };
  return first?.type === 'together' ? { ...first, stitch, times: 1 } : null;
}
