import { useState } from 'react';
import { useKeys } from '../../lib/use-keys.ts';
import { useStable } from '../../lib/use-stable.ts';
import { type Decision, decide, nextQuestion } from './decide.ts';
import { DECISIONS } from './role-words.ts';
import type { Entry } from './told-apart.ts';
import type { Reading } from './use-reading.ts';

export interface Told {
  readonly entries: readonly Entry[];
  /** How many questions are open. */
  readonly open: number;
  readonly inHand: string | null;
  readonly pick: (id: string | null) => void;
  readonly decide: (id: string, decision: Decision) => void;
  readonly goOn: () => void;
  /** Takes every cut that is still in doubt as it is. */
  readonly keepRest: () => void;
}

interface Decided {
  readonly of: Reading | null;
  readonly by: ReadonlyMap<string, Entry>;
}

/** The text told apart, with what the person has decided; a newly read text begins anew. */
export function useTold(reading: Reading | null): Told {
  const [decided, setDecided] = useState<Decided>({ of: null, by: new Map() });
  const [inHand, setInHand] = useState<string | null>(null);
  const by = decided.of === reading ? decided.by : new Map<string, Entry>();
  const entries = reading?.entries.map((entry) => by.get(entry.id) ?? entry) ?? [];
  const set = (changed: readonly Entry[]) =>
    setDecided({ of: reading, by: new Map([...by, ...changed.map((entry) => [entry.id, entry] as const)]) });
  const decideOne = useStable((id: string, decision: Decision) => {
    const entry = entries.find((one) => one.id === id);
    if (!entry || (decision === 'joined' && entries[0]?.id === id)) return;
    const next = decide(entry, decision);
    set([next]);
    const after = entries.map((one) => (one.id === id ? next : one));
    setInHand(nextQuestion(after, id)?.id ?? id);
  });
  const goOn = () => setInHand(nextQuestion(entries, inHand)?.id ?? inHand);
  const pick = useStable((id: string | null) => setInHand(id));
  useKeys({
    N: goOn,
    Escape: () => setInHand(null),
    ...Object.fromEntries(
      DECISIONS.map(({ key, decision }) => [key, () => inHand !== null && decideOne(inHand, decision)]),
    ),
  });
  return {
    entries,
    open: entries.filter(({ question }) => question !== null).length,
    inHand,
    pick,
    decide: decideOne,
    goOn,
    keepRest: () => set(entries.filter(({ question }) => question !== null).map((entry) => decide(entry, 'kept'))),
  };
}
