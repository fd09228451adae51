import { useLayoutEffect, useRef, type RefObject } from 'react';

/** Nothing on the card is set smaller than this, in px; what is longer still can be scrolled. */
const SMALLEST = 22;
const STEP = 0.92;

/**
 * Sets the words in a box as large as wanted, or as large as the box holds. The box must have a height of its own.
 * @param wanted px; `words` is what it is measured anew for
 */
export function useFit(wanted: number, words: string): RefObject<HTMLDivElement | null> {
  const box = useRef<HTMLDivElement>(null);
  useLayoutEffect(() => {
    const element = box.current;
    if (!element) return;
    const fit = () => {
      let size = wanted;
      const isOver = () =>
        element.scrollHeight > element.clientHeight + 1 || element.scrollWidth > element.clientWidth + 1;
      element.style.fontSize = `${size}px`;
      while (size > SMALLEST && isOver()) {
        size = Math.max(SMALLEST, Math.floor(size * STEP));
        element.style.fontSize = `${size}px`;
      }
    };
    fit();
    const observer = new ResizeObserver(fit);
    observer.observe(element);
    return () => observer.disconnect();
  }, [wanted, words]);
  return box;
}
