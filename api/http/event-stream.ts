import type { Response } from 'express';

/** A line without meaning is sent this often, so that nothing on the way takes the connection for dead. */
const BEAT_MS = 15_000;
/** A reader this far behind is let go; it comes back and looks for itself. */
const BEHIND_BYTES = 256 * 1024;
/** How soon a browser comes back after the stream ended. */
const BACK_AFTER_MS = 2_000;

export interface EventStream {
  /** Sends one event as JSON; after the end nothing happens. */
  send(event: object): void;
  end(): void;
}

/**
 * Answers with a stream of server-sent events (HTML Living Standard, 9.2) that stays open.
 * @param onBeat asked before each beat; false ends the stream
 * @param onEnd called once, however it ended
 */
export function openEventStream(
  res: Response,
  { onBeat, onEnd }: { readonly onBeat: () => Promise<boolean>; readonly onEnd: () => void },
): EventStream {
  let isOpen = true;
  res.status(200).set({ 'Content-Type': 'text/event-stream; charset=utf-8', 'X-Accel-Buffering': 'no' });
  res.write(`retry: ${BACK_AFTER_MS}\n\n`);

  const end = () => {
    if (!isOpen) return;
    isOpen = false;
    clearInterval(beat);
    res.end();
    onEnd();
  };
  const beat = setInterval(() => {
    onBeat().then(
      (goesOn) => {
        if (!goesOn) end();
        else if (isOpen) res.write(':\n\n');
      },
      // The right to it cannot be told just now: better gone than shown to somebody who may not.
      end,
    );
  }, BEAT_MS);
  res.on('close', end);

  return {
    send(event) {
      if (!isOpen) return;
      if (res.writableLength > BEHIND_BYTES) end();
      else res.write(`data: ${JSON.stringify(event)}\n\n`);
    },
    end,
  };
}
