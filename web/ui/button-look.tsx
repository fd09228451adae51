import { type LucideIcon } from 'lucide-react';
import { type ReactNode } from 'react';
import { cx } from '../lib/class-names.ts';
import { Icon } from './icon.tsx';
import { KeyCaps } from './key-cap.tsx';

/** What buttons and links that look like one have in common. */

export type ButtonKind = 'plain' | 'primary' | 'quiet' | 'harm';
export type ButtonSize = 'usual' | 'row' | 'player' | 'tall' | 'dock';

export interface Look {
  kind?: ButtonKind;
  size?: ButtonSize;
  icon?: LucideIcon;
  keys?: readonly string[];
  children?: ReactNode;
}

export const look = (kind: ButtonKind, size: ButtonSize, extra?: string) =>
  cx('btn', kind !== 'plain' && `btn-${kind}`, size !== 'usual' && `btn-${size}`, extra);

export const inside = ({ icon, keys, children }: Look) => (
  <>
    {icon && <Icon of={icon} size={18} />}
    {children}
    {keys && <KeyCaps keys={keys} />}
  </>
);

const SPOKEN_KEYS: Readonly<Record<string, string>> = {
  Ctrl: 'Control',
  '←': 'ArrowLeft',
  '→': 'ArrowRight',
  '↑': 'ArrowUp',
  '↓': 'ArrowDown',
};

export const shortcuts = (keys?: readonly string[]) =>
  keys ? { 'aria-keyshortcuts': keys.map((key) => SPOKEN_KEYS[key] ?? key).join('+') } : {};
