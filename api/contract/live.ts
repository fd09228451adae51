import { z } from 'zod';

/** What a bench is told while it is open: others' saves, and who else is there. */

/** Where somebody sits: one seat for each tab they have open. */
export const Seat = z.object({
  tabId: z.uuid(),
  person: z.object({ id: z.uuid(), name: z.string() }),
  /** The line in hand; null between lines. */
  lineId: z.uuid().nullable(),
});
export type Seat = z.infer<typeof Seat>;

export const LiveEvent = z.discriminatedUnion('kind', [
  /** Something was saved; `change` as in `lastChange` of the bench document. */
  z.object({ kind: z.literal('saved'), change: z.int() }),
  /** Notices may have been missed: look for yourself. */
  z.object({ kind: z.literal('look') }),
  z.object({ kind: z.literal('seat'), seat: Seat }),
  z.object({ kind: z.literal('left'), tabId: z.uuid() }),
]);
export type LiveEvent = z.infer<typeof LiveEvent>;

export const LiveQuery = z.strictObject({ tab: z.uuid() });

export const SeatEdit = z.strictObject({ lineId: z.uuid().nullable() });

/** A seat is told anew this often; one not heard of for twice as long is empty. */
export const SEAT_TOLD_EVERY_MS = 15_000;
