import type { Request } from 'express';
import { z } from 'zod';
import { AppError } from '../../http/problem.ts';
import { signedIn } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import type { Asking } from '../patterns/deed.service.ts';

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
  const deedId = Id.optional().safeParse(req.get('Deed-Id'));
  if (!deedId.success) throw new AppError('bad-request', 'Deed-Id is not a uuid.');
  return { who, now: deps.clock.now(), deedId: deedId.data };
}
