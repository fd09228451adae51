import { ChevronLeft, EllipsisVertical } from 'lucide-react';
import { type ReactNode } from 'react';
import { Link, NavLink } from 'react-router-dom';
import { cx } from '../../lib/class-names.ts';
import { paths } from '../../lib/paths.ts';
import { PHONE, useMedia } from '../../lib/use-media.ts';
import { Icon } from '../../ui/icon.tsx';

interface TopStripProps {
  title: ReactNode;
  beside?: ReactNode;
  tabs?: ReactNode;
  /** How saving stands; shown also where the rest is behind the menu. */
  saving?: ReactNode;
  /** On a phone: tabs and controls go behind a menu, so that the work begins at once. */
  isCompact?: boolean;
  children?: ReactNode;
}

/** The head of every page, 52 high: its title in Lora, what stands beside it, and at the right what can be done. */
export function TopStrip({ title, beside, tabs, saving, isCompact = false, children }: TopStripProps) {
  const isPhone = useMedia(PHONE);
  if (isPhone && isCompact) {
    return (
      <header className="relative flex min-h-[46px] flex-none items-center gap-x-2 border-b border-rule bg-chalk">
        <Link to={paths.shelf()} aria-label="To the shelf" className="icon-btn -mr-2">
          <Icon of={ChevronLeft} size={22} />
        </Link>
        <h1 className="h-page min-w-0 truncate text-[18px]! leading-[22px]!">{title}</h1>
        <div className="small text-walnut2">{beside}</div>
        <div className="small ml-auto whitespace-nowrap">{saving}</div>
        <StripMenu>
          {tabs}
          {children}
        </StripMenu>
      </header>
    );
  }
  return (
    <header className="sticky top-0 z-20 flex min-h-[52px] flex-none flex-wrap items-center gap-x-4.5 max-lg:gap-x-3 border-b border-rule bg-chalk px-5 max-sm:px-3">
      <h1 className="h-page max-sm:text-[18px]! max-sm:leading-[22px]!">{title}</h1>
      {beside && <div className="text-walnut2">{beside}</div>}
      {tabs}
      {(saving !== undefined || children !== undefined) && (
        <div className="ml-auto flex min-h-[42px] flex-wrap items-center gap-x-4.5 gap-y-1 max-lg:gap-x-2.5">
          {saving}
          {children}
        </div>
      )}
    </header>
  );
}

function StripMenu({ children }: { children: ReactNode }) {
  return (
    <details className="group">
      <summary aria-label="More of this pattern" className="icon-btn -ml-2 cursor-pointer list-none">
        <Icon of={EllipsisVertical} size={20} />
      </summary>
      <div className="absolute inset-x-0 top-full z-30 flex flex-wrap items-center gap-3 border-b border-edge bg-chalk px-4 py-3">
        {children}
      </div>
    </details>
  );
}

const TABS = [
  ['Recording', paths.recording],
  ['Bench', paths.bench],
  ['Sheet', paths.sheet],
  ['Editions', paths.editions],
] as const;

/** The pages of one pattern, the open one ruled off. */
export function PatternTabs({ patternId }: { patternId: string }) {
  return (
    <nav
      aria-label="This pattern"
      className="flex h-[52px] gap-7 max-lg:gap-5 sm:ml-5 max-sm:h-11 max-sm:w-full max-sm:gap-6 max-sm:overflow-x-auto"
    >
      {TABS.map(([name, to]) => (
        <NavLink
          key={name}
          to={to(patternId)}
          className={({ isActive }) =>
            cx(
              'relative h-full leading-[50px] hover:text-walnut max-sm:leading-[42px]',
              isActive
                ? 'font-bold text-walnut after:absolute after:inset-x-0 after:-bottom-px after:h-2 after:border-y-[1.5px] after:border-woad'
                : 'text-walnut2',
            )
          }
        >
          {name}
        </NavLink>
      ))}
    </nav>
  );
}
