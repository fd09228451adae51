import { type ReactNode } from 'react';

export type PatternStateName = 'reading' | 'drafting' | 'in-proof' | 'published';
const WORDS: Record<PatternStateName, string> = {
  reading: 'reading',
  drafting: 'drafting',
  'in-proof': 'in proof',
  published: 'published',
};

const DOTTED = '1.6 1.7';
const ring = (r: number, dash?: string) => (
  <circle
    key={r}
    cx="9"
    cy="9"
    r={r}
    fill="none"
    stroke="currentColor"
    strokeWidth="1.2"
    {...(dash ? { strokeDasharray: dash } : {})}
  />
);
const RINGS: Record<PatternStateName, ReactNode> = {
  reading: ring(7.4, DOTTED),
  drafting: [ring(2.2), ring(7.4, DOTTED)],
  'in-proof': [ring(2.2), ring(4.8), ring(7.6, DOTTED)],
  published: [<circle key="heart" cx="9" cy="9" r="2.4" fill="currentColor" />, ring(5), ring(7.8)],
};

/** Rings are added as a pattern goes its way: reading, drafting, in proof, published. Always with the word. */
export function PatternState({ state, children }: { state: PatternStateName; children?: ReactNode }) {
  return (
    <span className="inline-flex items-center gap-2 whitespace-nowrap text-walnut2">
      <svg width="18" height="18" viewBox="0 0 18 18" aria-hidden>
        {RINGS[state]}
      </svg>
      <span>{children ?? WORDS[state]}</span>
    </span>
  );
}
