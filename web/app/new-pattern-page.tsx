import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { NewPatternForm } from '../features/recordings/new-pattern-form.tsx';
import { RecordingDesk } from '../features/recordings/recording-desk.tsx';
import { RecordingTabs } from '../features/recordings/recording-tabs.tsx';
import { patternHeadQuery, recordingsQuery, useRecordingDeeds } from '../features/recordings/recordings.queries.ts';
import { useNewPattern } from '../features/recordings/use-new-pattern.ts';
import { useRecordingFiles } from '../features/recordings/use-recording-files.ts';
import { useUpload } from '../features/recordings/upload/uploads.ts';
import { NoStudio } from '../features/shelf/no-studio.tsx';
import { paths } from '../lib/paths.ts';
import { signedInLoader, studioOf, useMe } from '../lib/session.ts';
import { Button } from '../ui/button.tsx';
import { ErrorNote } from '../ui/notes.tsx';
import { PageProblem } from './shell/page-problem.tsx';
import { TopStrip } from './shell/top-strip.tsx';

export const loader = signedInLoader(async (client, { request }) => {
  const patternId = new URL(request.url).searchParams.get('pattern');
  if (patternId === null) return;
  await Promise.all([
    client.query({ ...patternHeadQuery(patternId), staleTime: 0 }),
    client.query({ ...recordingsQuery(patternId), staleTime: 0 }),
  ]);
});

const READING = 'The rounds are being read.';

function NewPatternDesk({ studioId }: { studioId: string }) {
  const pattern = useNewPattern(studioId);
  const files = useRecordingFiles(pattern.ensureRecording, pattern.refresh);
  const deeds = useRecordingDeeds(pattern.patternId ?? '');
  const navigate = useNavigate();
  const [failed, setFailed] = useState(false);
  const [wantsTitle, setWantsTitle] = useState(false);
  const { chosen, recordings } = pattern;
  const moving = useUpload(chosen?.id);
  const isReading = chosen?.transcript?.reading.state === 'waiting';
  const hasTranscript = recordings.some(({ transcript }) => transcript !== null);
  const hasClip = recordings.some(({ clip }) => clip !== null);

  const attempt = (work: () => Promise<unknown>) => {
    setFailed(false);
    void work().catch(() => setFailed(true));
  };
  const open = () =>
    attempt(async () => {
      if (pattern.patternId === undefined && pattern.title.trim() === '') {
        setWantsTitle(true);
        return;
      }
      const { id } = await pattern.ensurePattern('New pattern');
      await navigate(paths.bench(id));
    });
  const saveElsewhere = (edit: { publicUrl: string | null; publicOffsetMs: number }) =>
    attempt(async () => {
      if (chosen) await deeds.edit.mutateAsync({ of: chosen, edit });
      else await pattern.ensureRecording('Recording', edit);
      pattern.refresh();
    });

  return (
    <>
      <TopStrip
        title="New pattern"
        beside={
          moving?.state.phase === 'sending' ? 'You can leave this page. The recording keeps going up.' : undefined
        }
      >
        {pattern.patternId === undefined && (
          <Link className="link" to={paths.writtenPattern()}>
            Begin with a written pattern
          </Link>
        )}
        <Link className="link" to={paths.shelf()}>
          {pattern.patternId === undefined ? 'Back to the shelf' : 'Save for later'}
        </Link>
      </TopStrip>
      <main className="grid grow grid-cols-[380px_minmax(0,1fr)_372px] max-lg:grid-cols-1">
        <NewPatternForm
          title={pattern.title}
          terms={pattern.terms ?? 'US'}
          titleError={wantsTitle && pattern.title.trim() === '' ? 'Give it a name first, or choose a file.' : undefined}
          recording={chosen}
          onType={pattern.type}
          onSave={(edit) => attempt(() => pattern.save(edit))}
          onElsewhere={saveElsewhere}
        />
        <RecordingDesk
          key={chosen?.id ?? 'none'}
          patternId={pattern.patternId ?? ''}
          recording={chosen}
          room={pattern.list?.storage}
          mayEdit
          files={files}
          head={
            <RecordingTabs
              recordings={recordings}
              chosenId={chosen?.id}
              onChoose={pattern.choose}
              onAdd={() => attempt(pattern.addAnother)}
            />
          }
        />
      </main>
      <footer className="sticky bottom-0 z-10 max-sm:static flex min-h-[58px] flex-wrap items-center gap-x-3.5 gap-y-2 border-t border-rule bg-chalk px-6 py-2 max-sm:px-4">
        {failed ? (
          <ErrorNote what="Not saved.">The connection was lost, or somebody else was quicker. Try again.</ErrorNote>
        ) : (
          <p className="text-walnut2">
            {isReading
              ? READING
              : hasTranscript
                ? hasClip
                  ? 'Clip and transcript are here.'
                  : 'The bench opens without the clip; it joins when it is up.'
                : 'Either file may come first; neither has to.'}
          </p>
        )}
        <span className="ml-auto flex flex-wrap gap-3.5">
          {hasTranscript || hasClip ? (
            <Button kind="primary" onClick={open} {...(isReading ? { notYet: READING } : {})}>
              Open at the bench
            </Button>
          ) : (
            <Button onClick={open}>Write the lines by hand</Button>
          )}
        </span>
      </footer>
    </>
  );
}

export function Component() {
  const studio = studioOf(useMe());
  if (!studio) return <NoStudio />;
  return <NewPatternDesk key={studio.studioId} studioId={studio.studioId} />;
}

export const ErrorBoundary = () => <PageProblem what="pattern" />;
