import { type LucideIcon } from 'lucide-react';
import { type ButtonHTMLAttributes, type ReactNode, useId } from 'react';
import { Link, type LinkProps } from 'react-router-dom';
import { cx } from '../lib/class-names.ts';
import { Icon } from './icon.tsx';
import { KeyCaps } from './key-cap.tsx';

export type ButtonKind = 'plain' | 'primary' | 'quiet' | 'harm';
export type ButtonSize = 'usual' | 'row' | 'player' | 'tall' | 'dock';

interface Look {
  kind?: ButtonKind;
  size?: ButtonSize;
  icon?: LucideIcon;
  keys?: readonly string[];
  children?: ReactNode;
}

const look = (kind: ButtonKind, size: ButtonSize, extra?: string) =>
  cx('btn', kind !== 'plain' && `btn-${kind}`, size !== 'usual' && `btn-${size}`, extra);

const inside = ({ icon, keys, children }: Look) => (
  <>
    {icon && <Icon of={icon} size={18} />}
    {children}
    {keys && <KeyCaps keys={keys} />}
  </>
);

const shortcuts = (keys?: readonly string[]) =>
  keys ? { 'aria-keyshortcuts': keys.join('+').replace('Ctrl', 'Control') } : {};

export type ButtonProps = Look & {
  /** Why it cannot be pressed yet. It keeps the focus and its reason is read out; show the reason in words beside it too. */
  notYet?: string | undefined;
} & ButtonHTMLAttributes<HTMLButtonElement>;

/** A button. `primary` carries the ruled-off line and stands once a view. */
export function Button({
  kind = 'plain',
  size = 'usual',
  icon,
  keys,
  notYet,
  className,
  onClick,
  children,
  ...rest
}: ButtonProps) {
  const reasonId = useId();
  const held = notYet !== undefined;
  return (
    <button
      type="button"
      {...rest}
      {...shortcuts(keys)}
      {...(held ? { 'aria-disabled': true, 'aria-describedby': reasonId } : {})}
      className={look(kind, size, className)}
      onClick={held ? (event) => event.preventDefault() : onClick}
    >
      {inside({ ...(icon ? { icon } : {}), ...(keys ? { keys } : {}), children })}
      {held && (
        <span id={reasonId} className="sr-only">
          {notYet}
        </span>
      )}
    </button>
  );
}

/** A link that looks like a button. */
export function LinkButton({
  kind = 'plain',
  size = 'usual',
  icon,
  keys,
  className,
  children,
  ...rest
}: Look & LinkProps) {
  return (
    <Link {...rest} {...shortcuts(keys)} className={look(kind, size, className)}>
      {inside({ ...(icon ? { icon } : {}), ...(keys ? { keys } : {}), children })}
    </Link>
  );
}

/** A drawing alone; its name is read out and shown on hover. */
export function IconButton({
  icon,
  label,
  size = 18,
  className,
  ...rest
}: { icon: LucideIcon; label: string; size?: number } & ButtonHTMLAttributes<HTMLButtonElement>) {
  return (
    <button type="button" title={label} {...rest} aria-label={label} className={cx('icon-btn', className)}>
      <Icon of={icon} size={size} />
    </button>
  );
}
