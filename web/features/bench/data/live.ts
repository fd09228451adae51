import { z } from 'zod';
import { LiveEvent, SEAT_TOLD_EVERY_MS, type Seat } from '#contract/live';
import { send } from '../../../lib/http.ts';

/** What a bench does with what it hears. */
export interface LiveEars {
  /** Others' work may be there to be read; null where nobody can say how much. */
  readonly onSaved: (change: number | null) => void;
  /** Who else is at this pattern, one seat for each of their tabs. */
  readonly onSeats: (seats: readonly Seat[]) => void;
  readonly now: () => number;
}

const Nothing = z.undefined();

/**
 * The one stream that this tab holds open, for as long as it is looked at: browsers allow six connections to a host,
 * so a hidden tab gives its own back.
 */
export class Live {
  readonly #url: string;
  readonly #seatUrl: string;
  readonly #ears: LiveEars;
  readonly #seats = new Map<string, { readonly seat: Seat; readonly heardAt: number }>();
  #stream: EventSource | null = null;
  #sweep: ReturnType<typeof setInterval> | undefined;
  #lineId: string | null = null;

  constructor(patternId: string, tabId: string, ears: LiveEars) {
    this.#url = `/api/patterns/${patternId}/events?tab=${tabId}`;
    this.#seatUrl = `/api/patterns/${patternId}/seats/${tabId}`;
    this.#ears = ears;
  }

  /** Whether others' saves are heard of just now. */
  isHeard = (): boolean => this.#stream?.readyState === EventSource.OPEN;

  listen = (): void => {
    if (this.#stream) return;
    const stream = new EventSource(this.#url);
    this.#stream = stream;
    stream.addEventListener('open', () => this.#tellSeat());
    stream.addEventListener('message', ({ data }: MessageEvent<string>) => this.#hear(data));
    // The browser comes back by itself; one that was sent away (signed out, removed) does not, and others are not seen.
    stream.addEventListener('error', () => {
      if (stream.readyState === EventSource.CLOSED) this.rest();
    });
    this.#sweep = setInterval(this.#sweepSeats, SEAT_TOLD_EVERY_MS);
  };

  rest = (): void => {
    this.#stream?.close();
    this.#stream = null;
    clearInterval(this.#sweep);
    if (this.#seats.size === 0) return;
    this.#seats.clear();
    this.#tellOfSeats();
  };

  /** Tells the others which line is in hand. */
  sit = (lineId: string | null): void => {
    if (lineId === this.#lineId) return;
    this.#lineId = lineId;
    if (this.isHeard()) this.#tellSeat();
  };

  /** It is a courtesy: where it cannot be sent, the next move tells it. */
  #tellSeat(): void {
    void send(Nothing, this.#seatUrl, { method: 'PUT', body: { lineId: this.#lineId } }).catch(() => undefined);
  }

  #hear(data: string): void {
    const read = LiveEvent.safeParse(JSON.parse(data));
    if (!read.success) return;
    const event = read.data;
    if (event.kind === 'saved') this.#ears.onSaved(event.change);
    else if (event.kind === 'look') this.#ears.onSaved(null);
    else {
      if (event.kind === 'seat') this.#seats.set(event.seat.tabId, { seat: event.seat, heardAt: this.#ears.now() });
      else if (!this.#seats.delete(event.tabId)) return;
      this.#tellOfSeats();
    }
  }

  #sweepSeats = (): void => {
    const since = this.#ears.now() - 2 * SEAT_TOLD_EVERY_MS;
    const empty = [...this.#seats].filter(([, { heardAt }]) => heardAt < since);
    for (const [tabId] of empty) this.#seats.delete(tabId);
    if (empty.length > 0) this.#tellOfSeats();
  };

  #tellOfSeats(): void {
    this.#ears.onSeats([...this.#seats.values()].map(({ seat }) => seat));
  }
}
