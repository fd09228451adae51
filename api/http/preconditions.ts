import type { Request, Response } from 'express';
import { AppError } from './problem.ts';

/**
 * The version the caller read, from `If-Match: "<version>"`.
 * @throws AppError version-required when the header is missing | bad-request when it is not one version
 */
export function ifMatchVersion(req: Request): number {
  const header = req.get('If-Match');
  if (header === undefined) throw new AppError('version-required');
  const version = /^"(\d{1,9})"$/.exec(header.trim())?.[1];
  if (version === undefined) throw new AppError('bad-request', 'If-Match is not a version in quotes.');
  return Number(version);
}

/** Answers with a row and its version as ETag, which the next write sends back. */
export function sendVersioned(res: Response, body: unknown, version: number): void {
  res.set('ETag', `"${version}"`).json(body);
}
