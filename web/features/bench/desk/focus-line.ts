/**
 * Puts the focus on a line at rest once it is drawn, so that arrows, Enter and a screen reader go on from there. Somebody who
 * is typing elsewhere keeps their place.
 */
export function focusLine(lineId: string | null): void {
  if (lineId === null) return;
  requestAnimationFrame(() =>
    document.querySelector<HTMLElement>(`button[data-line="${lineId}"]`)?.focus({ preventScroll: true }),
  );
}
