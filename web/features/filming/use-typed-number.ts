import { useEffect, useState } from 'react';

/** Figures typed one after the other within this time are one number. */
const PAUSE_MS = 900;

/** A number typed in figures: shown while it is typed, used when a pause follows. */
export function useTypedNumber(onNumber: (n: number) => void): {
  typed: string;
  type: (figure: string) => void;
  go: () => boolean;
} {
  const [typed, setTyped] = useState('');
  const go = () => {
    if (typed === '') return false;
    setTyped('');
    onNumber(Number(typed));
    return true;
  };
  useEffect(() => {
    if (typed === '') return;
    const timer = setTimeout(go, PAUSE_MS);
    return () => clearTimeout(timer);
  });
  return { typed, type: (figure) => setTyped((before) => (before + figure).slice(-4)), go };
}
