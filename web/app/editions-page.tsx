import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { patternQuery } from '../features/bench/data/bench.queries.ts';
import { EditionPanel } from '../features/editions/edition-panel.tsx';
import { EditionsList } from '../features/editions/editions-list.tsx';
import { editionsQuery } from '../features/editions/editions.queries.ts';
import { paths } from '../lib/paths.ts';
import { signedInLoader } from '../lib/session.ts';
import { LinkButton } from '../ui/link-button.tsx';
import { EmptyPaper } from '../ui/notes.tsx';
import { PageProblem } from './shell/page-problem.tsx';
import { PatternTabs, TopStrip } from './shell/top-strip.tsx';

export const loader = signedInLoader((client, { params: { patternId = '' } }) =>
  Promise.all([client.query(patternQuery(patternId)), client.query({ ...editionsQuery(patternId), staleTime: 0 })]),
);

const SHOWN_TO = {
  private: 'shown to the studio alone',
  unlisted: 'shown to whoever has the link',
  listed: 'shown to everybody',
} as const;

/** What is out: every edition with its date, link and errata. */
export function Component() {
  const { patternId = '' } = useParams();
  const { data: pattern } = useSuspenseQuery(patternQuery(patternId));
  const { data: list } = useSuspenseQuery(editionsQuery(patternId));
  const [asked, choose] = useState<number | null>(null);
  const chosen = list.editions.find(({ number }) => number === asked) ?? list.editions[0];
  return (
    <>
      <TopStrip title={pattern.title} tabs={<PatternTabs patternId={patternId} />}>
        <LinkButton to={paths.sheet(patternId)}>{chosen ? 'To the next edition' : 'To the sheet'}</LinkButton>
      </TopStrip>
      {chosen ? (
        <main className="grid grow grid-cols-[minmax(280px,1fr)_minmax(0,3fr)] max-lg:grid-cols-[minmax(0,1fr)]">
          <div className="border-r border-rule max-lg:border-r-0 max-lg:border-b">
            <div className="panel-head justify-between">
              <h2 className="h-panel">Editions</h2>
              <span className="text-walnut2">{list.editions.length}</span>
            </div>
            <EditionsList editions={list.editions} chosen={chosen.number} onChoose={choose} />
            <p className="p-3.5 text-walnut2">
              Old editions stay readable at their own address. A viewer in the middle of one keeps it until they choose
              to move.{' '}
              <a className="link break-all" href={`/w/${list.code}`}>
                {list.address}
              </a>{' '}
              always leads to the current one; it is {SHOWN_TO[list.visibility]}.
            </p>
          </div>
          <div className="bg-sheet">
            <EditionPanel
              patternId={patternId}
              edition={chosen}
              code={list.code}
              address={list.address}
              mayManage={list.mayManage}
            />
          </div>
        </main>
      ) : (
        <main className="grow">
          <EmptyPaper
            title="Nothing is out yet"
            action={
              <LinkButton kind="primary" to={paths.sheet(patternId)}>
                To the sheet
              </LinkButton>
            }
          >
            Publishing freezes the sheet and the watch page as edition 1. What is changed afterwards waits for the next.
          </EmptyPaper>
        </main>
      )}
    </>
  );
}

export const ErrorBoundary = () => <PageProblem what="pattern" />;
