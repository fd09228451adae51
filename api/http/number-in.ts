import type { Request } from 'express';
import { AppError } from './problem.ts';

/**
 * A whole number from 1 in the address. Anything else names nothing.
 * @throws AppError not-found
 */
export function numberIn(req: Request, name = 'number'): number {
  const given = req.params[name];
  if (typeof given !== 'string' || !/^[1-9]\d{0,5}$/.test(given)) throw new AppError('not-found');
  return Number(given);
}
