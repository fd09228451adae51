import { type ReactNode } from 'react';
import { NavLink } from 'react-router-dom';
import { cx } from '../../lib/class-names.ts';
import { paths } from '../../lib/paths.ts';

/** The head of every page, 52 high: its title in Lora, what stands beside it, and at the right what can be done. */
export function TopStrip({
  title,
  beside,
  tabs,
  children,
}: {
  title: ReactNode;
  beside?: ReactNode;
  tabs?: ReactNode;
  children?: ReactNode;
}) {
  return (
    <header className="sticky top-0 z-20 flex min-h-[52px] flex-wrap items-center gap-x-4.5 border-b border-rule bg-chalk px-5 max-sm:px-3">
      <h1 className="h-page max-sm:text-[18px] max-sm:leading-[22px]">{title}</h1>
      {beside && <div className="text-walnut2">{beside}</div>}
      {tabs}
      {children && <div className="ml-auto flex items-center gap-4.5 max-sm:gap-3">{children}</div>}
    </header>
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
      className="flex h-[52px] gap-7 sm:ml-5 max-sm:h-11 max-sm:w-full max-sm:gap-6 max-sm:overflow-x-auto"
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
