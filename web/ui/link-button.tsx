import { Link, type LinkProps } from 'react-router-dom';
import { inside, look, shortcuts, type Look } from './button-look.tsx';

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
