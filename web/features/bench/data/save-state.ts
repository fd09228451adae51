import { formatClock } from '../../../lib/time.ts';
import type { SaveState } from './bench-types.ts';
import type { Pending } from './pending.ts';

/** Why nothing can be sent at the moment. */
export interface Trouble {
  readonly why: string;
  /** Then nothing is tried until somebody has signed in. */
  readonly isSignedOut: boolean;
  /** How long until it is tried again. */
  readonly waitMs: number;
}

const KEPT = 'Kept on this device.';

/** How saving stands, from what is on the way and what is in the way. */
export function saveState(entries: readonly Pending[], trouble: Trouble | null, at: Date | null): SaveState {
  const refused = entries.find(({ status }) => status === 'refused')?.problem;
  const clashes = entries.some(({ status }) => status === 'clash');
  const reason =
    entries.length === 0
      ? null
      : (trouble?.why ?? refused ?? (clashes ? 'Somebody else changed the same place.' : null));
  const isSignedOut = reason !== null && (trouble?.isSignedOut ?? false);
  if (reason !== null) return { state: 'not-saved', at, reason, isSignedOut, words: `Not saved: ${reason} ${KEPT}` };
  if (entries.length > 0) return { state: 'saving', at, reason, isSignedOut, words: 'Saving' };
  return { state: 'saved', at, reason, isSignedOut, words: at ? `Saved ${formatClock(at)}` : 'Saved' };
}
