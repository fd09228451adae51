import { type RefObject, useEffect } from 'react';
import { useStable } from '../../../lib/use-stable.ts';
import { useDesk } from '../desk/use-desk.ts';
import { chosenIn } from './choose-words.ts';

/** While a selection is being drawn it changes with every word; it counts once the hand rests. */
const RESTS_MS = 250;

/** Takes what somebody selects in the transcript, by mouse, finger or keyboard, for the chosen words. */
export function useChosenWords(list: RefObject<HTMLElement | null>): void {
  const { captions, chooseWords, pattern } = useDesk();
  const look = useStable(() => {
    const words = chosenIn(captions, list.current, document.getSelection());
    if (words) chooseWords(words);
  });
  useEffect(() => {
    if (!pattern.mayEdit) return;
    let timer: ReturnType<typeof setTimeout> | undefined;
    const wait = () => {
      clearTimeout(timer);
      timer = setTimeout(look, RESTS_MS);
    };
    document.addEventListener('selectionchange', wait);
    return () => {
      clearTimeout(timer);
      document.removeEventListener('selectionchange', wait);
    };
  }, [look, pattern.mayEdit]);
}
