import type { ByteRange } from '../../platform/storage.ts';

const ONE_RANGE = /^bytes=\s*(\d{0,15})\s*-\s*(\d{0,15})\s*$/i;

/**
 * What of a file is asked for (RFC 9110, 14.2).
 * @param header the `Range` header
 * @param size bytes of the whole file
 * @returns null where the whole file answers: no header, another unit, several ranges or a malformed one, all of
 *   which a server may ignore; `unsatisfiable` where the range lies past the end
 */
export function readRange(header: string | undefined, size: number): ByteRange | 'unsatisfiable' | null {
  const match = header === undefined ? null : ONE_RANGE.exec(header.trim());
  if (!match) return null;
  const [, first = '', last = ''] = match;
  if (first === '' && last === '') return null;
  if (first === '') {
    const length = Math.min(Number(last), size);
    return length === 0 ? 'unsatisfiable' : { start: size - length, end: size - 1 };
  }
  const start = Number(first);
  if (last !== '' && Number(last) < start) return null;
  if (start >= size) return 'unsatisfiable';
  return { start, end: last === '' ? size - 1 : Math.min(Number(last), size - 1) };
}
