import { act, type ReactNode } from 'react';
import { createRoot } from 'react-dom/client';
import { afterEach } from 'vitest';

(globalThis as { IS_REACT_ACT_ENVIRONMENT?: boolean }).IS_REACT_ACT_ENVIRONMENT = true;
const cleanups: (() => void)[] = [];

/** Draws something into the page; it is taken away after the test. */
export function render(node: ReactNode): { box: HTMLElement; again: (next: ReactNode) => void } {
  const box = document.body.appendChild(document.createElement('div'));
  const root = createRoot(box);
  act(() => root.render(node));
  cleanups.push(() => {
    act(() => root.unmount());
    box.remove();
  });
  return { box, again: (next) => act(() => root.render(next)) };
}

/** The one control with this role and name; names come from `aria-label` or the words inside. */
export function control(box: ParentNode, name: string): HTMLElement {
  const found = [...box.querySelectorAll<HTMLElement>('button, a, input, textarea, select, [role]')].filter(
    (element) => (element.getAttribute('aria-label') ?? element.textContent.trim()) === name,
  );
  if (found.length !== 1) throw new Error(`${found.length} controls are called "${name}"`);
  return found[0]!;
}

export const press = (target: EventTarget, key: string, more: KeyboardEventInit = {}) => {
  const event = new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...more });
  act(() => void target.dispatchEvent(event));
  return event;
};

export const click = (element: HTMLElement) => act(() => element.click());

afterEach(() => {
  for (const cleanup of cleanups.splice(0)) cleanup();
});
