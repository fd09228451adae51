import { useEffect, useRef, useSyncExternalStore } from 'react';

/** What a key does. Names as on the cap: `M`, `?`, `[`, `Space`, `ArrowUp`, `Enter`, `Ctrl+Enter`, `Shift+ArrowLeft`. */
export type KeyMap = Readonly<Record<string, (event: KeyboardEvent) => void>>;

const STORED = 'roundelay.single-keys';
const listeners = new Set<() => void>();
const readStored = () => localStorage.getItem(STORED) !== 'off';

/** Whether keys without Ctrl act at all: they can be switched off, for those who speak to their computer (WCAG 2.1.4). */
export function useSingleKeys(): [boolean, (on: boolean) => void] {
  const on = useSyncExternalStore((tell) => {
    listeners.add(tell);
    return () => listeners.delete(tell);
  }, readStored);
  const set = (next: boolean) => {
    localStorage.setItem(STORED, next ? 'on' : 'off');
    for (const tell of listeners) tell();
  };
  return [on, set];
}

/** The name of a pressed key as a `KeyMap` spells it. Cmd counts as Ctrl. */
export function nameKey(event: KeyboardEvent): string {
  const base = event.key === ' ' ? 'Space' : event.key.length === 1 ? event.key.toUpperCase() : event.key;
  const isSymbol = event.key.length === 1 && !/[a-z0-9 ]/i.test(event.key);
  const shift = event.shiftKey && !isSymbol ? 'Shift+' : '';
  return `${event.ctrlKey || event.metaKey ? 'Ctrl+' : ''}${event.altKey ? 'Alt+' : ''}${shift}${base}`;
}

const TYPED_IN =
  'input:not([type=checkbox]):not([type=radio]):not([type=range]):not([type=button]), textarea, select, [contenteditable]';
const PRESSED = 'button, a[href], input, summary, [role=button]';
const STEERED = 'input, [role=slider], [role=toolbar] *, [role=menu] *, [role=radiogroup] *';
const WHILE_TYPING = new Set(['Ctrl+Enter', 'Escape']);

/** Whether the focused control needs the key for itself: Space and Enter press it, arrows steer it. */
function isOwnKey(name: string, target: Element): boolean {
  const base = name.replace('Shift+', '');
  if (base === 'Space' || base === 'Enter') return target.matches(PRESSED);
  return (base.startsWith('Arrow') || base.startsWith('Page')) && target.matches(STEERED);
}

function mayAct(name: string, target: Element | null, singleKeys: boolean): boolean {
  if (target?.closest('dialog[open]')) return false;
  if (target?.matches(TYPED_IN)) return WHILE_TYPING.has(name);
  if (target && isOwnKey(name, target)) return false;
  return singleKeys || name.length > 1;
}

/**
 * Listens for keys anywhere on the page. While somebody types only Ctrl+Enter and Esc pass (Enter is the field's own);
 * Space and Enter press the control that has the focus, arrows steer it; nothing acts behind a dialog.
 */
export function useKeys(map: KeyMap, isOn = true): void {
  const [singleKeys] = useSingleKeys();
  const latest = useRef(map);
  useEffect(() => {
    latest.current = map;
  });
  useEffect(() => {
    if (!isOn) return;
    const listen = (event: KeyboardEvent) => {
      if (event.defaultPrevented || event.isComposing) return;
      const name = nameKey(event);
      const act = latest.current[name];
      const target = event.target instanceof Element ? event.target : null;
      if (!act || !mayAct(name, target, singleKeys)) return;
      event.preventDefault();
      act(event);
    };
    window.addEventListener('keydown', listen);
    return () => window.removeEventListener('keydown', listen);
  }, [isOn, singleKeys]);
}
