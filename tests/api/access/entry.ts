import { randomUUID } from 'node:crypto';
import { type Expected, type Who } from './people.ts';
import { type World } from './world.ts';

/** One call: where to, with what; a body that is a file is sent by `send` itself. */
export interface Call {
  readonly url: string;
  readonly body?: object;
  readonly version?: number;
  readonly send?: (headers: Record<string, string>) => Promise<{ status: number }>;
}

export interface Entry {
  readonly expect: Expected;
  /** Makes what the call is about, fresh for each person. */
  readonly ask: (world: World, who: Who) => Promise<Call> | Call;
}

/** An address that nobody has yet. */
export const someone = () => `${randomUUID().slice(0, 8)}@post.example`;
/** A token of the right length that was never given out. */
export const NOWHERE = 'x'.repeat(43);
