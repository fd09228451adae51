import type { Knex } from 'knex';
import type { LiveEvent, Seat } from '#contract/live';
import { tell, type Notice, type Notices } from '../../platform/notices.ts';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import type { SavedNotice } from './changes.store.ts';
import { findSeenPattern } from './document.service.ts';

/** Somebody sits down, moves on, or is still there; who comes asks the others to tell their seats too. */
interface SeatNotice extends Notice {
  readonly kind: 'seat';
  readonly seat: Seat;
  readonly asks: boolean;
}
interface LeftNotice extends Notice {
  readonly kind: 'left';
  readonly tabId: string;
}
interface LookNotice extends Notice {
  readonly kind: 'look';
}
type LiveNotice = SavedNotice | SeatNotice | LeftNotice | LookNotice;

/** Streams that one person may hold open in one process; tabs that are hidden close theirs. */
const STREAMS_EACH = 12;
const streams = new Map<string, number>();

const tellSeat = (db: Knex, patternId: string, seat: Seat, asks: boolean) =>
  tell(db, { about: patternId, kind: 'seat', seat, asks } satisfies SeatNotice);

/**
 * Moves a tab's seat to a line.
 * @throws AppError not-found
 */
export async function moveSeat(
  db: Knex,
  who: Person,
  patternId: string,
  { tabId, lineId }: Pick<Seat, 'tabId' | 'lineId'>,
): Promise<void> {
  await findSeenPattern(db, who, patternId);
  await tellSeat(db, patternId, { tabId, lineId, person: { id: who.id, name: who.name } }, false);
}

export interface Bench {
  readonly patternId: string;
  readonly who: Person;
  readonly tabId: string;
}

/**
 * Sits down at a bench: hears what is saved and who else is there, and is told to the others for as long as the
 * stream lasts. Nothing of it is kept anywhere: the stream itself is the seat.
 * @throws AppError rate-limited
 */
export function sitDown(
  { db, notices }: { readonly db: Knex; readonly notices: Notices },
  { patternId, who, tabId }: Bench,
  { send, onEnd }: { readonly send: (event: LiveEvent) => void; readonly onEnd: () => void },
): { readonly tellAgain: () => Promise<void>; readonly leave: () => void } {
  const held = streams.get(who.id) ?? 0;
  if (held >= STREAMS_EACH) throw new AppError('rate-limited', 'Too many benches are open at once. Close one.');
  streams.set(who.id, held + 1);
  let seat: Seat = { tabId, person: { id: who.id, name: who.name }, lineId: null };
  // A notice that could not be told is told again with the next beat.
  const tellMine = (asks: boolean) => tellSeat(db, patternId, seat, asks).catch(() => undefined);

  const stop = notices.hear(
    patternId,
    (heard) => {
      const notice = heard as LiveNotice;
      if (notice.kind === 'look') {
        send({ kind: 'look' });
        void tellMine(true);
      } else if (notice.kind === 'saved') send({ kind: 'saved', change: notice.change });
      else if (notice.kind === 'left') send({ kind: 'left', tabId: notice.tabId });
      else if (notice.seat.tabId === tabId && notice.seat.person.id === who.id) seat = notice.seat;
      else {
        send({ kind: 'seat', seat: notice.seat });
        if (notice.asks) void tellMine(false);
      }
    },
    onEnd,
  );
  return {
    tellAgain: () => tellMine(false),
    leave() {
      stop();
      const left = (streams.get(who.id) ?? 1) - 1;
      if (left > 0) streams.set(who.id, left);
      else streams.delete(who.id);
      void tell(db, { about: patternId, kind: 'left', tabId } satisfies LeftNotice).catch(() => undefined);
    },
  };
}
