import type { ShelfPattern } from '#contract/shelf';

export type StateFilter = 'all' | ShelfPattern['state'];
export const STATES = ['reading', 'drafting', 'in-proof', 'published'] as const;

const plain = (text: string) => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();

/** Finds in titles, codes and names of pieces, whatever the case or the accents. */
export function findPatterns(patterns: readonly ShelfPattern[], words: string): readonly ShelfPattern[] {
  const wanted = plain(words).split(/\s+/).filter(Boolean);
  return patterns.filter(({ title, code, pieces }) => {
    const text = plain([title, code, ...pieces.map(({ name }) => name)].join(' '));
    return wanted.every((word) => text.includes(word));
  });
}

export const inState = (patterns: readonly ShelfPattern[], state: StateFilter): readonly ShelfPattern[] =>
  state === 'all' ? patterns : patterns.filter((pattern) => pattern.state === state);

const GROUPS = [
  ['waiting', 'Waiting for you'],
  ['in-hand', 'In hand'],
  ['at-rest', 'At rest'],
] as const;

/** The groups that have something in them, what waits first. */
export const groupPatterns = (patterns: readonly ShelfPattern[]) =>
  GROUPS.map(([group, name]) => ({ group, name, patterns: patterns.filter((one) => one.group === group) })).filter(
    (one) => one.patterns.length > 0,
  );

/** "Body, ear (make 2), tail". */
export function namePieces(pieces: ShelfPattern['pieces']): string {
  const names = pieces.map(({ name, make }, i) => {
    const said = i === 0 ? name : name.charAt(0).toLowerCase() + name.slice(1);
    return make > 1 ? `${said} (make ${make})` : said;
  });
  return names.join(', ');
}

/** The trade's way with thousands: 1 286. */
export const formatCount = (n: number): string => String(n).replace(/\B(?=(\d{3})+$)/g, ' ');

/** Findings of one kind together: "does not fit, R14 and R15". Of many lines the first three are named. */
export function groupNeeds(needs: ShelfPattern['needs']) {
  const verdicts = [...new Set(needs.map(({ verdict }) => verdict))];
  return verdicts.map((verdict) => {
    const lines = needs.filter((need) => need.verdict === verdict);
    const named = lines.slice(0, 3).map(({ label }) => label || 'a step');
    const rest = lines.length - named.length;
    return {
      verdict,
      lineId: lines[0]!.lineId,
      words: rest > 0 ? `${named.join(', ')} and ${rest} more` : named.join(', '),
    };
  });
}
