import { type Placed } from '../find-row.ts';
import { moveSpan, type Patch } from './patch.ts';

/** A stretch of the text as it lies under the field. */
export interface Stretch {
  readonly text: string;
  readonly mark: 'tack' | 'fault' | null;
  readonly isOpen: boolean;
}

/** Longer texts are underlined in the ledger alone: the same words twice would make typing slow. */
export const UNDERLAY_UP_TO = 40_000;

/** The whole text cut where something is said of it. What has been written over since the count is left plain. */
export function stretchesOf(
  text: string,
  placed: readonly Placed[],
  openId: string | null,
  patch: Patch | null,
): Stretch[] {
  const stretches: Stretch[] = [];
  let at = 0;
  const push = (to: number, mark: Stretch['mark'], isOpen: boolean) => {
    const end = Math.min(to, text.length);
    if (end > at) stretches.push({ text: text.slice(at, end), mark, isOpen });
    at = Math.max(at, end);
  };
  for (const { row, start, end, bodyStart } of placed) {
    const isOpen = row.id === openId;
    const marks = [
      ...row.unread.map((span) => ({ ...span, mark: 'tack' as const })),
      ...(row.atFault ? [{ ...row.atFault, mark: 'fault' as const }] : []),
    ].sort((a, b) => a.start - b.start);
    const whole = moveSpan({ start, end }, patch);
    if (!whole || (marks.length === 0 && !isOpen)) continue;
    const bodyAt = whole.start + (bodyStart - start);
    push(whole.start, null, false);
    for (const mark of marks) {
      push(bodyAt + mark.start, null, isOpen);
      push(bodyAt + mark.end, mark.mark, isOpen);
    }
    push(whole.end, null, isOpen);
  }
  push(text.length, null, false);
  return stretches;
}
