import type { Request, Response } from 'express';
import { z } from 'zod';
import type { Deps } from '../platform/deps.ts';
import { AppError } from './problem.ts';
import { signedIn, type Person } from './session.ts';

/** What a write needs to know of its caller, besides what it writes. */
export interface Asking {
  readonly who: Person;
  readonly now: Date;
  /** From the `Deed-Id` header, where several writes are one step. */
  readonly deedId?: string | undefined;
}

const Id = z.uuid();

/**
 * An id from the address. One that is not a uuid names nothing.
 * @throws AppError not-found
 */
export function idIn(req: Request, name: string): string {
  const id = Id.safeParse(req.params[name]);
  if (!id.success) throw new AppError('not-found');
  return id.data;
}

/**
 * Who writes, when, and as part of which deed (`Deed-Id: <uuid>`).
 * @throws AppError signed-out | bad-request
 */
export function askingIn(deps: Pick<Deps, 'clock'>, req: Request): Asking {
  const who = signedIn(req);
  const given = req.get('Deed-Id');
  if (given === undefined) return { who, now: deps.clock.now() };
  const deedId = Id.safeParse(given);
  if (!deedId.success) throw new AppError('bad-request', 'Deed-Id is not a uuid.');
  return { who, now: deps.clock.now(), deedId: deedId.data };
}

/** Names the deed a write was part of, for the caller's own undo. */
export function tellDeed(res: Response, deedId: string): Response {
  return res.set('Deed-Id', deedId);
}
