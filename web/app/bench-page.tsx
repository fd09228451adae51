import { type QueryClient } from '@tanstack/react-query';
import { type LoaderFunctionArgs, useParams, useSearchParams } from 'react-router-dom';
import { BenchRoom } from '../features/bench/bench-room.tsx';
import { cuesQuery } from '../features/bench/cues.queries.ts';
import { patternQuery } from '../features/bench/data/bench.queries.ts';
import { PatternState } from '../parts/pattern-state.tsx';
import { CardLink } from './shell/card-link.tsx';
import { PageProblem } from './shell/page-problem.tsx';
import { PatternTabs, TopStrip } from './shell/top-strip.tsx';

/** The pattern must be there; its captions are asked for as soon as it says which, and the bench does not wait for them. */
export const loader =
  (client: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    const pattern = await client.query({ ...patternQuery(params.patternId ?? ''), staleTime: 5_000 });
    for (const { transcriptId } of pattern.recordings) {
      if (transcriptId) client.query(cuesQuery(transcriptId)).catch(() => undefined);
    }
    return null;
  };

export function Component() {
  const { patternId = '' } = useParams();
  const [search] = useSearchParams();
  return (
    <BenchRoom
      key={patternId}
      patternId={patternId}
      startLineId={search.get('line')}
      head={({ pattern, saving, controls }) => (
        <>
          <title>{`${pattern.title} · bench`}</title>
          <TopStrip
            title={pattern.title}
            isCompact
            beside={<PatternState state={pattern.state} />}
            tabs={<PatternTabs patternId={patternId} />}
            saving={saving}
          >
            <CardLink patternId={patternId} />
            {controls}
          </TopStrip>
        </>
      )}
    />
  );
}

export const ErrorBoundary = () => <PageProblem what="pattern" />;
