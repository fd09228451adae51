import { type KeyboardEvent, type RefObject, useRef } from 'react';

const WAYS: Readonly<Record<string, number>> = { ArrowUp: 1, ArrowRight: 1, ArrowDown: -1, ArrowLeft: -1 };

/** One stop of the Tab key; arrows go from ring to ring (or row to row), outward and up with Up and Right. */
export function useRingKeys(): { root: RefObject<SVGSVGElement | null>; walk: (event: KeyboardEvent) => void } {
  const root = useRef<SVGSVGElement>(null);
  const walk = (event: KeyboardEvent) => {
    const way = WAYS[event.key];
    if (way === undefined) return;
    event.preventDefault();
    const rings = [...(root.current?.querySelectorAll<SVGGElement>('[role=button]') ?? [])];
    rings[rings.indexOf(document.activeElement as unknown as SVGGElement) + way]?.focus();
  };
  return { root, walk };
}
