import { useSuspenseQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { DifferencesDesk } from '../features/recordings/differences-desk.tsx';
import { differencesQuery } from '../features/recordings/readings.queries.ts';
import { patternHeadQuery } from '../features/recordings/recordings.queries.ts';
import { signedInLoader } from '../lib/session.ts';
import { PatternState } from '../parts/pattern-state.tsx';
import { PageProblem } from './shell/page-problem.tsx';
import { PatternTabs, TopStrip } from './shell/top-strip.tsx';

export const loader = signedInLoader(async (client, { params: { patternId = '', readingId = '' } }) => {
  await Promise.all([
    client.query({ ...patternHeadQuery(patternId), staleTime: 0 }),
    client.query({ ...differencesQuery(patternId, readingId), staleTime: 0 }),
  ]);
});

/** What another reading of a recording would change in its pattern. */
export function Component() {
  const { patternId = '', readingId = '' } = useParams();
  const { data: head } = useSuspenseQuery(patternHeadQuery(patternId));
  const { data: told } = useSuspenseQuery(differencesQuery(patternId, readingId));
  return (
    <>
      <title>{`${head.title} · another reading`}</title>
      <TopStrip
        title={head.title}
        beside={<PatternState state={head.state} />}
        tabs={<PatternTabs patternId={patternId} />}
        isCompact
      />
      <DifferencesDesk key={readingId} patternId={patternId} told={told} />
    </>
  );
}

export const ErrorBoundary = () => <PageProblem what="pattern" />;
