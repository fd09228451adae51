import { useSuspenseQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { patternQuery } from '../features/bench/data/bench.queries.ts';
import { FilmingCard } from '../features/filming/filming-card.tsx';
import { signedInLoader } from '../lib/session.ts';
import { PageProblem } from './shell/page-problem.tsx';

export const loader = signedInLoader((client, { params }) =>
  client.query({ ...patternQuery(params.patternId ?? ''), staleTime: 0 }),
);

/** The filming card: a written pattern, to read to the camera. It fills the window, without the binding. */
export function Component() {
  const { patternId = '' } = useParams();
  const { data: pattern } = useSuspenseQuery({ ...patternQuery(patternId), staleTime: 'static' });
  return (
    <>
      <title>{`${pattern.title} · filming card`}</title>
      <FilmingCard key={patternId} pattern={pattern} />
    </>
  );
}

export const ErrorBoundary = () => <PageProblem what="pattern" />;
