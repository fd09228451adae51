import { type LucideIcon } from 'lucide-react';
import { type ButtonHTMLAttributes, useId } from 'react';
import { cx } from '../lib/class-names.ts';
import { inside, look, shortcuts, type Look } from './button-look.tsx';
import { Icon } from './icon.tsx';

export { type ButtonKind } from './button-look.tsx';

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
