import { LogIn, X } from 'lucide-react';
import { useLocation } from 'react-router-dom';
import { paths } from '../../../lib/paths.ts';
import { Button, IconButton } from '../../../ui/button.tsx';
import { LinkButton } from '../../../ui/link-button.tsx';
import { ErrorNote } from '../../../ui/notes.tsx';
import { useDesk } from './use-desk.ts';

/** Under the head: what keeps things from being saved, and what happened by itself and is worth a line. */
export function Notices() {
  const { bench } = useDesk();
  return (
    <>
      <SaveTrouble />
      {bench.notices.length > 0 && (
        <div role="status" className="flex-none border-b border-rule bg-sheet">
          {bench.notices.map(({ id, words }) => (
            <p key={id} className="bar flex items-center justify-between gap-3 py-1 pr-2 pl-5">
              {words}
              <IconButton icon={X} label="Put this away" onClick={() => bench.dismissNotice(id)} />
            </p>
          ))}
        </div>
      )}
    </>
  );
}

/** The server does not answer, refused, or the session ended: what was typed is kept, and there is one way on. A clash says so itself. */
function SaveTrouble() {
  const { bench } = useDesk();
  const { pathname, search } = useLocation();
  const { reason, isSignedOut } = bench.save;
  if (reason === null || (bench.conflicts.length > 0 && !isSignedOut)) return null;
  const wayOn = isSignedOut ? (
    <LinkButton size="row" icon={LogIn} to={paths.signIn(pathname + search)}>
      Sign in
    </LinkButton>
  ) : (
    <Button size="row" onClick={() => bench.retry()}>
      Try again
    </Button>
  );
  return (
    <div className="flex-none border-b border-rule px-3.5 py-2">
      <ErrorNote what={reason} action={wayOn}>
        What you typed is kept on this device and saved as soon as it can be.
      </ErrorNote>
    </div>
  );
}
