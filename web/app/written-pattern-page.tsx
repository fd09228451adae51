import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { NoStudio } from '../features/shelf/no-studio.tsx';
import { EntryList } from '../features/written/entry-list.tsx';
import { textFromCount, useWritten } from '../features/written/use-written.ts';
import { WrittenForm } from '../features/written/written-form.tsx';
import { paths } from '../lib/paths.ts';
import { signedInLoader, studioOf, useMe } from '../lib/session.ts';
import { useKeys } from '../lib/use-keys.ts';
import { Button } from '../ui/button.tsx';
import { ErrorNote } from '../ui/notes.tsx';
import { PageProblem } from './shell/page-problem.tsx';
import { TopStrip } from './shell/top-strip.tsx';

export const loader = signedInLoader();

function WrittenDesk({ studioId }: { studioId: string }) {
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const written = useWritten(studioId, search.get('from') === 'count' ? textFromCount() : '');
  const { told, why, reading } = written;
  const make = () =>
    void written.make().then((id) => {
      if (id !== null) void navigate(paths.bench(id));
    });
  useKeys({ 'Ctrl+Enter': make });
  return (
    <>
      <TopStrip title="A written pattern">
        <Link className="link" to={paths.shelf()}>
          Back to the shelf
        </Link>
      </TopStrip>
      <main className="grid min-h-0 grow grid-cols-[minmax(340px,36%)_minmax(0,1fr)] max-lg:grid-cols-1">
        <WrittenForm
          title={written.title}
          text={written.text}
          terms={written.terms}
          termsReason={written.chosenTerms ? 'As you chose.' : (reading?.read.termsReason ?? null)}
          onTitle={written.setTitle}
          onText={written.setText}
          onTerms={written.setTerms}
        />
        <EntryList told={told} isBusy={written.isBusy} />
      </main>
      <footer className="sticky bottom-0 z-10 flex min-h-[58px] flex-wrap items-center gap-x-3.5 gap-y-2 border-t border-rule bg-chalk px-6 py-2 max-sm:static max-sm:px-4">
        {written.error !== null ? (
          <ErrorNote what="Not made.">{written.error}</ErrorNote>
        ) : (
          <p className="text-walnut2">
            {why ?? 'Each total is checked at the bench. One undo there takes all of it back.'}
          </p>
        )}
        <span className="ml-auto flex flex-wrap gap-3.5">
          {told.open > 0 && <Button onClick={told.keepRest}>Take the rest as it is</Button>}
          <Button
            kind="primary"
            keys={['Ctrl', 'Enter']}
            onClick={make}
            {...(why === null && !written.isSending ? {} : { notYet: why ?? 'It is being made.' })}
          >
            Make the pattern
          </Button>
        </span>
      </footer>
    </>
  );
}

export function Component() {
  const studio = studioOf(useMe());
  if (!studio) return <NoStudio />;
  return <WrittenDesk key={studio.studioId} studioId={studio.studioId} />;
}

export const ErrorBoundary = () => <PageProblem what="pattern" />;
