import type { Pending } from './pending.ts';

/** Keeps what is not saved yet on this device, so that a reload or a closed tab loses nothing. */
export interface KeptDrafts {
  load(): Promise<Pending[]>;
  keep(entries: readonly Pending[]): void;
  /** Lets another tab take over what is left here. */
  close(): void;
}

const PREFIX = 'roundelay.bench';

function read(key: string): Pending[] {
  try {
    const kept: unknown = JSON.parse(localStorage.getItem(key) ?? '[]');
    return Array.isArray(kept) ? (kept as Pending[]) : [];
  } catch {
    return [];
  }
}

/** Names of the locks that open tabs hold; without the means to ask, none is taken to be open. */
async function openTabs(): Promise<Set<string>> {
  if (!('locks' in navigator)) return new Set();
  const { held = [] } = await navigator.locks.query();
  return new Set(held.flatMap(({ name }) => (name === undefined ? [] : [name])));
}

/** After a reload everything is tried again; what clashed or was refused will say so anew. */
const again = (entry: Pending): Pending => ({ ...entry, status: 'waiting', problem: null, theirs: null, dueAt: 0 });

/**
 * Drafts of one person in one pattern. Each tab keeps its own; those of tabs that are closed are taken over, once.
 */
export function keepDrafts(patternId: string, personId: string): KeptDrafts {
  const ours = `${PREFIX}.${personId}.${patternId}.`;
  const key = `${ours}${crypto.randomUUID()}`;
  let letGo: () => void = () => undefined;
  const hold = () => {
    if (!('locks' in navigator)) return;
    void navigator.locks.request(key, () => new Promise<void>((resolve) => (letGo = resolve))).catch(() => undefined);
  };
  return {
    async load() {
      hold();
      const open = await openTabs();
      const left = Object.keys(localStorage).filter((name) => name.startsWith(ours) && name !== key && !open.has(name));
      const entries = left.flatMap(read).map(again);
      this.keep(entries);
      for (const name of left) localStorage.removeItem(name);
      return entries;
    },
    keep(entries) {
      try {
        if (entries.length === 0) localStorage.removeItem(key);
        else localStorage.setItem(key, JSON.stringify(entries));
      } catch {
        // The device's store is full: saving goes on, only a reload could lose what is not saved yet.
      }
    },
    close: () => letGo(),
  };
}
