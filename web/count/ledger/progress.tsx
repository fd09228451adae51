import { useEffect, useState } from 'react';
import { Button } from '../../ui/button.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { MOST_TEXT } from '../share/share-link.ts';
import { useDesk } from '../use-desk.ts';

const SAID_AFTER_MS = 300;

/** Whether something has lasted long enough to be said. */
function useLasting(isSo: boolean): boolean {
  const [hasLasted, setLasted] = useState(false);
  useEffect(() => {
    if (!isSo) return undefined;
    const timer = setTimeout(() => setLasted(true), SAID_AFTER_MS);
    return () => {
      clearTimeout(timer);
      setLasted(false);
    };
  }, [isSo]);
  return isSo && hasLasted;
}

/** Says when a long text is still being counted, when there is too much of it, and when counting has stopped. */
export function Progress() {
  const { written, counting } = useDesk();
  const isTooLong = written.text.length > MOST_TEXT;
  const { progress, isBusy, hasFailed, again } = counting;
  const isSaid = useLasting(isBusy && !hasFailed && !isTooLong && written.text !== '');
  return (
    <>
      <p role="status" className={isSaid ? 'border-b border-feint px-3.5 py-1.5 text-walnut2 print:hidden' : 'sr-only'}>
        {isSaid &&
          (progress && progress.of > 1 && progress.done > 0
            ? `Still counting: ${progress.done} of ${progress.of} pieces. You can write on.`
            : 'Still counting. You can write on.')}
      </p>
      {isTooLong && (
        <div className="px-3.5 py-2">
          <ErrorNote what={`${(written.text.length / 1e6).toFixed(1)} million characters.`}>
            A million are counted at a time. Nothing is lost: take a part out and count the rest after it.
          </ErrorNote>
        </div>
      )}
      {hasFailed && (
        <div className="px-3.5 py-2">
          <ErrorNote
            what="Counting stopped."
            action={
              <Button size="row" onClick={again}>
                Count again
              </Button>
            }
          >
            Your text is untouched.
          </ErrorNote>
        </div>
      )}
    </>
  );
}
