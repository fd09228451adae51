import { useState } from 'react';
import { useMedia } from '../../lib/use-media.ts';

/** The same choice as on the pages that viewers see; without one the system's is followed. */
const HELD = 'roundelay.light';

/** Whether the card stands in the dark, and the way to the other light. */
export function useLight(): [isDark: boolean, turn: () => void] {
  const isSystemDark = useMedia('(prefers-color-scheme: dark)');
  const [held, setHeld] = useState(() => localStorage.getItem(HELD));
  const isDark = held === null ? isSystemDark : held === 'dark';
  const turn = () => {
    const next = isDark ? 'light' : 'dark';
    localStorage.setItem(HELD, next);
    setHeld(next);
  };
  return [isDark, turn];
}
