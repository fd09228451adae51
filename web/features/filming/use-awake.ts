import { useEffect, useState } from 'react';

export type Awake = 'asked' | 'on' | 'off' | 'unknown';

/** What is said of it under the card. */
export const AWAKE_WORDS: Readonly<Record<Awake, string>> = {
  asked: '',
  on: 'The screen stays awake.',
  off: 'The screen may go dark: this device does not let a page keep it awake now.',
  unknown: 'The screen may go dark: this browser cannot keep it awake.',
};

/** Keeps the screen awake while the page is looked at, where the browser can, and tells how that stands. */
export function useAwake(): Awake {
  const isKnown = 'wakeLock' in navigator;
  const [awake, setAwake] = useState<Awake>(isKnown ? 'asked' : 'unknown');
  useEffect(() => {
    if (!isKnown) return;
    let lock: WakeLockSentinel | undefined;
    let isGone = false;
    const ask = async () => {
      if (document.visibilityState !== 'visible') return;
      try {
        const held = await navigator.wakeLock.request('screen');
        if (isGone) await held.release();
        else {
          lock = held;
          setAwake('on');
        }
      } catch {
        // A battery that runs low, or a setting: the card is read all the same.
        if (!isGone) setAwake('off');
      }
    };
    const again = () => void ask();
    void ask();
    document.addEventListener('visibilitychange', again);
    return () => {
      isGone = true;
      document.removeEventListener('visibilitychange', again);
      void lock?.release();
    };
  }, [isKnown]);
  return awake;
}
