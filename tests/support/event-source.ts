import { vi } from 'vitest';

export interface Stream {
  readonly status: number;
  /** Every event so far. */
  readonly heard: readonly unknown[];
  readonly ended: boolean;
  /** Waits until an event of the kind has come; gives it. */
  until<T>(is: (event: T) => boolean): Promise<T>;
  close(): void;
}

/** Listens to server-sent events as a browser does. */
export async function listenTo(url: string, headers: Record<string, string>): Promise<Stream> {
  const stop = new AbortController();
  const answer = await fetch(url, { headers, signal: stop.signal });
  const heard: unknown[] = [];
  let ended = false;
  const read = async () => {
    let rest = '';
    const decoder = new TextDecoder();
    for await (const bytes of answer.body ?? []) {
      const parts = (rest + decoder.decode(bytes, { stream: true })).split('\n\n');
      rest = parts.pop() ?? '';
      for (const part of parts) if (part.startsWith('data: ')) heard.push(JSON.parse(part.slice(6)));
    }
  };
  void read()
    .catch(() => undefined)
    .finally(() => (ended = true));
  return {
    status: answer.status,
    heard,
    get ended() {
      return ended;
    },
    until: (is) =>
      vi.waitUntil(() => heard.find((event) => is(event as never)) as never, { timeout: 5_000, interval: 20 }),
    close: () => stop.abort(),
  };
}
