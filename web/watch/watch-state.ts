import type { PublicEdition } from '#contract/editions';
import { stepAt, stepsOf, type Step } from './steps.ts';

/** Where a maker is in an edition, and how they look at it. Plain values: what is kept in the browser is this. */
export interface WatchState {
  /** Key of the step being worked. */
  readonly at: string;
  readonly done: ReadonlySet<string>;
  readonly terms: 'US' | 'UK';
  readonly mirrored: boolean;
}

export type WatchDeed =
  | { readonly kind: 'go'; readonly key: string }
  | { readonly kind: 'before' | 'next' }
  /** Ticks off the step being worked and goes on to the next one that is not done. */
  | { readonly kind: 'tick' }
  /** Ticks steps, or takes their ticks off, without moving. */
  | { readonly kind: 'mark'; readonly keys: readonly string[]; readonly done: boolean }
  | { readonly kind: 'terms'; readonly terms: 'US' | 'UK' }
  | { readonly kind: 'mirror' };

/** The step with this key, else the first; undefined for an edition without lines. */
export const currentStep = (steps: readonly Step[], state: WatchState): Step | undefined =>
  steps.find(({ key }) => key === state.at) ?? steps[0];

/** The state after a deed. Moving past either end stays at the end. */
export function moveOn(steps: readonly Step[], state: WatchState, deed: WatchDeed): WatchState {
  const index = Math.max(
    0,
    steps.findIndex(({ key }) => key === state.at),
  );
  const to = (i: number): WatchState => ({
    ...state,
    at: steps[Math.min(Math.max(i, 0), steps.length - 1)]?.key ?? '',
  });
  switch (deed.kind) {
    case 'go':
      return { ...state, at: deed.key };
    case 'before':
      return to(index - 1);
    case 'next':
      return to(index + 1);
    case 'tick': {
      const done = new Set(state.done).add(state.at);
      const next = steps.findIndex(({ key }, i) => i > index && !done.has(key));
      return { ...to(next < 0 ? index : next), done };
    }
    case 'mark': {
      const done = new Set(state.done);
      for (const key of deed.keys) {
        if (deed.done) done.add(key);
        else done.delete(key);
      }
      return { ...state, done };
    }
    case 'terms':
      return { ...state, terms: deed.terms };
    case 'mirror':
      return { ...state, mirrored: !state.mirrored };
  }
}

const nameOf = ({ code, edition }: PublicEdition) => `roundelay.watch.${code}.${edition ?? 'draft'}`;

/** What was kept for this edition in this browser; fresh where nothing was, or where it cannot be read. */
export function readKept(edition: PublicEdition, store: Pick<Storage, 'getItem'>): WatchState {
  const steps = stepsOf(edition);
  const fresh: WatchState = { at: steps[0]?.key ?? '', done: new Set(), terms: edition.terms, mirrored: false };
  try {
    const kept = JSON.parse(store.getItem(nameOf(edition)) ?? 'null') as Record<string, unknown> | null;
    if (!kept) return fresh;
    const known = new Set(steps.map(({ key }) => key));
    const done = Array.isArray(kept.done) ? kept.done.filter((key): key is string => known.has(key as string)) : [];
    return {
      at: typeof kept.at === 'string' && known.has(kept.at) ? kept.at : fresh.at,
      done: new Set(done),
      terms: kept.terms === 'US' || kept.terms === 'UK' ? kept.terms : fresh.terms,
      mirrored: kept.mirrored === true,
    };
  } catch {
    return fresh;
  }
}

/** Keeps the place in this browser. A browser that keeps nothing is no fault: the page works until it is closed. */
export function keep(edition: PublicEdition, state: WatchState, store: Pick<Storage, 'setItem'>): void {
  const { at, done, terms, mirrored } = state;
  try {
    store.setItem(nameOf(edition), JSON.stringify({ at, done: [...done], terms, mirrored }));
  } catch {
    // Full, or switched off.
  }
}

/** Where the page opens: at the line its address names, else where the maker was. */
export function openAt(edition: PublicEdition, kept: WatchState, hash: string): WatchState {
  const named = hash === '' ? undefined : stepAt(stepsOf(edition), hash);
  return named ? { ...kept, at: named.key } : kept;
}
