import { useSuspenseQuery } from '@tanstack/react-query';
import { useParams, useSearchParams } from 'react-router-dom';
import { cutQuery, heldQuery } from '../features/held/held.queries.ts';
import { HeldRoom } from '../features/held/held-room.tsx';
import { patternHeadQuery, recordingsQuery } from '../features/recordings/recordings.queries.ts';
import { RecordingTabs } from '../features/recordings/recording-tabs.tsx';
import { signedInLoader } from '../lib/session.ts';
import { EmptyPaper } from '../ui/notes.tsx';
import { CardLink } from './shell/card-link.tsx';
import { PageProblem } from './shell/page-problem.tsx';
import { PatternTabs, TopStrip } from './shell/top-strip.tsx';

export const loader = signedInLoader(async (client, { params: { patternId = '' }, request }) => {
  const [list] = await Promise.all([
    client.query({ ...recordingsQuery(patternId), staleTime: 0 }),
    client.query({ ...patternHeadQuery(patternId), staleTime: 0 }),
  ]);
  const asked = new URL(request.url).searchParams.get('recording');
  const recording = list.recordings.find(({ id }) => id === asked) ?? list.recordings[0];
  if (!recording) return;
  await Promise.all([
    client.query({ ...heldQuery(patternId, recording.id), staleTime: 0 }),
    client.query({ ...cutQuery(patternId, recording.id), staleTime: 0 }),
  ]);
});

/** A written pattern held against a recording, and the moments of a recording that was cut anew. */
export function Component() {
  const { patternId = '' } = useParams();
  const [search, setSearch] = useSearchParams();
  const { data: head } = useSuspenseQuery(patternHeadQuery(patternId));
  const { data: list } = useSuspenseQuery(recordingsQuery(patternId));
  const recording = list.recordings.find(({ id }) => id === search.get('recording')) ?? list.recordings[0];
  return (
    <>
      <title>{`${head.title} · held against`}</title>
      <TopStrip title={head.title} tabs={<PatternTabs patternId={patternId} />} isCompact>
        <CardLink patternId={patternId} />
      </TopStrip>
      {list.recordings.length > 1 && (
        <RecordingTabs
          recordings={list.recordings}
          chosenId={recording?.id}
          onChoose={(id) => setSearch({ recording: id })}
        />
      )}
      {recording ? (
        <HeldRoom key={recording.id} patternId={patternId} recordingId={recording.id} />
      ) : (
        <main className="grow">
          <EmptyPaper title="No recording yet">
            <p>When it comes, it is held against what is written here.</p>
          </EmptyPaper>
        </main>
      )}
    </>
  );
}

export const ErrorBoundary = () => <PageProblem what="pattern" />;
