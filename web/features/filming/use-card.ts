import { useState } from 'react';
import { z } from 'zod';

/** Sizes of the line in hand, in px; a line too long for its size is set as large as it fits. */
export const SIZES = [36, 48, 64, 84, 108, 136] as const;

const Kept = z.object({
  lineId: z.string().nullable().catch(null),
  size: z
    .int()
    .min(0)
    .max(SIZES.length - 1)
    .catch(4),
});
type Kept = z.infer<typeof Kept>;

const keyOf = (patternId: string) => `roundelay.card.${patternId}`;

function readKept(patternId: string): Kept {
  try {
    return Kept.parse(JSON.parse(localStorage.getItem(keyOf(patternId)) ?? '{}'));
  } catch {
    return Kept.parse({});
  }
}

/** Where the card stands and how large it is, kept in this browser for each pattern. */
export function useKeptCard(patternId: string): [Kept, (change: Partial<Kept>) => void] {
  const [kept, setKept] = useState(() => readKept(patternId));
  const change = (part: Partial<Kept>) => {
    const next = { ...kept, ...part };
    localStorage.setItem(keyOf(patternId), JSON.stringify(next));
    setKept(next);
  };
  return [kept, change];
}
