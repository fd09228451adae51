import { Library, type LucideIcon, PencilRuler, UserRound, Users } from 'lucide-react';
import { Link, NavLink } from 'react-router-dom';
import { cx } from '../../lib/class-names.ts';
import { paths } from '../../lib/paths.ts';
import { Mark } from '../../parts/mark.tsx';
import { Icon } from '../../ui/icon.tsx';

interface Stop {
  to: string;
  name: string;
  icon: LucideIcon;
  /** Also lit while a page of this kind is open. */
  isLit?: boolean;
}

/** The binding: cloth, a running stitch, and the rooms there are. On a phone it lies at the foot of the shelf pages. */
export function Spine({ initials, benchOf, at }: { initials?: string; benchOf: string | null; at: string }) {
  const isBench = at.startsWith('/patterns/');
  const stops: Stop[] = [
    { to: paths.shelf(), name: 'Shelf', icon: Library },
    ...(benchOf ? [{ to: paths.bench(benchOf), name: 'Bench', icon: PencilRuler, isLit: isBench }] : []),
    { to: paths.studio(), name: 'Studio', icon: Users },
  ];
  return (
    <nav
      aria-label="Rooms"
      className={cx(
        'cloth running-stitch fixed inset-y-0 left-0 z-30 flex w-16 flex-col pr-1',
        'max-sm:inset-x-0 max-sm:top-auto max-sm:bottom-0 max-sm:h-14 max-sm:w-auto max-sm:flex-row max-sm:pr-0 max-sm:after:hidden',
        isBench && 'max-sm:hidden',
      )}
    >
      <Link
        to={paths.shelf()}
        aria-label="Roundelay, to the shelf"
        className="mx-auto mt-2.5 mb-6 focus-visible:outline-clothlink max-sm:hidden"
      >
        <Mark size={34} ground="cloth" />
      </Link>
      {stops.map(({ to, name, icon, isLit }) => (
        <NavLink
          key={name}
          to={to}
          end={to === '/'}
          className={({ isActive }) =>
            cx(
              'relative mb-[11px] flex h-11 flex-col items-center justify-center gap-[3px] text-[13px] leading-4 hover:text-white focus-visible:outline-clothlink max-sm:mb-0 max-sm:h-full max-sm:flex-1',
              isActive || isLit
                ? 'font-bold text-white before:absolute before:inset-y-0 before:left-0 before:w-[3px] before:bg-weldfill max-sm:before:inset-x-0 max-sm:before:bottom-auto max-sm:before:h-[3px] max-sm:before:w-auto'
                : 'font-medium',
            )
          }
        >
          <Icon of={icon} size={20} />
          {name}
        </NavLink>
      ))}
      <Link
        to={paths.account()}
        aria-label="Your account"
        className="mx-auto mt-auto mb-3 grid size-[30px] place-items-center rounded-full border border-stitch text-[14px] font-medium text-white hover:bg-woad focus-visible:outline-clothlink max-sm:my-auto max-sm:mr-4 max-sm:size-11"
      >
        {initials ?? <Icon of={UserRound} size={16} />}
      </Link>
    </nav>
  );
}
