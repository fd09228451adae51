import { useSuspenseQuery } from '@tanstack/react-query';
import { Plus } from 'lucide-react';
import { Suspense, useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { ShelfPart } from '#contract/shelf';
import { FindField } from '../features/shelf/find-field.tsx';
import { NoStudio } from '../features/shelf/no-studio.tsx';
import { ShelfRoom } from '../features/shelf/shelf-room.tsx';
import { ShelfWaiting } from '../features/shelf/shelf-waiting.tsx';
import { shelfQuery } from '../features/shelf/shelf.queries.ts';
import { paths } from '../lib/paths.ts';
import { signedInLoader, studioOf, useMe } from '../lib/session.ts';
import { useKeys } from '../lib/use-keys.ts';
import { LinkButton } from '../ui/link-button.tsx';
import { PageProblem } from './shell/page-problem.tsx';
import { TopStrip } from './shell/top-strip.tsx';

const partIn = (search: URLSearchParams): ShelfPart => ShelfPart.catch('shelf').parse(search.get('part'));
const TITLES: Readonly<Record<ShelfPart, string>> = { shelf: 'Shelf', archive: 'Archive', bin: 'Bin' };

/** Asks, but does not wait: the page shows its rows waiting, in the binding, instead of nothing. */
export const loader = signedInLoader((client, { request }, me) => {
  const studio = studioOf(me);
  const part = partIn(new URL(request.url).searchParams);
  // What went wrong is told where it is read.
  if (studio) void client.query(shelfQuery(studio.studioId, part)).catch(() => undefined);
  return Promise.resolve();
});

/** On a phone the strip has two lines, and the first wants room above it. */
const ON_PHONE = 'max-sm:inline-block max-sm:py-2.5';

function howMany(count: number, isShelf: boolean): string {
  if (count === 0) return isShelf ? 'no patterns yet' : 'nothing here';
  return count === 1 ? '1 pattern' : `${count} patterns`;
}

/** The shelf of the studio somebody works in. */
function StudioShelf({ studioId, name, part }: { studioId: string; name: string; part: ShelfPart }) {
  const { data: shelf } = useSuspenseQuery(shelfQuery(studioId, part));
  const [words, setWords] = useState('');
  const navigate = useNavigate();
  useKeys({ N: () => void navigate(paths.newPattern()) }, shelf.mayCreate);
  const isEmpty = shelf.patterns.length === 0;
  return (
    <>
      <TopStrip
        title={<span className={ON_PHONE}>{TITLES[part]}</span>}
        beside={<span className={ON_PHONE}>{`${name}, ${howMany(shelf.patterns.length, part === 'shelf')}`}</span>}
      >
        {!isEmpty && (
          <div className="flex items-center gap-4.5 max-sm:w-[calc(100vw-24px)] max-sm:gap-3 max-sm:pb-2">
            <FindField value={words} onChange={setWords} />
            {shelf.mayCreate && part === 'shelf' && (
              <LinkButton kind="primary" icon={Plus} to={paths.newPattern()} aria-keyshortcuts="N">
                New pattern
              </LinkButton>
            )}
          </div>
        )}
      </TopStrip>
      <main className="flex grow flex-col">
        <ShelfRoom studioId={studioId} part={part} words={words} />
      </main>
    </>
  );
}

export function Component() {
  const studio = studioOf(useMe());
  const [search] = useSearchParams();
  if (!studio) return <NoStudio />;
  const part = partIn(search);
  const { studioId, studioName } = studio;
  const waiting = (
    <>
      <TopStrip title={TITLES[part]} beside={studioName} />
      <ShelfWaiting />
    </>
  );
  return (
    <Suspense key={`${studioId} ${part}`} fallback={waiting}>
      <StudioShelf studioId={studioId} name={studioName} part={part} />
    </Suspense>
  );
}

export const ErrorBoundary = () => <PageProblem what="shelf" />;
