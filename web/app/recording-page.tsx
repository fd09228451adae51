import { useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { RecordingDesk } from '../features/recordings/recording-desk.tsx';
import { RecordingLedger } from '../features/recordings/recording-ledger.tsx';
import {
  addRecording,
  patternHeadQuery,
  recordingsQuery,
  useRefresh,
} from '../features/recordings/recordings.queries.ts';
import { nameOfFile, useRecordingFiles } from '../features/recordings/use-recording-files.ts';
import { PatternState } from '../parts/pattern-state.tsx';
import { paths } from '../lib/paths.ts';
import { signedInLoader } from '../lib/session.ts';
import { LinkButton } from '../ui/link-button.tsx';
import { ErrorNote } from '../ui/notes.tsx';
import { CardLink } from './shell/card-link.tsx';
import { PageProblem } from './shell/page-problem.tsx';
import { PatternTabs, TopStrip } from './shell/top-strip.tsx';

export const loader = signedInLoader(async (client, { params: { patternId = '' } }) => {
  await Promise.all([
    client.query({ ...patternHeadQuery(patternId), staleTime: 0 }),
    client.query({ ...recordingsQuery(patternId), staleTime: 0 }),
  ]);
});

/** The recordings of one pattern: what has arrived, what was mended, what was heard. */
export function Component() {
  const { patternId = '' } = useParams();
  const { data: head } = useSuspenseQuery(patternHeadQuery(patternId));
  const { data: list } = useSuspenseQuery(recordingsQuery(patternId));
  const [chosenId, setChosenId] = useState<string>();
  const [failed, setFailed] = useState(false);
  const client = useQueryClient();
  const refresh = useRefresh(patternId);
  const chosen = list.recordings.find(({ id }) => id === chosenId) ?? list.recordings[0];

  const add = async (title: string) => {
    const made = await addRecording(patternId, { title });
    await client.invalidateQueries({ queryKey: recordingsQuery(patternId).queryKey });
    setChosenId(made.id);
    return made;
  };
  const ensure = async (fileName: string) => {
    const { id, title } = chosen ?? (await add(nameOfFile(fileName)));
    return { recordingId: id, patternId, title };
  };
  const files = useRecordingFiles(ensure, () => void refresh());
  const addAnother = () => {
    setFailed(false);
    void add(`Part ${list.recordings.length + 1}`).catch(() => setFailed(true));
  };
  return (
    <>
      <TopStrip
        title={head.title}
        beside={<PatternState state={head.state} />}
        tabs={<PatternTabs patternId={patternId} />}
        isCompact
      >
        {chosen && <LinkButton to={paths.held(patternId, chosen.id)}>Held against the pattern</LinkButton>}
        <CardLink patternId={patternId} />
      </TopStrip>
      <main className="grid grow grid-cols-[320px_minmax(0,1fr)_372px] max-lg:grid-cols-1">
        <div className="flex flex-col border-r border-rule max-lg:border-r-0">
          {failed && <ErrorNote what="Not added.">The connection was lost. Try again.</ErrorNote>}
          <RecordingLedger
            patternId={patternId}
            recordings={list.recordings}
            chosen={chosen}
            mayEdit={list.mayEdit}
            onChoose={setChosenId}
            onAdd={addAnother}
          />
        </div>
        <RecordingDesk
          key={chosen?.id ?? 'none'}
          patternId={patternId}
          recording={chosen}
          room={list.storage}
          mayEdit={list.mayEdit}
          files={files}
        />
      </main>
    </>
  );
}

export const ErrorBoundary = () => <PageProblem what="pattern" />;
