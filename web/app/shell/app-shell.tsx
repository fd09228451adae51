import { useQuery } from '@tanstack/react-query';
import { Outlet, ScrollRestoration, useLocation, useMatch } from 'react-router-dom';
import { useEffect } from 'react';
import { UploadDock } from '../../features/recordings/upload-dock.tsx';
import { cx } from '../../lib/class-names.ts';
import { initialsOf } from '../../ui/initials.tsx';
import { sessionQuery } from '../../lib/session.ts';
import { SkipLink } from '../../ui/skip-link.tsx';
import { ToastProvider } from '../../ui/toast.tsx';
import { Spine } from './spine.tsx';

const LAST_BENCH = 'roundelay.last-bench';

/** The way back to the bench from the shelf: the pattern that was open last in this browser. */
function useLastBench(): string | null {
  const match = useMatch('/patterns/:patternId/*');
  const open = match?.params.patternId;
  useEffect(() => {
    if (open) localStorage.setItem(LAST_BENCH, open);
  }, [open]);
  return open ?? localStorage.getItem(LAST_BENCH);
}

/** The binding and the page beside it, for everybody who has signed in. */
export function AppShell() {
  const { pathname } = useLocation();
  const isBench = pathname.startsWith('/patterns/');
  const { data } = useQuery(sessionQuery);
  const person = data?.person;
  return (
    <ToastProvider>
      <SkipLink />
      <Spine benchOf={useLastBench()} at={pathname} {...(person ? { initials: initialsOf(person.name) } : {})} />
      <div
        id="page"
        tabIndex={-1}
        className={cx('flex min-h-full flex-col outline-none sm:pl-16', !isBench && 'max-sm:pb-14')}
      >
        <Outlet />
      </div>
      <UploadDock at={pathname} />
      <ScrollRestoration />
    </ToastProvider>
  );
}
