/**
 * Gives each of a list the id its like had before: what is alike at the head and at the end keeps its id, and between
 * them one by one, so that a line which is being typed in stays the same line.
 *
 * @param isSame whether an old and a new one are alike.
 */
export function keepIds<T>(
  before: readonly { readonly id: string; readonly of: T }[],
  now: readonly T[],
  isSame: (a: T, b: T) => boolean,
  newId: () => string,
): string[] {
  let head = 0;
  while (head < before.length && head < now.length && isSame(before[head]!.of, now[head]!)) head += 1;
  let tail = 0;
  while (
    tail < before.length - head &&
    tail < now.length - head &&
    isSame(before[before.length - 1 - tail]!.of, now[now.length - 1 - tail]!)
  )
    tail += 1;
  return now.map((_, i) => {
    if (i < head) return before[i]!.id;
    const fromEnd = now.length - i;
    if (fromEnd <= tail) return before[before.length - fromEnd]!.id;
    // In the middle a line that was there before goes on being it, as long as there is one.
    return i < before.length - tail ? before[i]!.id : newId();
  });
}
