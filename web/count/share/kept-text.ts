import type { Terms } from '#crochet';
import { type Shared } from './share-link.ts';

/** The text stays in this browser when the page closes. A browser that keeps nothing is no fault. */

const STORED = 'roundelay.count';

export function keep(shared: Shared): void {
  try {
    if (shared.text === '') localStorage.removeItem(STORED);
    else localStorage.setItem(STORED, JSON.stringify(shared));
  } catch {
    // Private windows and full stores: the page works on without.
  }
}

export function kept(): Shared | null {
  try {
    const read: unknown = JSON.parse(localStorage.getItem(STORED) ?? 'null');
    if (typeof read !== 'object' || read === null || !('text' in read) || typeof read.text !== 'string') return null;
    const { terms, base } = read as { terms?: unknown; base?: unknown };
    const isTerms = (one: unknown): one is Terms => one === 'US' || one === 'UK';
    return { text: read.text, terms: isTerms(terms) ? terms : null, base: typeof base === 'number' ? base : null };
  } catch {
    return null;
  }
}
