import type { Conflict, ConflictField, Fields, Resolution } from './bench-types.ts';
import type { Pending } from './pending.ts';

/** Fields that are nobody's words: the server's own, and places, where the last move stands. */
const NOT_WORDS = new Set(['id', 'version', 'orderKey', 'shortId', 'after', 'touchedAt', 'patternId']);

function spread(fields: Fields): Fields {
  const { details, ...rest } = fields;
  if (typeof details !== 'object' || details === null) return fields;
  const parts = Object.entries(details).map(([key, value]) => [`details.${key}`, value] as const);
  return { ...rest, ...Object.fromEntries(parts) };
}

/** Puts `details.care` and its like back where they belong. */
export function gather(fields: Fields): Fields {
  const details = Object.entries(fields).filter(([field]) => field.startsWith('details.'));
  if (details.length === 0) return fields;
  const rest = Object.entries(fields).filter(([field]) => !field.startsWith('details.'));
  const parts = details.map(([field, value]) => [field.slice('details.'.length), value] as const);
  return { ...Object.fromEntries(rest), details: Object.fromEntries(parts) };
}

const plain = (value: unknown): string =>
  JSON.stringify(value ?? null, (_key, inner: unknown) =>
    typeof inner === 'object' && inner !== null && !Array.isArray(inner)
      ? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)))
      : inner,
  );
export const isSame = (a: unknown, b: unknown): boolean => plain(a) === plain(b);

/** Every field that either changed, from what both began with. Of a pattern's details each part is a field. */
export function compareFields(base: Fields, mine: Fields, theirs: Fields, partsOfDetails: boolean): ConflictField[] {
  const [was, my, their] = partsOfDetails ? [spread(base), spread(mine), spread(theirs)] : [base, mine, theirs];
  const names = new Set([...Object.keys(my), ...Object.keys(was).filter((field) => field in their)]);
  return [...names].flatMap((field): ConflictField[] => {
    if (NOT_WORDS.has(field)) return [];
    const before = was[field] ?? null;
    const mineNow = field in my ? my[field] : before;
    const theirsNow = field in their ? their[field] : before;
    const [iChanged, theyChanged] = [!isSame(mineNow, before), !isSame(theirsNow, before)];
    if (!iChanged && !theyChanged) return [];
    const clashes = iChanged && theyChanged && !isSame(mineNow, theirsNow);
    return [{ field, base: before, mine: mineNow, theirs: theirsNow, clashes }];
  });
}

/** A clash as the page shows it. */
export function toConflict(entry: Pending): Conflict {
  const base = entry.base ?? {};
  const theirs = entry.theirs?.row ?? null;
  return {
    id: entry.key,
    kind: entry.kind,
    rowId: entry.id,
    base,
    mine: { ...base, ...entry.fields },
    theirs,
    fields: compareFields(base, entry.fields, theirs ?? base, entry.kind === 'pattern'),
    savedBy: entry.theirs?.by ?? null,
    savedAt: entry.theirs?.at ? new Date(entry.theirs.at) : null,
  };
}

/** What is to be saved once somebody has decided; empty where theirs stands as it is. */
export function settledFields(entry: Pending, how: Resolution): Fields {
  if (how === 'mine') return entry.fields;
  if (how !== 'theirs') return how;
  const clashing = new Set(toConflict(entry).fields.flatMap(({ field, clashes }) => (clashes ? [field] : [])));
  const mine = entry.kind === 'pattern' ? spread(entry.fields) : entry.fields;
  return gather(Object.fromEntries(Object.entries(mine).filter(([field]) => !clashing.has(field))));
}
